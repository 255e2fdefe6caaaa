import { relation } from "../relations/relation";

/** Density of air-free water in kg/m3 at 101 325 Pa, 0 to 40 °C. */
export const densityOfWater = relation(
  "waterDensity", "999.97495 * (1 - (temperature - 3.983035) ^ 2 * (temperature + 301.797) / (522528.9 * (temperature + 69.34881)))",
  { title: "CIPM 2001: Tanaka and others, Metrologia 38 (2001) 301" });

/** The laboratory's reference temperature, for which the standards give the density of water. */
export const REFERENCE_TEMPERATURE = 20;
export const WATER_KG_M3_AT_20 = densityOfWater.value({ temperature: REFERENCE_TEMPERATURE });
