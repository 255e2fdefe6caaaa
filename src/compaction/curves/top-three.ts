import type { CompactionTest } from "../fit";
import type { Curve } from "./curve";
import { fitPolynomialCurve } from "./polynomial-curve";

/**
 * A parabola through the highest point and its two neighbours in water content, as a curve drawn by hand is read near its top.
 * It passes through its points, so it says nothing of their scatter. Points at the same water content go together.
 */
export const topThree: Curve = {
  id: "top three",
  parameters: 3,
  weighed: false,
  needs: "a highest point with a drier and a wetter neighbour",
  fit: (test, options) => fitPolynomialCurve(topThree, test, aroundHighest(test), options),
};

function aroundHighest({ waters, dries }: CompactionTest): number[] | undefined {
  const sorted = [...new Set(waters)].sort((a, b) => a - b);
  const highest = dries.indexOf(Math.max(...dries));
  const place = sorted.indexOf(waters[highest]!);
  if (place < 1 || place >= sorted.length - 1) return undefined;
  const around = new Set(sorted.slice(place - 1, place + 2));
  return waters.flatMap((water, i) => around.has(water) ? [i] : []);
}
