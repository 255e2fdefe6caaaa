import { NORMAL_95, studentQuantile } from "../numerics/distributions";
import { scaled, spreadAt, unscaled, valueAt, type PolynomialFit } from "../numerics/polynomial";
import { findAll } from "../findings/finding";
import { airVoidsOfPoint, degreeOfSaturation, LINE_ALLOWANCE, zeroAirVoids } from "../phase/lines";
import { curveOf, curves } from "./curves";
import { distinctWaters, fitCurve, type Curve } from "./curves/curve";
import type { CompactionTest, CurveId, CurveWord, Fit, FitOutcome, NoFit } from "./fit";
import { peakIntervals, peakOf } from "./peak";
import { curveRules } from "./quality";
import { outlier } from "./quality/outlier";
import type { CurveSubject } from "./quality/subject";
import { FOLLOWS } from "./quality/thresholds";
import { statedScatter, STATED_SCATTER } from "./scatter";
import { tooLittle, whyNoPeak } from "./shape";

/** A curve fitted to a test, with its peak inside the data. */
interface Candidate {
  readonly curve: Curve;
  readonly used: readonly number[];
  readonly polynomial: PolynomialFit;
  readonly peak: number;
}

/**
 * Fits a compaction test. Every number that is said of the test anywhere comes from the object this returns.
 *
 * `auto` weighs the parabola and the cubic by RSS/σ₀² + 2p with a stated scatter σ₀ (0.5 % of the highest dry density),
 * among those with their peak inside the data, not past the zero-air-voids line, and with at least one spare point;
 * the cubic must weigh at least 2 less than the parabola, as a smaller difference tells nothing.
 * (A criterion that estimates its own variance is undefined on tests of four to six points.) Source of the criterion:
 * Akaike's, with known variance; Burnham and Anderson, Model Selection and Multimodel Inference, section 2.2.
 *
 * Densities, the density of water and the results are in one unit; water contents in percent of dry mass.
 */
export function fitTest(test: CompactionTest, word: CurveWord): FitOutcome {
  const little = tooLittle(test);
  if (little) return refuse(test, little);
  return word === "auto" ? fitByWeighing(test) : fitAsAsked(test, curveOf(word));
}

function candidate(curve: Curve, test: CompactionTest): Candidate | "not-enough" | "no-peak" {
  const fitted = fitCurve(curve, test);
  if (!fitted) return "not-enough";
  const peak = peakOf(fitted.polynomial);
  return peak === null ? "no-peak" : { curve, ...fitted, peak };
}

function fitAsAsked(test: CompactionTest, curve: Curve): FitOutcome {
  const found = candidate(curve, test);
  if (typeof found === "object") return { ok: true, fit: finish(test, found, "as asked for") };
  if (found === "no-peak" || curve.id === "top three") return refuse(test, whyNoPeak(test, opensUpward(test)));
  return refuse(test, { why: "too-few-points", says: `a ${curve.id} needs ${curve.needs}; there are ${distinctWaters(test)}.` });
}

const opensUpward = (test: CompactionTest): boolean => (fitCurve(curveOf("parabola"), test)?.polynomial.coefficients[2] ?? -1) >= 0;

function fitByWeighing(test: CompactionTest): FitOutcome {
  if (test.waters.length === 3) {
    const found = candidate(curveOf("top three"), test);
    if (typeof found !== "object") return refuse(test, whyNoPeak(test, opensUpward(test)));
    return { ok: true, fit: finish(test, found, "with three points there is only the parabola through them, and no spare point to judge it by") };
  }
  const scatter = statedScatter(test.dries);
  const admitted: { found: Candidate; weight: number }[] = [];
  const left: string[] = [];
  let pastLine = false;
  for (const curve of curves) {
    if (!curve.weighed) continue;
    const found = candidate(curve, test);
    if (found === "not-enough") left.push(`${curve.id}: too few points`);
    else if (found === "no-peak") left.push(`${curve.id}: no peak inside the data`);
    else if (spare(found) < 1) left.push(`${curve.id}: no spare point`);
    else if (peakPastLine(test, found)) {
      pastLine = true;
      left.push(`${curve.id}: its peak lies past the zero-air-voids line`);
    }
    else admitted.push({ found, weight: found.polynomial.sumOfSquares / scatter ** 2 + 2 * (curve.degree + 1) });
  }
  const least = Math.min(...admitted.map(({ weight }) => weight));
  // curves stand in the order of their parameters: the first that is as good as the best is the plainest
  const best = admitted.find(({ weight }) => weight < least + TELLING);
  if (!best) {
    return refuse(test, pastLine
      ? { why: "no-curve-follows", says: `the peak of every curve lies past the zero-air-voids line for a specific gravity of ${test.specificGravity}: check the specific gravity and the readings.` }
      : whyNoPeak(test, opensUpward(test)));
  }
  const others = admitted.filter((one) => one !== best);

  const { polynomial, used, curve } = best.found;
  if (Math.sqrt(polynomial.sumOfSquares / spare(best.found)) > FOLLOWS * scatter) {
    const worst = used.reduce((a, b) => Math.abs(residual(test, polynomial, b)) > Math.abs(residual(test, polynomial, a)) ? b : a);
    return refuse(test, {
      why: "no-curve-follows",
      says: `no curve follows these points: the best, a ${curve.id}, misses the point at ${shown(test.waters[worst]!)} % by ${shown(Math.abs(residual(test, polynomial, worst)))}. Check the readings${findAll([outlier], subject(test, null)).length > 0 ? ", first the stray ones among the findings" : ""}; where they are right, ask for "top three", which rests on the highest point and its neighbours alone.`,
    });
  }
  const against = others.map(({ found, weight }) => `${weight.toFixed(1)} for the ${found.curve.id}`);
  const reason = against.length > 0
    ? `${best.weight > least ? "the plainer curve, and as good" : "weighs least"}: ${best.weight.toFixed(1)} against ${[...against, ...left].join("; ")} (RSS/σ² + 2p, σ ${100 * STATED_SCATTER} % of dry density)`
    : `the only curve admitted (${left.join("; ") || "no other"})`;
  return { ok: true, fit: finish(test, best.found, reason) };
}

