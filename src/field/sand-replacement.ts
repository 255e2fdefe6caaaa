import { relation } from "../relations/relation";

/** Wet density by sand replacement: the hole's volume is that of the sand it took, the cone's share taken off. */
export const wetDensityBySand = relation(
  "wetDensity", "soilMass * sandDensity / (sandUsed - sandInCone)",
  { title: "ASTM D1556", clause: "calculation of in-place density by the sand-cone method" });

/** Bulk density of the sand, poured into a calibrated container. */
export const densityOfSand = relation(
  "sandDensity", "(containerAndSand - containerMass) / containerVolume",
  { title: "ASTM D1556", clause: "annex, calibration of the sand" });

/** Mass of sand that stays in cone and plate, poured on a flat surface. */
export const sandInConeFromWeighing = relation(
  "sandInCone", "bottleBefore - bottleAfter",
  { title: "ASTM D1556", clause: "annex, calibration of the cone" });

/** Wet density where the volume of the hole is measured, by balloon or water. */
export const wetDensityOfHole = relation(
  "wetDensity", "soilMass / holeVolume",
  { title: "ASTM D2167 and D5030", clause: "calculation of in-place density from the volume of the hole" });
