import { rootBetween } from "../numerics/root";
import type { Fit } from "./fit";

/** Where a curve crosses a share of its maximum; null where it stays above to the end of the data. */
export interface WaterSpan { readonly low: number | null; readonly high: number | null }

const STEPS = 64;

/** The water contents about the optimum between which the fitted curve stays above a percent of its maximum, inside the data. */
export function waterSpan({ test, used, at, optimumWater, maxDryDensity }: Fit, percent: number): WaterSpan {
  const waters = used.map((i) => test.waters[i]!), wanted = maxDryDensity.value * percent / 100;
  const above = (water: number): number => at(water) - wanted;
  const crossing = (end: number): number | null => {
    let inside = optimumWater.value;
    for (let step = 1; step <= STEPS; step++) {
      const water = optimumWater.value + (end - optimumWater.value) * step / STEPS;
      if (above(water) < 0) return rootBetween(above, inside, water, 1e-10);
      inside = water;
    }
    return null;
  };
  return { low: crossing(Math.min(...waters)), high: crossing(Math.max(...waters)) };
}
