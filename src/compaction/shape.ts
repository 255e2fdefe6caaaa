import type { CompactionTest, NoFit } from "./fit";
import { distinctWaters } from "./curves/curve";
import { kindOfCurve } from "./kind";
import type { Scatter } from "./scatter";

type Reason = Pick<NoFit, "why" | "says">;

/** Densities closer together than this share show no peak. Half the scatter of a careful test; common practice, no published source. */
const FLAT = 0.001;

const figure = (value: number): string => String(Number(value.toPrecision(4)));

/** What stops any curve: too few points, or no spread in water content or in density. */
export function tooLittle(test: CompactionTest): Reason | undefined {
  const n = test.waters.length, distinct = distinctWaters(test);
  if (n < 3) return { why: "too-few-points", says: `${n === 0 ? "there are no points" : n === 1 ? "there is one point" : "there are only two points"}: a peak needs at least three, and a test should have five.` };
  if (distinct === 1) return { why: "no-spread", says: `all ${n} points have the same water content, ${figure(test.waters[0]!)} %: a curve needs different ones.` };
  if (distinct < 3) return { why: "too-few-points", says: `the ${n} points have only two different water contents: a peak needs at least three.` };
  const most = Math.max(...test.dries), least = Math.min(...test.dries);
  if (most - least <= FLAT * most) return { why: "flat", says: `the dry densities are all alike, ${figure(least)} to ${figure(most)}: there is no peak to find. Clean sands are better judged by relative density.` };
  return undefined;
}

/** Points with more than one peak, or with a dip on the dry side: what they are, and what to do instead of one curve. */
export function notOnePeak(test: CompactionTest, scatter: Scatter): Reason | undefined {
  const { waters, dries } = test, { kind, peaks, dip } = kindOfCurve(test, scatter), at = (i: number): string => figure(waters[i]!);
  if (kind === "one and a half peaks" && peaks.length === 1 && dip !== null)
    return { why: "not-one-peak", says: `dry density falls from the dry end to a dip at ${at(dip)} % and rises to ${figure(dries[peaks[0]!]!)} at ${at(peaks[0]!)} %, one and a half peaks. Clean sand bulks so: judge it by relative density (minimum and maximum density). For another soil ask for "top three", which rests on the points about the wet peak.` };
  if (kind === "two peaks")
    return { why: "not-one-peak", says: `the points have two peaks${peaks.length > 1 ? `, at ${at(peaks[0]!)} and ${at(peaks[1]!)} %` : ""}${dip === null ? "" : `, with a dip at ${at(dip)} % between them`}: one curve cannot follow both. Repeat the points at the dip; where they stand, report both peaks ("top three" follows the higher).` };
  return undefined;
}

/** Why no peak stands inside the data, from the look of the points. */
export function whyNoPeak(test: CompactionTest, opensUpward: boolean, scatter: Scatter): Reason {
  const { waters, dries } = test;
  const odd = notOnePeak(test, scatter);
  if (odd) return odd;
  const order = waters.map((_, i) => i).sort((a, b) => waters[a]! - waters[b]!);
  const driest = order[0]!, wettest = order[order.length - 1]!;
  const most = Math.max(...dries);
  if (dries[wettest] === most) return { why: "rising", says: `dry density is highest at the wettest point, ${figure(waters[wettest]!)} %: the peak is not reached. Add points wetter than that.` };
  if (dries[driest] === most) return { why: "falling", says: `dry density is highest at the driest point, ${figure(waters[driest]!)} %: the peak is not reached. Add points drier than that.` };
  if (opensUpward) return { why: "valley", says: "the points form a valley, not a peak: check that water contents and dry densities are paired rightly, and that none was swapped. Clean sands that bulk are better judged by relative density." };
  return { why: "peak-outside", says: "the fitted curve has no peak between the driest and the wettest point. Add points on the side where it still rises, or choose another curve." };
}
