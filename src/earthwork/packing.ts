import { relation } from "../relations/relation";

const limit = { title: "two-component packing limit", clause: "fines that just fill the voids of a coarse soil; derived by volumes" };

/** Share of fines, percent of dry mass, that just fills the voids of a coarse soil. More of them lowers the density. */
export const finesThatFill = relation(
  "finesShare", "100 * (1 - coarseDryDensity / (waterDensity * coarseGravity)) * finesDryDensity / (coarseDryDensity + (1 - coarseDryDensity / (waterDensity * coarseGravity)) * finesDryDensity)", limit);
/** Dry density there. */
export const packedDensity = relation(
  "packedDryDensity", "coarseDryDensity + (1 - coarseDryDensity / (waterDensity * coarseGravity)) * finesDryDensity", limit);

const grading = { title: "ASTM D2487", clause: "coefficients of uniformity and curvature" };
export const uniformityCoefficient = relation("uniformity", "sixtyPercentSize / tenPercentSize", grading);
export const curvatureCoefficient = relation("curvature", "thirtyPercentSize ^ 2 / (tenPercentSize * sixtyPercentSize)", grading);
