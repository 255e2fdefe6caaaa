import { densityUnits, type DensityUnit } from "../../src/units/density-units";
import type { PeakFigure } from "../../src/compaction/fit";

/** Decimals in which the trade reports a dry density, at its coarsest and at its finest, by unit. Common practice, no published source. */
const REPORTED: Readonly<Record<string, { readonly least: number; readonly most: number }>> = {
  "Mg/m3": { least: 2, most: 3 }, "kg/m3": { least: 0, most: 0 }, "kN/m3": { least: 1, most: 2 }, "lb/ft3": { least: 1, most: 1 }, "lb/yd3": { least: 0, most: 0 },
};
/** Water contents are reported to a tenth of a percent. Common practice, no published source. */
const WATER_DECIMALS = 1;

export const unitOfId = (id: string): DensityUnit | undefined => densityUnits.find((unit) => unit.id === id);
const reported = (unit: string): { readonly least: number; readonly most: number } => REPORTED[unit] ?? { least: 2, most: 2 };

/** Decimals worth showing of a density beside its interval: down to the first figure of the half-width, within what the trade reports. */
export function decimalsOfDensity({ value, low, high }: PeakFigure, unit: string): number {
  const { least, most } = reported(unit);
  const half = Math.max(low === null ? 0 : value - low, high === null ? 0 : high - value);
  return half > 0 ? Math.min(most, Math.max(least, Math.ceil(-Math.log10(half)))) : most;
}

export const decimalsOfWater = (): number => WATER_DECIMALS;

/** "95 % interval 1.95 to 1.99", or in words where the data bound it on one side or not at all. */
export function intervalWords({ low, high }: PeakFigure, decimals: number): string {
  if (low === null && high === null) return "not located within these data";
  if (low === null) return `95 % interval up to ${high!.toFixed(decimals)}; not bounded below by these data`;
  if (high === null) return `95 % interval from ${low.toFixed(decimals)}; not bounded above by these data`;
  return `95 % interval ${low.toFixed(decimals)} to ${high.toFixed(decimals)}`;
}

export const densityShown = (value: number, unit: string): string => value.toFixed(reported(unit).most);
export const waterShown = (value: number): string => value.toFixed(WATER_DECIMALS);

/** A number and the unit after it stay on one line. */
export const tied = (text: string): string => text.replace(/(\d) (?=%|°C|Mg\/m³|kg\/m³|kN\/m³|lb\/)/g, "$1\u00a0");
