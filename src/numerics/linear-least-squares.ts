import { add, exactly, multiply, negative, plain, type Double2 } from "./double-double";

/**
 * Linear least squares for columns of any origin, to nearly every digit that doubles hold: Householder QR on scaled columns,
 * then refinement of solution and residuals together, with residuals computed in twice the digits.
 * Source: Björck, Numerical Methods for Least Squares Problems (1996), section 2.9, iterative refinement of the augmented system.
 */
export interface LinearFit {
  readonly coefficients: readonly number[];
  readonly residuals: readonly number[];
  readonly sumOfSquares: number;
}

/** The powers of x that a polynomial needs, as columns that have not been rounded to doubles. */
export function powers(x: readonly number[], exponents: readonly number[]): Double2[][] {
  const most = Math.max(...exponents);
  const all: Double2[][] = [x.map(() => exactly(1))];
  for (let k = 1; k <= most; k++) all.push(x.map((value, i) => multiply(all[k - 1]![i]!, exactly(value))));
  return exponents.map((k) => all[k]!);
}

const ROUNDS = 12;

/** @throws Error where the columns do not determine the coefficients */
export function solveLinear(columns: readonly (readonly Double2[])[], y: readonly number[]): LinearFit {
  const n = y.length, p = columns.length;
  if (n < p) throw new Error(`${p} coefficients need at least ${p} points, not ${n}`);
  const scale = columns.map((column) => 1 / Math.hypot(...column.map(plain)));
  const q = new Factor(columns.map((column, k) => column.map((value) => plain(value) * scale[k]!)));

  const coefficients: Double2[] = columns.map(() => exactly(0));
  let residuals: Double2[] = y.map(exactly);
  for (let round = 0; round < ROUNDS; round++) {
    // what the two equations r + A b = y and Aᵀ r = 0 lack, in twice the digits
    const lack = y.map((value, i) => plain(columns.reduce((sum, column, k) => add(sum, negative(multiply(column[i]!, coefficients[k]!))), add(exactly(value), negative(residuals[i]!)))));
    const slope = columns.map((column, k) => -scale[k]! * plain(column.reduce((sum, value, i) => add(sum, multiply(value, residuals[i]!)), exactly(0))));
    const { step, change } = q.correct(lack, slope);
    let largest = 0;
    step.forEach((value, k) => {
      const by = value * scale[k]!;
      coefficients[k] = add(coefficients[k]!, exactly(by));
      largest = Math.max(largest, Math.abs(by / (plain(coefficients[k]!) || 1)));
    });
    residuals = residuals.map((value, i) => add(value, exactly(change[i]!)));
    if (largest < 1e-18) break;
  }
  const shown = residuals.map(plain);
  return { coefficients: coefficients.map(plain), residuals: shown, sumOfSquares: shown.reduce((sum, value) => sum + value * value, 0) };
}

/** Householder QR, kept as reflections. */
class Factor {
  private readonly n: number;
  private readonly p: number;
  private readonly diagonal: number[] = [];
  private readonly divisors: number[] = [];
  private readonly a: number[][];

  constructor(columns: readonly (readonly number[])[]) {
    this.a = columns.map((column) => [...column]);
    this.p = columns.length;
    this.n = columns[0]!.length;
    for (let k = 0; k < this.p; k++) {
      const column = this.a[k]!;
      let norm = 0;
      for (let i = k; i < this.n; i++) norm += column[i]! ** 2;
      norm = Math.sqrt(norm);
      if (!(norm > 1e-15)) throw new Error("the columns do not determine the coefficients");
      const alpha = column[k]! > 0 ? -norm : norm;
      this.diagonal[k] = alpha;
      this.divisors[k] = alpha * (alpha - column[k]!);
      column[k]! -= alpha;
      for (let j = k + 1; j < this.p; j++) this.reflect(k, this.a[j]!);
    }
  }

  private reflect(k: number, vector: number[]): void {
    const column = this.a[k]!;
    let dot = 0;
    for (let i = k; i < this.n; i++) dot += column[i]! * vector[i]!;
    dot /= this.divisors[k]!;
    for (let i = k; i < this.n; i++) vector[i]! -= dot * column[i]!;
  }

  private r(row: number, column: number): number { return row === column ? this.diagonal[row]! : this.a[column]![row]!; }

  /** Corrections of solution and residuals for what the two equations lack. */
  correct(lack: readonly number[], slope: readonly number[]): { step: number[]; change: number[] } {
    const { n, p } = this;
    const rotated = [...lack];
    for (let k = 0; k < p; k++) this.reflect(k, rotated);
    const h = new Array<number>(p);
    for (let k = 0; k < p; k++) {
      let sum = slope[k]!;
      for (let j = 0; j < k; j++) sum -= this.r(j, k) * h[j]!;
      h[k] = sum / this.r(k, k);
    }
    const step = new Array<number>(p);
    for (let k = p - 1; k >= 0; k--) {
      let sum = rotated[k]! - h[k]!;
      for (let j = k + 1; j < p; j++) sum -= this.r(k, j) * step[j]!;
      step[k] = sum / this.r(k, k);
    }
    const change = [...h, ...rotated.slice(p, n)];
    for (let k = p - 1; k >= 0; k--) this.reflect(k, change);
    return { step, change };
  }
}
