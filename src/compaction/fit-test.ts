import { findAll, type Finding, type Rule } from "../findings/finding";
import { airVoidsOfPoint, degreeOfSaturation } from "../phase/lines";
import { curveOf } from "./curves";
import { residualsOf, spareOf, type Curve, type FitOptions, type FittedCurve } from "./curves/curve";
import { distinctWaters } from "./curves/curve";
import { curveName, type CompactionTest, type CurveWord, type Fit, type FitOutcome, type NoFit, type OtherCurve, type PeakIntervals, type PeakPlace } from "./fit";
import { peaksLeavingOneOut } from "./leave-one-out";
import { curveRules } from "./quality";
import { outlier } from "./quality/outlier";
import type { CurveSubject } from "./quality/subject";
import { FOLLOWS } from "./quality/thresholds";
import { curveScatter, USUAL_SCATTER, type Scatter } from "./scatter";
import { notOnePeak, tooLittle, whyNoPeak } from "./shape";
import { joinedInterval, othersThan, TELLING, weighCurves, type Weighing } from "./weighing";

interface TestOptions extends FitOptions { readonly rules: readonly Rule<CurveSubject>[] }

/**
 * Fits a compaction test. Every number that is said of the test anywhere comes from the object this returns.
 * `auto` weighs the curves (weighing.ts); of curves within a difference that tells nothing the plainest is taken.
 * Densities, the density of water and the results are in one unit; water contents in percent of dry mass.
 */
export function fitTest(test: CompactionTest, word: CurveWord, { scatter = USUAL_SCATTER, weigh = false, rules = curveRules }: { readonly scatter?: Scatter; readonly weigh?: boolean; readonly rules?: readonly Rule<CurveSubject>[] } = {}): FitOutcome {
  const options: TestOptions = { scatter, weigh, rules };
  const little = tooLittle(test);
  if (little) return refuse(test, options, little);
  return word === "auto" ? fitByWeighing(test, options) : fitAsAsked(test, curveOf(word), options);
}

function fitAsAsked(test: CompactionTest, curve: Curve, options: TestOptions): FitOutcome {
  const found = curve.fit(test, options);
  if (typeof found === "object") return { ok: true, fit: finish(test, options, found, () => weighCurves(test, options, found), "as asked for") };
  if (found === "not-enough" && curve.id === "saturation" && test.specificGravity === undefined)
    return refuse(test, options, { why: "needs-gravity", says: "the saturation curve is bounded by the zero-air-voids line: give the specific gravity of the soil." });
  if (found === "no-peak" || curve.id === "top three" || curve.id === "smooth") return refuse(test, options, whyNoPeak(test, opensUpward(test), options.scatter));
  return refuse(test, options, { why: "too-few-points", says: `a ${curveName(curve.id)} needs ${curve.needs}; there are ${distinctWaters(test)}.` });
}

/** Whether the plainest curve through the points is a valley. */
function opensUpward({ waters, dries }: CompactionTest): boolean {
  // the curvature of the least-squares parabola has the sign of its contrast over the points
  const n = waters.length, mean = waters.reduce((a, w) => a + w / n, 0), centred = waters.map((w) => w - mean);
  const s2 = centred.reduce((a, w) => a + w * w, 0), s3 = centred.reduce((a, w) => a + w ** 3, 0);
  const contrast = centred.map((w) => w * w - s2 / n - (s3 / s2) * w);
  return contrast.reduce((sum, c, i) => sum + c * dries[i]!, 0) >= 0;
}

function fitByWeighing(test: CompactionTest, options: TestOptions): FitOutcome {
  const weighing = weighCurves(test, options);
  if (test.waters.length === 3) {
    const found = curveOf("top three").fit(test, options);
    if (typeof found !== "object") return refuse(test, options, whyNoPeak(test, opensUpward(test), options.scatter));
    return { ok: true, fit: finish(test, options, found, () => weighing, "with three points there is only the parabola through them, and no spare point to judge it by") };
  }
  // one curve through two peaks, or through a dip, would look right and be wrong: such points are not weighed at all
  const odd = notOnePeak(test, options.scatter);
  if (odd) return refuse(test, options, odd);
  const { admitted, left, pastLine } = weighing, scatter = curveScatter(test.dries, options.scatter);
  const least = Math.min(...admitted.map(({ weight }) => weight));
  // curves stand in the order of their parameters: the first that is as good as the best is the plainest
  const best = admitted.find(({ weight }) => weight < least + TELLING);
  if (!best) {
    return refuse(test, options, pastLine
      ? { why: "no-curve-follows", says: `the peak of every curve lies past the zero-air-voids line for a specific gravity of ${test.specificGravity}: check the specific gravity and the readings.` }
      : whyNoPeak(test, opensUpward(test), options.scatter));
  }
  const { fitted } = best;
  if (Math.sqrt(fitted.sumOfSquares / spareOf(fitted)) > FOLLOWS * scatter) {
    const off = residualsOf(test, fitted).map(Math.abs), worst = off.indexOf(Math.max(...off));
    return refuse(test, options, {
      why: "no-curve-follows",
      says: `no curve follows these points: the best, a ${curveName(fitted.curve.id)}, misses the point at ${shown(test.waters[worst]!)} % by ${shown(off[worst]!)}. ${pastLine ? `The peak of every other lies past the zero-air-voids line for a specific gravity of ${test.specificGravity}: check that too. ` : ""}Check the readings${findAll([outlier], subject(test, options, null)).length > 0 ? ", first the stray ones among the findings" : ""}; where they are right, ask for "top three", which rests on the highest point and its neighbours alone.`,
    });
  }
  const against = admitted.filter((one) => one !== best).map((one) => `${one.weight.toFixed(1)} for the ${curveName(one.fitted.curve.id)}`);
  const reason = against.length > 0
    ? `${best.weight > least ? "the plainer curve, and as good" : "weighs least"}: ${best.weight.toFixed(1)} against ${[...against, ...left].join("; ")} (RSS/σ² + 2p, σ ${percent(options.scatter.curve)} % of dry density)`
    : `the only curve admitted (${left.join("; ") || "no other"})`;
  return { ok: true, fit: finish(test, options, fitted, () => weighing, reason) };
}

