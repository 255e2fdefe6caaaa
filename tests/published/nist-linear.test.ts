/**
 * NIST Statistical Reference Datasets, linear regression (https://www.itl.nist.gov/div898/strd): certified coefficients and
 * residual sums of squares of all eleven sets, in powers of x as NIST states them.
 */
import { exactly } from "../../src/numerics/double-double";
import { powers, solveLinear } from "../../src/numerics/linear-least-squares";
import sets from "./data/nist-linear.json";

interface Set { readonly powers: number[]; readonly certified: number[]; readonly rss: number; readonly x: number[] | number[][]; readonly y: number[] }

/** digits asked of each set's worst coefficient */
const WANTED: Readonly<Record<string, number>> = { Filip: 12, Longley: 11, NoInt1: 13, NoInt2: 13, Norris: 12, Pontius: 12, Wampler1: 14, Wampler2: 13, Wampler3: 13, Wampler4: 12, Wampler5: 10 };

const digits = (got: number, certified: number): number => -Math.log10(Math.abs(got / certified - 1) + 1e-16);

test("all eleven are there", () => expect(Object.keys(sets).sort()).toEqual(Object.keys(WANTED).sort()));

test.each(Object.entries(sets as unknown as Record<string, Set>))("%s", (name, { powers: exponents, certified, rss, x, y }) => {
  const many = Array.isArray(x[0]);
  const columns = many
    ? exponents.map((k) => (x as number[][]).map((row) => exactly(k === 0 ? 1 : row[k - 1]!)))
    : powers(x as number[], exponents);
  const { coefficients, sumOfSquares } = solveLinear(columns, y);
  const worst = Math.min(...certified.map((value, k) => digits(coefficients[k]!, value)));
  expect(worst).toBeGreaterThanOrEqual(WANTED[name]!);
  if (rss > 1e-15) expect(digits(sumOfSquares, rss)).toBeGreaterThanOrEqual(10);
});
