import { relation } from "../relations/relation";

/** Wet density of the soil in a mould or a drive cylinder, in mass unit over volume unit. */
export const wetDensityInMould = relation(
  "wetDensity", "(mouldAndSoil - mouldMass) / mouldVolume",
  { title: "ASTM D698", clause: "calculation of moist density" });