const shown = (value: number): string => String(Number(value.toPrecision(3)));
const percent = (share: number): string => String(Number((100 * share).toPrecision(3)));

function finish(test: CompactionTest, options: TestOptions, fitted: FittedCurve, weighing: () => Weighing, reason: string): Fit {
  const spare = spareOf(fitted), { peak, at } = fitted, reckoning = fitted.reckon();
  const { specificGravity, waterDensity } = test;
  const atPeak = specificGravity === undefined ? undefined : { dryDensity: peak.dry, waterContent: peak.water, specificGravity, waterDensity };
  let leftOut: (PeakPlace | null)[] | undefined, joined: PeakIntervals | undefined, others: OtherCurve[] | undefined, findings: Finding[] | undefined;
  const fit: Fit = {
    test, reason, curve: fitted.curve.id, used: fitted.used, parameters: fitted.parameters, at,
    maxDryDensity: { value: peak.dry, ...reckoning.maxDryDensity },
    optimumWater: { value: peak.water, ...reckoning.optimumWater },
    standardError: spare > 0 ? Math.sqrt(fitted.sumOfSquares / spare) : null,
    widening: reckoning.widening,
    intervalFrom: reckoning.widening > 1 ? "stated scatter, widened" : "stated scatter",
    intervalNote: intervalNote(options.scatter, reckoning.widening, spare, reckoning.optimumWater),
    residuals: residualsOf(test, fitted),
    saturationAtOptimum: atPeak ? positive(degreeOfSaturation.value(atPeak)) : null,
    airVoidsAtOptimum: atPeak ? airVoidsOfPoint.value(atPeak) : null,
    // a cell that asks for the peak alone does not wait for the other curves
    get otherCurves() { return others ??= othersThan(fitted, weighing()); },
    joined: () => joined ??= joinedInterval(reckoning, fit.otherCurves),
    leaveOneOut: () => leftOut ??= peaksLeavingOneOut(test, fitted, options),
    bandAt(water) {
      const half = reckoning.halfBand(water), middle = at(water);
      return { low: middle - half, high: middle + half };
    },
    get findings() { return findings ??= findAll(options.rules, subject(test, options, fit)); },
  };
  return fit;
}

const positive = (value: number): number | null => value > 0 && Number.isFinite(value) ? value : null;

function intervalNote(scatter: Scatter, widening: number, spare: number, { low, high }: { readonly low: number | null; readonly high: number | null }): string {
  const stated = `95 %, from a stated scatter of ${percent(scatter.wetDensity)} % in wet density and ${scatter.water} points in water content`;
  const from = spare <= 0 ? `${stated}: no point is left over to judge the curve by`
    : widening > 1 ? `${stated}, widened ${widening.toFixed(1)} times because the points scatter more`
      : `${stated}, which the ${spare === 1 ? "one spare point does" : `${spare} spare points do`} not exceed`;
  if (low === null && high === null) return `${from}. The optimum is not located within these data.`;
  if (low === null || high === null) return `${from}. The optimum is not bounded on the ${low === null ? "dry" : "wet"} side by these data.`;
  return `${from}.`;
}

function subject(test: CompactionTest, options: TestOptions, fit: Fit | null): CurveSubject {
  const three = curveOf("top three").fit(test, options);
  const highest = test.dries.indexOf(Math.max(...test.dries));
  return {
    test, fit,
    scatter: options.scatter,
    optimum: fit?.optimumWater.value ?? test.waters[highest] ?? null,
    topThreePeak: typeof three === "object" ? three.peak.dry : null,
  };
}

const refuse = (test: CompactionTest, options: TestOptions, { why, says }: Pick<NoFit, "why" | "says">): FitOutcome =>
  ({ ok: false, noFit: { why, says, findings: findAll(options.rules, subject(test, options, null)) } });
