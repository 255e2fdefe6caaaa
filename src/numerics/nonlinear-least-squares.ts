/**
 * Nonlinear least squares with bounds, by a trust region on scaled parameters.
 * The method is the classic one: Gauss-Newton steps held to an ellipsoid whose axes follow the columns of the Jacobian,
 * the step on its edge found by Newton's iteration on the secular equation.
 * Source: Moré, "The Levenberg-Marquardt algorithm: implementation and theory", Numerical Analysis, Dundee 1977;
 * bounds by holding parameters that press against them.
 */
export interface LeastSquaresModel {
  readonly points: number;
  readonly parameters: number;
  /** Fills the residuals (curve less measured) and, where asked for, their derivatives, one row a point. */
  evaluate(at: Float64Array, residuals: Float64Array, jacobian: Float64Array | null): void;
}

export interface LeastSquaresOptions {
  readonly low?: readonly number[];
  readonly high?: readonly number[];
  /** relative change of every scaled parameter, and of the sum of squares, at which to stop */
  readonly tolerance?: number;
  readonly maxEvaluations?: number;
}

export interface LeastSquaresFit {
  readonly parameters: Float64Array;
  readonly sumOfSquares: number;
  readonly residuals: Float64Array;
  readonly jacobian: Float64Array;
  /** false where the evaluations ran out first */
  readonly converged: boolean;
  readonly evaluations: number;
  /** parameters that ended on a bound */
  readonly onBound: readonly boolean[];
}

const FIRST_RADIUS = 1;
const ACCEPT = 1e-4;

export function fitNonlinear(model: LeastSquaresModel, start: readonly number[], options: LeastSquaresOptions = {}): LeastSquaresFit {
  const { points: n, parameters: p } = model;
  const { low, high, tolerance = 1e-12, maxEvaluations = 4000 } = options;
  if (start.length !== p) throw new Error(`the model has ${p} parameters, the start ${start.length}`);
  const clamp = (value: number, j: number): number => Math.min(high?.[j] ?? Infinity, Math.max(low?.[j] ?? -Infinity, value));

  let here = Float64Array.from(start, clamp), there = new Float64Array(p);
  let residuals = new Float64Array(n), trialResiduals = new Float64Array(n);
  let jacobian = new Float64Array(n * p), trialJacobian = new Float64Array(n * p);
  const scale = new Float64Array(p), gradient = new Float64Array(p), step = new Float64Array(p);
  const free: number[] = [];
  const workspace = new Workspace(n, p);

  model.evaluate(here, residuals, jacobian);
  let evaluations = 1;
  let sum = squared(residuals);
  if (!Number.isFinite(sum)) throw new Error("the model is not finite at the start");
  let radius = 0, damping = 0, converged = false;

  while (!converged && evaluations < maxEvaluations) {
    for (let j = 0; j < p; j++) {
      let norm = 0, slope = 0;
      for (let i = 0; i < n; i++) {
        const d = jacobian[i * p + j]!;
        norm += d * d;
        slope += d * residuals[i]!;
      }
      norm = Math.sqrt(norm);
      gradient[j] = slope;
      // a scale never shrinks, so that a flat stretch cannot widen the region along its own axis
      scale[j] = Math.max(scale[j]!, norm > 0 ? norm : 1e-300);
    }
    free.length = 0;
    let steepest = 0;
    const size = Math.sqrt(sum);
    for (let j = 0; j < p; j++) {
      const held = (here[j]! <= (low?.[j] ?? -Infinity) && gradient[j]! > 0) || (here[j]! >= (high?.[j] ?? Infinity) && gradient[j]! < 0);
      if (held) continue;
      free.push(j);
      if (size > 0) steepest = Math.max(steepest, Math.abs(gradient[j]!) / (scale[j]! * size));
    }
    if (size === 0 || free.length === 0 || steepest < 1e-16) {
      converged = true;
      break;
    }
    if (radius === 0) radius = FIRST_RADIUS * (scaledLength(here, scale, free) || 1);
    workspace.factor(jacobian, residuals, free);

    for (;;) {
      damping = workspace.step(step, scale, free, radius, damping);
      let moved = 0;
      there.set(here);
      for (const j of free) {
        there[j] = clamp(here[j]! + step[j]!, j);
        const by = (there[j]! - here[j]!) * scale[j]!;
        moved += by * by;
      }
      moved = Math.sqrt(moved);
      // derivatives with it: most trials are taken, and then need them
      model.evaluate(there, trialResiduals, trialJacobian);
      evaluations++;
      const trial = squared(trialResiduals);
      const predicted = workspace.predicted(jacobian, residuals, here, there);
      const gained = Number.isFinite(trial) ? (sum - trial) / sum : -1;
      const ratio = predicted > 0 ? gained * sum / predicted : 0;

      if (ratio < 0.25) radius = Math.max(0.25 * Math.min(radius, moved * 4), 1e-300);
      else if (ratio > 0.75 && moved > 0.9 * radius) radius *= 2;
      else if (damping === 0) radius = Math.max(radius, 2 * moved);

      const length = scaledLength(here, scale, free);
      const small = moved <= tolerance * (length || 1);
      if (ratio > ACCEPT && trial < sum) {
        [here, there] = [there, here];
        [residuals, trialResiduals] = [trialResiduals, residuals];
        [jacobian, trialJacobian] = [trialJacobian, jacobian];
        sum = trial;
        if (small || (predicted <= tolerance * tolerance * sum && gained <= tolerance * tolerance)) converged = true;
        break;
      }
      if (small || radius <= 1e-15 * (length || 1)) {
        converged = true;
        break;
      }
      if (evaluations >= maxEvaluations) break;
    }
  }
  const onBound = Array.from(here, (value, j) => value <= (low?.[j] ?? -Infinity) || value >= (high?.[j] ?? Infinity));
  return { parameters: here, sumOfSquares: sum, residuals, jacobian, converged, evaluations, onBound };
}

