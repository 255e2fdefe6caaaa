import { bootstrap, type DrawnInterval } from "../../numerics/bootstrap";
import { rootBetween } from "../../numerics/root";
import type { CompactionTest, PeakInterval } from "../fit";
import { readingDoubt } from "../scatter";
import { distinctWaters, type Curve, type FitOptions, type FittedCurve, type Reckoning } from "./curve";

/** Draws of the seeded bootstrap: its ends then stand within about a tenth of the interval. */
const DRAWS = 400, SEED = 1;

/**
 * A smooth curve through every point that keeps their shape: it rises where they rise and falls where they fall, with one
 * summit beside the highest point. Points at the same water content go through their mean.
 * Cubic pieces with slopes by Fritsch and Butland, SIAM Journal on Scientific and Statistical Computing 5 (1984) 300;
 * at the highest point the slope of the parabola through it and its neighbours, held within the bounds of
 * Fritsch and Carlson, SIAM Journal on Numerical Analysis 17 (1980) 238, so that the summit may lie between points.
 * It has no scatter of its own: its interval comes from the readings' doubts by bootstrap, as the curve is no smooth function of its points.
 */
export const smooth: Curve = {
  id: "smooth",
  parameters: 0,
  weighed: false,
  needs: "a highest point with a drier and a wetter neighbour",
  fit(test, options) {
    if (distinctWaters(test) < 3) return "not-enough";
    const knots = knotsOf(test.waters, test.dries), line = throughKnots(knots), peak = summit(knots, line);
    if (!peak) return "no-peak";
    const at = (water: number): number => line.at(water);
    let reckoned: Reckoning | undefined;
    return {
      curve: smooth, used: test.waters.map((_, i) => i), at, peak, parameters: knots.x.length,
      sumOfSquares: test.waters.reduce((sum, water, i) => sum + (test.dries[i]! - at(water)) ** 2, 0),
      reckon: () => reckoned ??= reckon(test, { at, slope: line.slope }, peak, options),
    } satisfies FittedCurve;
  },
};

interface Knots { readonly x: readonly number[]; readonly y: readonly number[] }
interface Line { readonly slopes: readonly number[]; at(x: number): number; slope(x: number): number }

function knotsOf(waters: readonly number[], dries: readonly number[]): Knots {
  const groups = new Map<number, number[]>();
  waters.forEach((water, i) => groups.set(water, [...groups.get(water) ?? [], dries[i]!]));
  const x = [...groups.keys()].sort((a, b) => a - b);
  return { x, y: x.map((water) => groups.get(water)!.reduce((sum, dry, _, all) => sum + dry / all.length, 0)) };
}

function throughKnots({ x, y }: Knots): Line {
  const n = x.length, width = x.slice(1).map((b, i) => b - x[i]!), secant = width.map((h, i) => (y[i + 1]! - y[i]!) / h);
  const highest = y.indexOf(Math.max(...y));
  const slopes = x.map((_, i): number => {
    if (i === 0 || i === n - 1) return endSlope(i === 0 ? width[0]! : width[n - 2]!, i === 0 ? width[1]! : width[n - 3]!, i === 0 ? secant[0]! : secant[n - 2]!, i === 0 ? secant[1]! : secant[n - 3]!);
    const before = secant[i - 1]!, after = secant[i]!, h = width[i - 1]!, next = width[i]!;
    if (i === highest) {
      const parabolic = (next * before + h * after) / (h + next);
      // three times the secant of the leg it leans into: beyond that the leg would swing past its points
      return Math.max(3 * after, Math.min(3 * before, parabolic));
    }
    if (before * after <= 0) return 0;
    const share = (h + 2 * next) / (3 * (h + next));
    return before * after / (share * after + (1 - share) * before);
  });
  const piece = (value: number): number => {
    let i = 0;
    while (i < n - 2 && value > x[i + 1]!) i++;
    return i;
  };
  return {
    slopes,
    at(value) {
      const i = piece(value), h = width[i]!, t = (value - x[i]!) / h, s = 1 - t;
      return y[i]! * s * s * (1 + 2 * t) + y[i + 1]! * t * t * (3 - 2 * t) + h * t * s * (slopes[i]! * s - slopes[i + 1]! * t);
    },
    slope(value) {
      const i = piece(value), h = width[i]!, t = (value - x[i]!) / h;
      return 6 * t * (1 - t) * secant[i]! + slopes[i]! * (1 - t) * (1 - 3 * t) + slopes[i + 1]! * t * (3 * t - 2);
    },
  };
}

/** Slope at an end by the three points there, held so that the curve does not turn where the points do not. Source: Moler, Numerical Computing with MATLAB (2004), section 3.6. */
function endSlope(h: number, next: number, own: number, other: number): number {
  const slope = ((2 * h + next) * own - h * other) / (h + next);
  if (slope * own <= 0) return 0;
  return own * other <= 0 && Math.abs(slope) > 3 * Math.abs(own) ? 3 * own : slope;
}

function summit({ x, y }: Knots, { slopes, at, slope }: Line): { water: number; dry: number } | null {
  const i = y.indexOf(Math.max(...y));
  if (i === 0 || i === x.length - 1) return null;
  const lean = slopes[i]!, towards = lean >= 0 ? i + 1 : i - 1;
  // a neighbour as high as the point itself is the end of a flat top, whose slope there is nothing too
  const water = lean === 0 ? x[i]! : rootBetween(slope, x[i]!, x[i]! + (x[towards]! - x[i]!) * (1 - 1e-9), 1e-12, lean);
  return { water, dry: at(water) };
}

/**
 * A curve through every point takes the luckiest for its peak, and drawing again adds luck to luck. Reflecting the draws
 * about the peak takes that away (Efron and Tibshirani, section 13.4, the pivotal interval).
 */
function reflected({ low, high }: DrawnInterval, value: number): PeakInterval {
  return { low: Math.min(value, 2 * value - high!), high: Math.max(value, 2 * value - low!) };
}

function reckon({ waters, dries }: CompactionTest, line: Pick<Line, "at" | "slope">, peak: { readonly water: number; readonly dry: number }, { scatter }: FitOptions): Reckoning {
  const doubts = waters.map((water, i) => readingDoubt(water, dries[i]!, line.slope(water), scatter));
  const drawn = dries.slice();
  const [water, density] = bootstrap(2, (random, into) => {
    for (let i = 0; i < dries.length; i++) drawn[i] = dries[i]! + doubts[i]! * random.normal();
    const knots = knotsOf(waters, drawn), peak = summit(knots, throughKnots(knots));
    // the draw's densest point at an end: its peak lies beyond the data on that side
    const end = knots.y.indexOf(Math.max(...knots.y)) === 0 ? -Infinity : Infinity;
    into[0] = peak?.water ?? end;
    // without a peak the density is at least that of the highest point
    into[1] = peak?.dry ?? Math.max(...knots.y);
  }, { draws: DRAWS, seed: SEED, level: 0.95 });
  return {
    method: "bootstrap", widening: 1, optimumWater: { low: water!.low, high: water!.high },
    // where the optimum may lie outside the data, so may a greater density
    maxDryDensity: { ...reflected(density!, peak.dry), ...(water!.low === null || water!.high === null ? { high: null } : {}) },
    halfBand: (at) => 1.96 * readingDoubt(at, line.at(at), line.slope(at), scatter),
  };
}
