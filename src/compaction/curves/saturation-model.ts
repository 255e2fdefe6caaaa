import { fitNonlinear, type LeastSquaresFit, type LeastSquaresModel } from "../../numerics/nonlinear-least-squares";

/**
 * A compaction curve from how saturation grows with water: it follows a line of constant saturation on the wet side and
 * therefore never crosses the zero-air-voids line.
 * Source: Li and Sego, "Equation for complete compaction curve of fine-grained soils and its applications", in
 * Constructing and Controlling Compaction of Earth Fills, ASTM STP 1384 (2000); form from memory, its boundary values checked.
 *
 * Saturation, with x = (wm − w)/wm and q = p/wm:  S = Sm (1 − xⁿ⁺¹ (1 + qⁿ)/(xⁿ + qⁿ)) up to wm, S = Sm beyond.
 */
export interface SaturationParameters {
  /** greatest degree of saturation, a fraction up to 1 */
  readonly mostSaturation: number;
  /** water content, percent, at which it is reached */
  readonly waterThere: number;
  /** sharpness of the turn near the top */
  readonly sharpness: number;
  /** shape of the dry leg, as a share of the water content above */
  readonly dryShape: number;
}

type Vector = readonly [mostSaturation: number, waterThere: number, sharpness: number, dryShape: number];

export const asParameters = ([mostSaturation, waterThere, sharpness, dryShape]: ArrayLike<number> & Iterable<number>): SaturationParameters =>
  ({ mostSaturation: mostSaturation!, waterThere: waterThere!, sharpness: sharpness!, dryShape: dryShape! });

/** Degree of saturation as a fraction, and (where asked for) its derivatives by the four parameters. */
function saturation(water: number, [most, there, sharpness, shape]: Vector, slopes: Float64Array | null): number {
  if (water >= there) {
    if (slopes) { slopes[0] = 1; slopes[1] = slopes[2] = slopes[3] = 0; }
    return most;
  }
  const x = (there - water) / there;
  const xn = x ** sharpness, qn = shape ** sharpness;
  const lacking = x * xn * (1 + qn) / (xn + qn);
  if (slopes) {
    const logX = Math.log(x), logQ = Math.log(shape);
    const byX = (sharpness + 1) / x - sharpness * xn / x / (xn + qn);
    slopes[0] = 1 - lacking;
    slopes[1] = -most * lacking * byX * water / (there * there);
    slopes[2] = -most * lacking * (logX + qn * logQ / (1 + qn) - (xn * logX + qn * logQ) / (xn + qn));
    slopes[3] = -most * lacking * sharpness * qn / shape * (1 / (1 + qn) - 1 / (xn + qn));
  }
  return most * (1 - lacking);
}

/** Dry density on the curve, in the unit of the density of water. */
export function saturationCurve(water: number, { mostSaturation, waterThere, sharpness, dryShape }: SaturationParameters, specificGravity: number, waterDensity: number): number {
  const s = saturation(water, [mostSaturation, waterThere, sharpness, dryShape], null);
  return s > 0 ? waterDensity / (1 / specificGravity + water / 100 / s) : limitAtNoWater(waterThere, sharpness, dryShape, mostSaturation, specificGravity, waterDensity);
}

/** Towards no water both water and saturation vanish; their ratio does not. */
function limitAtNoWater(there: number, sharpness: number, shape: number, most: number, specificGravity: number, waterDensity: number): number {
  const qn = shape ** sharpness;
  const growth = most * ((sharpness + 1) - sharpness / (1 + qn)) / there;
  return waterDensity / (1 / specificGravity + 1 / 100 / growth);
}

/** Bounds that keep four points from asking for a shape no soil has. Common practice, no published source. */
const LOW: Vector = [0.5, 0, 0.5, 0.02], HIGH: Vector = [1, 0, 25, 5];

/** Where the search begins: the turn as a multiple of the water content of the highest point, sharpness, dry shape. Tried by measuring on 200 seeded curves. */
const STARTS = [[1.2, 4, 0.3], [1.3, 6, 0.55], [1.5, 7.5, 0.58], [1.1, 8, 0.25], [1.4, 2, 0.6]] as const;
const EXACT = 1e-6;

export interface SaturationFit extends LeastSquaresFit { readonly shape: SaturationParameters }

/**
 * Fits the curve to a test. Weights multiply the residuals (1 where none are given).
 * Starts from several turns of the curve and keeps the best: the sum of squares can have more than one valley.
 */
export function fitSaturation(waters: readonly number[], dries: readonly number[], specificGravity: number, waterDensity: number, weights?: readonly number[]): SaturationFit {
  const wettest = Math.max(...waters), driest = Math.min(...waters);
  const slopes = new Float64Array(4), points = waters.length;
  const model: LeastSquaresModel = {
    points,
    parameters: 4,
    evaluate(at, residuals, jacobian) {
      const vector = at as unknown as Vector;
      for (let i = 0; i < waters.length; i++) {
        const w = waters[i]!, weight = weights?.[i] ?? 1;
        const s = saturation(w, vector, jacobian ? slopes : null);
        const dry = waterDensity / (1 / specificGravity + w / 100 / s);
        residuals[i] = weight * (dry - dries[i]!);
        if (jacobian) {
          const bySaturation = weight * dry * dry / waterDensity * w / 100 / (s * s);
          for (let j = 0; j < 4; j++) jacobian[4 * i + j] = bySaturation * slopes[j]!;
        }
      }
    },
  };
  const highest = dries.indexOf(Math.max(...dries));
  const saturations = waters.map((w, i) => Math.min(1, w / 100 / (waterDensity / dries[i]! - 1 / specificGravity)));
  const most = Math.min(0.995, Math.max(0.55, ...saturations.filter((s) => s > 0)));
  const low = [LOW[0], driest, LOW[2], LOW[3]], high = [HIGH[0], 2 * wettest, HIGH[2], HIGH[3]];
  let best: LeastSquaresFit | undefined;
  for (const [turn, sharpness, shape] of STARTS) {
    const fit = fitNonlinear(model, [most, Math.min(turn * waters[highest]!, high[1]!), sharpness, shape], { low, high, tolerance: 1e-10, maxEvaluations: 600 });
    if (!best || fit.sumOfSquares < best.sumOfSquares * (1 - 1e-9)) best = fit;
    // points that lie on the curve to far more than they were measured: there is no better valley to look for
    if (best.sumOfSquares < points * (EXACT * dries[highest]!) ** 2) break;
  }
  return { ...best!, shape: asParameters(best!.parameters) };
}