function squared(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return sum;
}

function scaledLength(at: Float64Array, scale: Float64Array, free: readonly number[]): number {
  let sum = 0;
  for (const j of free) sum += (at[j]! * scale[j]!) ** 2;
  return Math.sqrt(sum);
}

/** Length of a pair without overflow; Math.hypot promises the same at many times the cost. */
function lengthOf(a: number, b: number): number {
  const most = Math.max(Math.abs(a), Math.abs(b)), least = Math.min(Math.abs(a), Math.abs(b));
  return most === 0 ? 0 : most * Math.sqrt(1 + (least / most) ** 2);
}

/** The triangular factor of the Jacobian's free columns, and steps of any damping from it. */
class Workspace {
  private readonly a: Float64Array;
  private readonly b: Float64Array;
  private readonly triangle: Float64Array;
  private readonly rotated: Float64Array;
  private readonly line: Float64Array;
  private readonly diagonal: Float64Array;
  private readonly scaledStep: Float64Array;
  private q = 0;

  constructor(private readonly n: number, private readonly p: number) {
    this.a = new Float64Array(Math.max(n, p) * p);
    this.b = new Float64Array(Math.max(n, p));
    this.triangle = new Float64Array(p * p);
    this.rotated = new Float64Array(p);
    this.line = new Float64Array(p + 1);
    this.diagonal = new Float64Array(p);
    this.scaledStep = new Float64Array(p);
  }

  /** Householder QR of the free columns; the residuals are carried along. */
  factor(jacobian: Float64Array, residuals: Float64Array, free: readonly number[]): void {
    const { a, b, n, p } = this, q = this.q = free.length;
    for (let i = 0; i < n; i++) {
      for (let k = 0; k < q; k++) a[i * q + k] = jacobian[i * p + free[k]!]!;
      b[i] = -residuals[i]!;
    }
    const rows = Math.max(n, q);
    for (let i = n; i < rows; i++) {
      b[i] = 0;
      for (let k = 0; k < q; k++) a[i * q + k] = 0;
    }
    for (let k = 0; k < q; k++) {
      let most = 0, norm = 0;
      for (let i = k; i < rows; i++) most = Math.max(most, Math.abs(a[i * q + k]!));
      if (most === 0) { this.diagonal[k] = 0; continue; }
      for (let i = k; i < rows; i++) norm += (a[i * q + k]! / most) ** 2;
      norm = most * Math.sqrt(norm);
      if (a[k * q + k]! > 0) norm = -norm;
      for (let i = k; i < rows; i++) a[i * q + k]! /= -norm;
      a[k * q + k]! += 1;
      const pivot = a[k * q + k]!;
      for (let j = k + 1; j < q; j++) {
        let dot = 0;
        for (let i = k; i < rows; i++) dot += a[i * q + k]! * a[i * q + j]!;
        dot /= -pivot;
        for (let i = k; i < rows; i++) a[i * q + j]! += dot * a[i * q + k]!;
      }
      let dot = 0;
      for (let i = k; i < rows; i++) dot += a[i * q + k]! * b[i]!;
      dot /= -pivot;
      for (let i = k; i < rows; i++) b[i]! += dot * a[i * q + k]!;
      this.diagonal[k] = norm;
    }
  }

