import { fitPolynomial, type PolynomialFit } from "../../numerics/polynomial";
import type { CompactionTest, CurveId } from "../fit";

/** One model of a compaction curve: which points it is fitted to, and the degree of its polynomial. */
export interface Curve {
  readonly id: CurveId;
  readonly degree: number;
  /** indices of the points it is fitted to, or undefined where the test has not enough of them */
  pointsOf(test: CompactionTest): readonly number[] | undefined;
  /** weighed by `auto` against the others */
  readonly weighed: boolean;
  /** what it needs, for the refusal */
  readonly needs: string;
}

export const distinctWaters = ({ waters }: CompactionTest): number => new Set(waters).size;

export const allPoints = ({ waters }: CompactionTest): number[] => waters.map((_, i) => i);

export function fitCurve(curve: Curve, test: CompactionTest): { readonly used: readonly number[]; readonly polynomial: PolynomialFit } | undefined {
  const used = curve.pointsOf(test);
  return used && { used, polynomial: fitPolynomial(used.map((i) => test.waters[i]!), used.map((i) => test.dries[i]!), curve.degree) };
}