/** A difference of the criterion below this tells nothing between two curves. Burnham and Anderson, section 2.6. */
const TELLING = 2;

const shown = (value: number): string => String(Number(value.toPrecision(3)));
const spare = ({ used, curve }: Candidate): number => used.length - curve.degree - 1;
const residual = ({ waters, dries }: CompactionTest, polynomial: PolynomialFit, i: number): number => dries[i]! - valueAt(polynomial, scaled(polynomial, waters[i]!));

function peakPastLine({ specificGravity, waterDensity }: CompactionTest, { polynomial, peak }: Candidate): boolean {
  if (specificGravity === undefined) return false;
  const line = zeroAirVoids.value({ waterContent: unscaled(polynomial, peak), specificGravity, waterDensity });
  return valueAt(polynomial, peak) > line * (1 + LINE_ALLOWANCE);
}

function finish(test: CompactionTest, found: Candidate, reason: string): Fit {
  const { polynomial, used, curve, peak } = found;
  const left = spare(found);
  const standardError = left > 0 ? Math.sqrt(polynomial.sumOfSquares / left) : null;
  const k = standardError === null ? NORMAL_95 * statedScatter(test.dries) : studentQuantile(0.025, left) * standardError;
  const { maxDryDensity, optimumWater } = peakIntervals(polynomial, peak, k);
  const at = (water: number): number => valueAt(polynomial, scaled(polynomial, water));
  const { specificGravity, waterDensity } = test;
  const atPeak = specificGravity === undefined ? undefined : { dryDensity: maxDryDensity.value, waterContent: optimumWater.value, specificGravity, waterDensity };
  const fit: Fit = {
    test, curve: curve.id as CurveId, reason, maxDryDensity, optimumWater, standardError, used,
    intervalFrom: standardError === null ? "stated scatter" : "scatter of the points",
    intervalNote: intervalNote(standardError === null, left, optimumWater.low === null, optimumWater.high === null),
    parameters: curve.degree + 1,
    residuals: test.waters.map((_, i) => residual(test, polynomial, i)),
    saturationAtOptimum: atPeak ? positive(degreeOfSaturation.value(atPeak)) : null,
    airVoidsAtOptimum: atPeak ? airVoidsOfPoint.value(atPeak) : null,
    at,
    bandAt(water) {
      const half = k * Math.sqrt(spreadAt(polynomial, scaled(polynomial, water)).value), middle = at(water);
      return { low: middle - half, high: middle + half };
    },
    findings: [],
  };
  return { ...fit, findings: findAll(curveRules, subject(test, fit)) };
}

const positive = (value: number): number | null => value > 0 && Number.isFinite(value) ? value : null;

function intervalNote(stated: boolean, spareCount: number, openLow: boolean, openHigh: boolean): string {
  const from = stated
    ? `95 %, from a stated scatter of ${100 * STATED_SCATTER} % of dry density: no point is left over to judge the curve by`
    : `95 %, from the scatter about the curve with ${spareCount} spare point${spareCount === 1 ? "" : "s"}`;
  if (openLow && openHigh) return `${from}. The optimum is not located within these data.`;
  if (openLow || openHigh) return `${from}. The optimum is not bounded on the ${openLow ? "dry" : "wet"} side by these data.`;
  return `${from}.`;
}

function subject(test: CompactionTest, fit: Fit | null): CurveSubject {
  const three = candidate(curveOf("top three"), test);
  const highest = test.dries.indexOf(Math.max(...test.dries));
  return {
    test, fit,
    optimum: fit?.optimumWater.value ?? test.waters[highest] ?? null,
    topThreePeak: typeof three === "object" ? valueAt(three.polynomial, three.peak) : null,
  };
}

const refuse = (test: CompactionTest, { why, says }: Pick<NoFit, "why" | "says">): FitOutcome =>
  ({ ok: false, noFit: { why, says, findings: findAll(curveRules, subject(test, null)) } });