  /** Solves min ‖J s + r‖² + damping ‖D s‖² by Givens rotations onto the triangle; writes the step, returns its scaled length. */
  private solve(damping: number, step: Float64Array, scale: Float64Array, free: readonly number[]): number {
    const { a, b, q, triangle: t, rotated, line } = this;
    for (let k = 0; k < q; k++) {
      t[k * q + k] = this.diagonal[k]!;
      for (let j = k + 1; j < q; j++) t[k * q + j] = a[k * q + j]!;
      rotated[k] = b[k]!;
    }
    if (damping > 0) {
      const root = Math.sqrt(damping);
      for (let k = 0; k < q; k++) {
        line.fill(0, 0, q + 1);
        line[k] = root * scale[free[k]!]!;
        for (let j = k; j < q; j++) {
          if (line[j] === 0) continue;
          const length = lengthOf(t[j * q + j]!, line[j]!), cos = t[j * q + j]! / length, sin = line[j]! / length;
          t[j * q + j] = length;
          for (let m = j + 1; m < q; m++) {
            const upper = t[j * q + m]!;
            t[j * q + m] = cos * upper + sin * line[m]!;
            line[m] = cos * line[m]! - sin * upper;
          }
          const upper = rotated[j]!;
          rotated[j] = cos * upper + sin * line[q]!;
          line[q] = cos * line[q]! - sin * upper;
        }
      }
    }
    let length = 0;
    for (let k = q - 1; k >= 0; k--) {
      let sum = rotated[k]!;
      for (let j = k + 1; j < q; j++) sum -= t[k * q + j]! * step[free[j]!]!;
      const pivot = t[k * q + k]!;
      step[free[k]!] = pivot === 0 ? 0 : sum / pivot;
      length += (step[free[k]!]! * scale[free[k]!]!) ** 2;
    }
    return Math.sqrt(length);
  }

  /** A step of at most the radius; returns the damping that held it there (0: the plain Gauss-Newton step fitted). */
  step(step: Float64Array, scale: Float64Array, free: readonly number[], radius: number, previous: number): number {
    const { q } = this;
    let singular = false;
    for (let k = 0; k < q; k++) if (Math.abs(this.diagonal[k]!) <= 1e-14 * scale[free[k]!]!) singular = true;
    let damping = previous > 0 ? previous : 1e-3, low = 0, high = Infinity;
    if (!singular) {
      const length = this.solve(0, step, scale, free);
      if (length <= radius) return 0;
      // Newton from no damping never oversteps: a sure lower bound, and a good start
      low = this.newton(0, length, step, scale, free, radius);
      damping = Math.max(low, previous > 0 ? Math.min(previous, 2 * low) : low);
    }
    for (let round = 0; round < 60; round++) {
      const length = this.solve(damping, step, scale, free);
      if (length > 0.9 * radius && length <= 1.1 * radius) break;
      if (length > radius) low = Math.max(low, damping); else high = Math.min(high, damping);
      // a singular Jacobian may leave even the least damped step inside the region
      if (high < 1e-30) break;
      const newton = this.newton(damping, length, step, scale, free, radius);
      damping = newton > low && newton < high ? newton : high === Infinity ? Math.max(damping * 10, 1e-300) : low === 0 ? high * 0.1 : Math.sqrt(low * high);
    }
    return damping;
  }

  /** Newton's next damping on 1/length − 1/radius; the derivative comes from one more triangular solve. */
  private newton(damping: number, length: number, step: Float64Array, scale: Float64Array, free: readonly number[], radius: number): number {
    const { q, triangle: t, scaledStep } = this;
    let slope = 0;
    for (let k = 0; k < q; k++) {
      let sum = scale[free[k]!]! ** 2 * step[free[k]!]!;
      for (let j = 0; j < k; j++) sum -= t[j * q + k]! * scaledStep[j]!;
      scaledStep[k] = t[k * q + k] === 0 ? 0 : sum / t[k * q + k]!;
      slope += scaledStep[k]! ** 2;
    }
    return slope > 0 ? damping + (length - radius) / radius * length * length / slope : 0;
  }

  /** How far the linear model says the sum of squares falls along the step actually taken. */
  predicted(jacobian: Float64Array, residuals: Float64Array, from: Float64Array, to: Float64Array): number {
    const { n, p } = this;
    let fall = 0;
    for (let i = 0; i < n; i++) {
      let change = 0;
      for (let j = 0; j < p; j++) change += jacobian[i * p + j]! * (to[j]! - from[j]!);
      fall -= change * (2 * residuals[i]! + change);
    }
    return fall;
  }
}
