import { fitNonlinear } from "../numerics/nonlinear-least-squares";
import { studentQuantile } from "../numerics/distributions";
import { relation } from "../relations/relation";

const output = { title: "FM 5-434", clause: "output of rollers; a pass is one traverse" };

/** Compacted m³ an hour: m, km/h, mm. */
export const rollRateSi = relation("rollRate", "drumWidth * rollerSpeed * thickness * efficiency / 100 / rollerPasses", output);
/** Compacted yd³ an hour: ft, mph, in. */
export const rollRateUs = relation("rollRate", "drumWidth * rollerSpeed * 5280 * thickness / 12 / 27 * efficiency / 100 / rollerPasses", output);

export interface RollerTrial {
  /** dry density that no number of passes exceeds, with its 95 % interval (null where nothing is left over to tell it) */
  readonly plateau: number;
  readonly low: number | null;
  readonly high: number | null;
  /** density at no pass, and how fast the plateau is approached: ρ = plateau − gain·exp(−passes/per) */
  readonly gain: number;
  readonly per: number;
  readonly standardError: number | null;
}

/**
 * A roller trial: density grows with passes towards a plateau, each pass gaining a constant share of what is left.
 * Form: common practice, no published source. Null where the densities do not rise towards anything.
 */
export function rollerTrial(passes: readonly number[], dries: readonly number[]): RollerTrial | null {
  const n = passes.length, most = Math.max(...dries), least = Math.min(...dries), last = Math.max(...passes);
  if (!(most > least)) return null;
  let best: ReturnType<typeof fitNonlinear> | undefined;
  for (const per of [last / 6, last / 3, last]) {
    const fit = fitNonlinear({
      points: n, parameters: 3,
      evaluate(at, residuals, jacobian) {
        const [plateau, gain, rate] = at as unknown as [number, number, number];
        for (let i = 0; i < n; i++) {
          const left = Math.exp(-passes[i]! / rate);
          residuals[i] = plateau - gain * left - dries[i]!;
          if (jacobian) {
            jacobian[3 * i] = 1;
            jacobian[3 * i + 1] = -left;
            jacobian[3 * i + 2] = -gain * left * passes[i]! / (rate * rate);
          }
        }
      },
    }, [most, most - least, per], { low: [0, 0, last / 100], high: [10 * most, 10 * most, 20 * last] });
    if (!best || fit.sumOfSquares < best.sumOfSquares) best = fit;
  }
  const [plateau, gain, per] = best!.parameters as unknown as [number, number, number];
  if (!(gain > 0) || best!.onBound[1] || best!.onBound[2]) return null;
  const spare = n - 3, standardError = spare > 0 ? Math.sqrt(best!.sumOfSquares / spare) : null;
  const half = standardError === null ? null : studentQuantile(0.025, spare) * standardError * Math.sqrt(plateauVariance(best!.jacobian, n));
  return { plateau, gain, per, standardError, low: half === null ? null : plateau - half, high: half === null ? null : plateau + half };
}

/** First entry of (JᵀJ)⁻¹ for three parameters, by cofactors. */
function plateauVariance(jacobian: Float64Array, n: number): number {
  const m = [0, 0, 0, 0, 0, 0, 0, 0, 0];
  for (let i = 0; i < n; i++) for (let a = 0; a < 3; a++) for (let b = 0; b < 3; b++) m[3 * a + b]! += jacobian[3 * i + a]! * jacobian[3 * i + b]!;
  const cofactor = m[4]! * m[8]! - m[5]! * m[7]!;
  const determinant = m[0]! * cofactor - m[1]! * (m[3]! * m[8]! - m[5]! * m[6]!) + m[2]! * (m[3]! * m[7]! - m[4]! * m[6]!);
  return cofactor / determinant;
}

/** Passes after which a density is reached; null where the plateau lies below it. */
export function passesTo({ plateau, gain, per }: RollerTrial, target: number): number | null {
  return target >= plateau ? null : Math.max(0, per * Math.log(gain / (plateau - target)));
}

/** The pass after which a further one gains less than this. */
export function lastUsefulPass({ gain, per }: RollerTrial, least: number): number {
  const first = gain * (1 - Math.exp(-1 / per));
  return first <= least ? 0 : Math.ceil(per * Math.log(first / least) - 1e-9);
}
