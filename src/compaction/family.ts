import { fitTest } from "./fit-test";
import type { CompactionTest, CurveWord, Fit, PeakPlace } from "./fit";

/** One curve of a family. */
export interface FamilyCurve { readonly id: string; readonly fit: Fit }

export interface Family {
  /** by maximum dry density, the lightest soil first */
  readonly curves: readonly FamilyCurve[];
  /** curves that could not be fitted, with the reason */
  readonly left: readonly { readonly id: string; readonly says: string }[];
  /** what is doubtful about the family as a whole */
  readonly doubts: readonly string[];
}

/** Fewest curves of a family. Source: AASHTO R 75. */
export const LEAST_CURVES = 3;

/** A family of compaction curves of related soils made by one method. Source: AASHTO R 75. */
export function familyOf(tests: readonly { readonly id: string; readonly test: CompactionTest }[], word: CurveWord): Family {
  const curves: FamilyCurve[] = [], left: { id: string; says: string }[] = [];
  for (const { id, test } of tests) {
    const outcome = fitTest(test, word);
    if (outcome.ok) curves.push({ id, fit: outcome.fit }); else left.push({ id, says: outcome.noFit.says });
  }
  return familyFrom(curves, left);
}

/** A family from curves that are fitted already. */
export function familyFrom(fitted: readonly FamilyCurve[], left: Family["left"] = []): Family {
  const curves = [...fitted].sort((a, b) => a.fit.maxDryDensity.value - b.fit.maxDryDensity.value);
  const doubts: string[] = [];
  if (curves.length < LEAST_CURVES) doubts.push(`a family needs at least ${LEAST_CURVES} curves; there ${curves.length === 1 ? "is" : "are"} ${curves.length}.`);
  for (let i = 1; i < curves.length; i++) {
    const lighter = curves[i - 1]!, heavier = curves[i]!;
    if (heavier.fit.optimumWater.value > lighter.fit.optimumWater.value)
      doubts.push(`curve ${heavier.id} is denser than curve ${lighter.id} and yet wetter at its optimum (${one(heavier.fit.optimumWater.value)} against ${one(lighter.fit.optimumWater.value)} %): they are not of one family.`);
  }
  return { curves, left, doubts };
}

const one = (value: number): string => value.toFixed(1);

export const pickRules = ["between", "nearest"] as const;
export type PickRule = (typeof pickRules)[number];

/** The point must be this wet, as a share of the optimum of the curve it picks. Source: AASHTO T 272. */
export const PICK_SHARE = { from: 0.8, to: 1 } as const;
const RULE_WORDS = "AASHTO T 272: the point must lie at 80 to 100 % of the optimum of the curve it picks, and inside the family";

export type Picked =
  | { readonly ok: true; readonly peak: PeakPlace; readonly curves: readonly string[] }
  | { readonly ok: false; readonly says: string };

/**
 * One-point method: the peak of a field soil from one compacted point and a family of curves.
 * `between` takes the peak as far between two neighbouring curves as the point lies between them; `nearest` takes the nearest curve's.
 */
export function pickFromFamily({ curves }: Family, point: PeakPlace, rule: PickRule): Picked {
  if (curves.length === 0) return { ok: false, says: "no curve of the family could be fitted." };
  // how far the point stands above each curve at its own water content; a curve that was not measured there says nothing
  const above = curves.flatMap(({ id, fit }) => {
    const waters = fit.used.map((i) => fit.test.waters[i]!), peak = { water: fit.optimumWater.value, dry: fit.maxDryDensity.value };
    return point.water < Math.min(...waters) || point.water > Math.max(...waters) ? [] : [{ id, peak, by: point.dry - fit.at(point.water) }];
  });
  if (above.length === 0) return { ok: false, says: `no curve of the family was measured at ${one(point.water)} %. Compact the point at another water content, or run a full test.` };
  const answer = rule === "nearest" ? nearest(above) : between(above);
  if (!answer) return { ok: false, says: `the point, ${point.dry} at ${one(point.water)} %, lies outside the family: run a full test (${RULE_WORDS}).` };
  const share = point.water / answer.peak.water;
  if (share < PICK_SHARE.from || share > PICK_SHARE.to)
    return { ok: false, says: `the point is at ${(100 * share).toFixed(0)} % of the optimum of the curve it picks, ${one(answer.peak.water)} %: compact it again ${share < PICK_SHARE.from ? "wetter" : "drier"} (${RULE_WORDS}).` };
  return { ok: true, ...answer };
}

interface Above { readonly id: string; readonly peak: PeakPlace; readonly by: number }

function nearest(above: readonly Above[]): { peak: PeakPlace; curves: string[] } {
  const best = above.reduce((a, b) => Math.abs(b.by) < Math.abs(a.by) ? b : a);
  return { peak: best.peak, curves: [best.id] };
}

/** A point this near to a curve, as a share of its density, lies on it: well inside the scatter of a point. Common practice, no published source. */
const ON = 0.0005;

function between(above: readonly Above[]): { peak: PeakPlace; curves: string[] } | null {
  const close = nearest(above), by = above.find(({ id }) => id === close.curves[0])!.by;
  if (Math.abs(by) <= ON * close.peak.dry) return close;
  // the curves stand by density: the point is above the lighter and below the heavier of the two it lies between
  for (let i = 1; i < above.length; i++) {
    const lighter = above[i - 1]!, heavier = above[i]!;
    if (!(lighter.by > 0 && heavier.by < 0)) continue;
    const share = lighter.by / (lighter.by - heavier.by), mix = (a: number, b: number): number => a + share * (b - a);
    return { peak: { water: mix(lighter.peak.water, heavier.peak.water), dry: mix(lighter.peak.dry, heavier.peak.dry) }, curves: [lighter.id, heavier.id] };
  }
  return null;
}
