import { relation } from "../relations/relation";

/** Volume of a mould from its inside measures, in their unit cubed. */
export const mouldVolumeFromMeasures = relation(
  "mouldVolume", "0.7853981633974483 * mouldDiameter ^ 2 * mouldHeight",
  { title: "ASTM D698", clause: "volume of the mould by linear measurement; the factor is a quarter of pi" });

/** Water to add to a batch of moist soil to bring it to a water content; negative is to dry out. */
export const waterForBatch = relation(
  "addedWater", "moistMass * (targetWater - waterContent) / (100 + waterContent)",
  { title: "definition of water content", clause: "mass of water over mass of dry soil" });

/** Wet density of the soil in a mould or a drive cylinder, in mass unit over volume unit. */
export const wetDensityInMould = relation(
  "wetDensity", "(mouldAndSoil - mouldMass) / mouldVolume",
  { title: "ASTM D698", clause: "calculation of moist density" });
