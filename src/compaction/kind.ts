import type { CompactionTest } from "./fit";
import { curveScatter, type Scatter } from "./scatter";

/**
 * Shape of a set of compaction points. Source: Lee and Suedkamp, "Characteristics of irregularly shaped compaction curves
 * of soils", Highway Research Record 381 (1972): four types.
 */
export type CurveKind = "one peak" | "one and a half peaks" | "two peaks" | "no distinct peak";

export interface KindOfCurve {
  readonly kind: CurveKind;
  /** what the kind rests on: the peaks inside the data, and the dip beside them, each as index of a point */
  readonly peaks: readonly number[];
  readonly dip: number | null;
}

/** A summit or a dip must stand out by this many standard deviations of a difference of two points, two-sided 95 %. */
const STANDS_OUT = 1.959963984540054 * Math.SQRT2;
/** From so many points on, one point alone makes no peak and no dip: the median of three neighbours is looked at. Common practice. */
const MANY = 10;

/**
 * The kind of a curve, from the ups and downs of its points that are greater than their scatter.
 * One and a half peaks: dry density falls from the dry end to a dip and rises to a peak, as clean sand that bulks does.
 */
export function kindOfCurve({ waters, dries }: Pick<CompactionTest, "waters" | "dries">, scatter: Scatter): KindOfCurve {
  const order = waters.map((_, i) => i).sort((a, b) => waters[a]! - waters[b]! || dries[a]! - dries[b]!);
  const heights = order.length >= MANY ? order.map((i, k) => k === 0 || k === order.length - 1 ? dries[i]! : [dries[order[k - 1]!]!, dries[i]!, dries[order[k + 1]!]!].sort((a, b) => a - b)[1]!) : order.map((i) => dries[i]!);
  const threshold = STANDS_OUT * curveScatter(dries, scatter), turns = turnsOf(heights, threshold), end = heights.length - 1;
  const ups = turns.filter(({ at, up }) => up && at > 0 && at < end), downs = turns.filter(({ at, up }) => !up && at > 0 && at < end);
  // beside a dip, a turn that does not stand out from the end next to it is that end; a lone peak needs no more than to be inside
  const stands = ({ at }: Turn): boolean => !(at === turns[0]!.at && Math.abs(heights[at]! - heights[0]!) <= threshold) && !(at === turns[turns.length - 1]!.at && Math.abs(heights[at]! - heights[end]!) <= threshold);
  const inner = downs.length === 0 ? ups : [...ups, ...downs].filter(stands).sort((a, b) => a.at - b.at);
  const peaks = inner.filter(({ up }) => up), dips = inner.filter(({ up }) => !up);
  const place = (at: number): number => order[at]!;
  const kind: CurveKind = peaks.length === 0 ? "no distinct peak" : peaks.length >= 2 ? "two peaks" : dips.some(({ at }) => at < peaks[0]!.at) ? "one and a half peaks" : dips.length > 0 ? "two peaks" : "one peak";
  return { kind, peaks: peaks.map(({ at }) => place(at)), dip: dips.length > 0 ? place(dips[0]!.at) : null };
}

interface Turn { readonly at: number; readonly up: boolean }

/** The highs and lows of a line that differ from their neighbours by more than a threshold, its ends among them. */
function turnsOf(heights: readonly number[], threshold: number): Turn[] {
  const turns: Turn[] = [];
  let high = 0, low = 0, going: "up" | "down" | null = null;
  heights.forEach((height, k) => {
    if (height > heights[high]!) high = k;
    if (height < heights[low]!) low = k;
    if (going !== "up" && height - heights[low]! > threshold) {
      turns.push({ at: low, up: false });
      going = "up";
      high = k;
    } else if (going !== "down" && heights[high]! - height > threshold) {
      turns.push({ at: high, up: true });
      going = "down";
      low = k;
    }
    if (going === "up") { if (height >= heights[high]!) high = k; low = k; }
    if (going === "down") { if (height <= heights[low]!) low = k; high = k; }
  });
  if (going === "up") turns.push({ at: high, up: true });
  if (going === "down") turns.push({ at: low, up: false });
  return turns;
}

/**
 * What the liquid limit leads one to expect: 30 to 70 one peak; below 30 two, or one and a half; above 70 two, or an odd shape.
 * Source: Lee and Suedkamp (1972), from memory.
 */
export function usualKinds(liquidLimit: number): readonly CurveKind[] {
  return liquidLimit >= 30 && liquidLimit <= 70 ? ["one peak"] : liquidLimit < 30 ? ["one peak", "two peaks", "one and a half peaks"] : ["one peak", "two peaks", "no distinct peak"];
}
