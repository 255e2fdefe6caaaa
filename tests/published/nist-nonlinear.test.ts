/**
 * NIST Statistical Reference Datasets, nonlinear regression (https://www.itl.nist.gov/div898/strd): all 27 sets, from both
 * published starts, to at least six of the certified digits. Values and derivatives come from mathjs, not from us.
 */
import { all, create } from "mathjs";
import { fitNonlinear } from "../../src/numerics/nonlinear-least-squares";
import sets from "./data/nist-nonlinear.json";

const math = create(all!, {});

interface Set { readonly formula: string; readonly logOfY: boolean; readonly starts: number[][]; readonly certified: number[]; readonly sumOfSquares: number; readonly x: (number | number[])[]; readonly y: number[] }

const digits = (got: number, certified: number): number => -Math.log10(Math.abs(got / certified - 1) + 1e-16);

describe.each(Object.entries(sets as unknown as Record<string, Set>))("%s", (_, set) => {
  const names = set.certified.map((__, j) => `b${j + 1}`);
  const formula = math.parse(set.formula), value = formula.compile();
  const slopes = names.map((name) => math.derivative(formula, name).compile());
  const measured = set.logOfY ? set.y.map(Math.log) : set.y;
  const model = {
    points: measured.length,
    parameters: names.length,
    evaluate(at: Float64Array, residuals: Float64Array, jacobian: Float64Array | null): void {
      const scope: Record<string, number> = {};
      names.forEach((name, j) => { scope[name] = at[j]!; });
      set.x.forEach((x, i) => {
        if (typeof x === "number") scope.x = x; else [scope.x1, scope.x2] = x as [number, number];
        residuals[i] = Number(value.evaluate(scope)) - measured[i]!;
        if (jacobian) slopes.forEach((slope, j) => { jacobian[i * names.length + j] = Number(slope.evaluate(scope)); });
      });
    },
  };
  test.each([[1, set.starts[0]!], [2, set.starts[1]!]])("from start %d", (__, start) => {
    const fit = fitNonlinear(model, start);
    expect(fit.converged).toBe(true);
    const short = set.certified.map((certified, j) => [names[j], digits(fit.parameters[j]!, certified)] as const).filter(([, right]) => !(right >= 6));
    expect(short).toEqual([]);
    // Lanczos1 is data without error: its sum of squares is rounding
    if (set.sumOfSquares > 1e-20) expect(digits(fit.sumOfSquares, set.sumOfSquares)).toBeGreaterThan(6);
  });
});
