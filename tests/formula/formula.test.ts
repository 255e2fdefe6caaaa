import fc from "fast-check";
import { compile } from "../../src/formula/compile";
import { namesIn, parse, type Formula } from "../../src/formula/parse";
import { solveFor } from "../../src/formula/solve";
import { evaluate, numbers, slopes } from "../../src/formula/world";
import { intervals, rangeOver } from "../../src/formula/interval";
import { write } from "../../src/formula/write";

const value = (text: string, x: Record<string, number> = {}): number => evaluate(parse(text), numbers, (name) => x[name]!);

test.each([
  ["1 + 2 * 3", 7], ["(1 + 2) * 3", 9], ["8 - 3 - 2", 3], ["24 / 4 / 2", 3], ["2 ^ 3 ^ 2", 512], ["2 * 3 ^ 2", 18], ["1.5e2 / 3", 50], ["10 - (4 - 1)", 7], ["log10(1000) * 2", 6], ["exp(0) + log10(10 ^ 2)", 3],
])("%s is %d", (text, expected) => expect(value(text)).toBe(expected));

test.each(["", "1 +", "(1", "1 2", "a $ b", ") 1", "2 * / 3", "log10 2", "exp(1"])("%j is refused with the place", (text) => expect(() => parse(text)).toThrow(/token \d/));

test("names come in the order of the text, once each", () => expect(namesIn(parse("b * a / (b + c)"))).toEqual(["b", "a", "c"]));

const formula: fc.Arbitrary<Formula> = fc.letrec<{ node: Formula }>((tie) => ({
  node: fc.oneof({ maxDepth: 4, withCrossShrink: true },
    fc.integer({ min: 1, max: 9 }).map((n): Formula => ({ op: "number", value: n })),
    fc.constantFrom("a", "b", "c").map((name): Formula => ({ op: "name", name })),
    fc.tuple(fc.constantFrom("log10", "exp"), tie("node")).map(([name, of]): Formula => ({ op: "call", name: name as "exp", of })),
    fc.tuple(fc.constantFrom("+", "-", "*", "/", "^"), tie("node"), tie("node")).map(([op, left, right]): Formula => ({ op: op as "+", left, right }))),
})).node;

test("what is written parses to a formula of the same value", () => {
  let finite = 0;
  fc.assert(fc.property(formula, (tree) => {
    const again = parse(write(tree, (name) => name, "plain")), x = { a: 1.25, b: 2.5, c: 3.75 } as Record<string, number>;
    const one = evaluate(tree, numbers, (n) => x[n]!), two = evaluate(again, numbers, (n) => x[n]!);
    expect(Object.is(one, two) || Math.abs(one - two) <= 1e-9 * Math.abs(one)).toBe(true);
    expect(compile(tree, ["a", "b", "c"])(1.25, 2.5, 3.75)).toBe(one);
    if (Number.isFinite(one)) finite++;
  }), { numRuns: 3000, seed: 5 });
  expect(finite).toBeGreaterThan(1200);
});

test("an unknown input is a programmer's error", () => expect(() => compile(parse("a + b"), ["a"])).toThrow(/no input is called b/));

describe("solving", () => {
  test.each([["a + b", "a"], ["a + b", "b"], ["a - b", "a"], ["a - b", "b"], ["a * b", "a"], ["a * b", "b"], ["a / b", "a"], ["a / b", "b"], ["c / (a / 100 + 1 / b)", "b"]])("%s for %s", (text, name) => {
    const tree = parse(text), x: Record<string, number> = { a: 3, b: 7, c: 11 }, result = evaluate(tree, numbers, (n) => x[n]!);
    expect(evaluate(solveFor(tree, name, "result"), numbers, (n) => n === "result" ? result : x[n]!)).toBeCloseTo(x[name]!, 10);
  });
  test("a name that stands twice, or under a power, is refused", () => {
    expect(() => solveFor(parse("a * a"), "a", "x")).toThrow(/exactly once/);
    expect(() => solveFor(parse("a ^ 2"), "a", "x")).toThrow(/through/);
  });
});

test("slopes and intervals of a logarithm and an exponential", () => {
  const world = slopes(numbers), at = (text: string, x: number): number => evaluate(parse(text), world, () => ({ value: x, slope: 1 })).slope;
  expect(at("log10(2 * x)", 3)).toBeCloseTo(1 / (3 * Math.LN10), 12);
  expect(at("exp(0 - 0.5 * x)", 3)).toBeCloseTo(-0.5 * Math.exp(-1.5), 12);
  expect(rangeOver(parse("x * log10(x)"), { x: { low: 10, high: 100 } })).toEqual({ low: 10, high: 200 });
});

describe("intervals", () => {
  test("a divisor across zero leaves nothing known", () => expect(intervals.operate("/", { low: 1, high: 2 }, { low: -1, high: 1 })).toEqual({ low: -Infinity, high: Infinity }));
  test("an even power across zero has zero as its least value", () => expect(intervals.operate("^", { low: -2, high: 1 }, { low: 2, high: 2 })).toEqual({ low: 0, high: 4 }));
  test("a name that stands twice does not widen the range", () => expect(rangeOver(parse("100 * (w - d) / (d - t)"), { w: { low: 30, high: 30 }, d: { low: 25, high: 26 }, t: { low: 5, high: 5 } })).toEqual({ low: 100 * 4 / 21, high: 25 }));
});
