import fc from "fast-check";
import { shippedFunctions } from "../support/host-runtime";

const { call } = shippedFunctions();
const one = (name: string, ...args: unknown[]): number => {
  const [[value]] = call(name, ...args) as [[unknown]];
  if (typeof value !== "number") throw new Error(`${name} gave ${String((value as Error)?.message ?? value)}`);
  return value;
};
const column = (values: readonly unknown[]): unknown[][] => values.map((value) => [value]);
const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });
const close = (a: number, b: number, relative = 1e-9): void => expect(Math.abs(a - b)).toBeLessThanOrEqual(relative * Math.max(1, Math.abs(a), Math.abs(b)));
/** Runs a property and holds it to having met enough cases. */
function holds<Args extends [unknown, ...unknown[]]>(arbitraries: { [Place in keyof Args]: fc.Arbitrary<Args[Place]> }, predicate: (...args: Args) => void, runs = 300): void {
  let met = 0;
  fc.assert(fc.property(...(arbitraries as unknown as [fc.Arbitrary<unknown>]), (...args: unknown[]) => { predicate(...args as Args); met++; }), { numRuns: runs, seed: 43 });
  expect(met).toBe(runs);
}
const lot = fc.array(between(90, 104), { minLength: 3, maxLength: 15 });

test("LOTWITHIN lies between 0 and 100, falls as the limit rises, and does not know the unit", () => holds<[number[], number, number]>([lot, between(88, 104), between(0.1, 5)], (values, limit, more) => {
  const here = one("LOTWITHIN", column(values), limit);
  expect(here).toBeGreaterThanOrEqual(0);
  expect(here).toBeLessThanOrEqual(100);
  expect(one("LOTWITHIN", column(values), limit + more)).toBeLessThanOrEqual(here + 1e-9);
  close(one("LOTWITHIN", column(values.map((value) => 3 + 2 * value)), 3 + 2 * limit), here, 1e-7);
}));
test("LOTCHAR lies below the mean, and moves with the lot", () => holds<[number[], number]>([lot, between(-5, 5)], (values, shift) => {
  const here = one("LOTCHAR", column(values));
  expect(here).toBeLessThanOrEqual(values.reduce((a, b) => a + b) / values.length + 1e-9);
  close(one("LOTCHAR", column(values.map((value) => value + shift))), here + shift, 1e-9);
}, 150));
test("LOTSPOTS keeps to its stretches and its seed", () => holds<[number, number, number, number]>([between(1, 5000), between(0, 50), fc.integer({ min: 1, max: 40 }), fc.integer({ min: 0, max: 1e6 })], (length, width, count, seed) => {
  const spots = call("LOTSPOTS", length, width, count, seed).slice(1) as number[][];
  expect(spots).toHaveLength(count);
  spots.forEach(([, along, across], i) => expect(along! >= length / count * i - 1e-9 && along! <= length / count * (i + 1) + 1e-9 && across! >= 0 && across! <= width).toBe(true));
  expect(call("LOTSPOTS", length, width, count, seed).slice(1)).toEqual(spots);
}));
test("LOTTESTS covers the quantity, and not twice", () => holds<[number, number]>([between(0.1, 1e5), between(1, 3000)], (quantity, each) => {
  const tests = one("LOTTESTS", quantity, each);
  expect(tests * each).toBeGreaterThanOrEqual(quantity * (1 - 1e-6));
  expect((tests - 1) * each).toBeLessThan(quantity);
}));
test("PASSCHANCE rises with the density, falls with the limit, is even on it, and is less sure with more doubt", () => holds<[number, number, number, number]>([between(1.5, 2.1), between(0.005, 0.05), between(0, 0.03), between(88, 100)], (maxDry, sd, sdMax, limit) => {
  const on = maxDry * limit / 100;
  close(one("PASSCHANCE", on, maxDry, limit, sd, sdMax), 0.5, 1e-7);
  const above = one("PASSCHANCE", on + sd, maxDry, limit, sd, sdMax);
  expect(above).toBeGreaterThan(0.5);
  expect(above).toBeLessThanOrEqual(1);
  expect(one("PASSCHANCE", on + sd, maxDry, limit, 2 * sd, sdMax)).toBeLessThan(above);
  expect(one("PASSCHANCE", on + sd, maxDry, limit + 1, sd, sdMax)).toBeLessThan(above);
}));
test("GAUGEOFFSET makes GAUGEDRY agree with the oven, by mass and by percent", () => holds<[number, number, number]>([between(1.7, 2.3), between(3, 25), between(-2, 2)], (wet, oven, off) => {
  const percent = Math.max(0, oven + off), mass = wet * percent / (100 + percent);
  close(one("GAUGEDRY", wet, mass, one("GAUGEOFFSET", wet, mass, oven)), one("SOILDRY", wet, oven));
  close(one("GAUGEDRY", wet, percent, one("GAUGEOFFSET", wet, percent, oven, "percent"), "percent"), one("SOILDRY", wet, oven));
}));
test("SANDDENS and CONESAND feed SANDCONE: a hole filled with the calibrated sand weighs what its volume says", () => holds<[number, number, number]>([between(1.2, 1.7), between(0.5, 3), between(1, 2)], (sand, hole, cone) => {
  const density = one("SANDDENS", 0.4 + 3 * sand, 0.4, 3), inCone = one("CONESAND", 9, 9 - cone);
  close(one("SANDCONE", 2 * hole, inCone + hole * sand, inCone, density), 2, 1e-9);
}));
test("WATERSPRAY on an area is WATERADD on its volume; its loss is what does not arrive", () => holds<[number, number, number, number, number]>([between(50, 500), between(1.4, 2.2), between(4, 20), between(0.1, 8), between(1, 60)], (thickness, dry, now, more, loss) => {
  close(one("WATERSPRAY", thickness, dry, now, now + more), one("WATERADD", thickness / 1000, dry, now, now + more), 1e-9);
  close(one("WATERSPRAY", thickness, dry, now, now + more, loss) * (1 - loss / 100), one("WATERSPRAY", thickness, dry, now, now + more), 1e-9);
  close(one("DRYTIME", thickness, dry, now + more, now, 3) * 3, one("WATERSPRAY", thickness, dry, now, now + more), 1e-9);
  expect(one("DRYTIME", thickness, dry, now, now + more, 3)).toBe(0);
}));
test("systems agree: the same lift in US units takes the same water and the same days, to the trade's round figures", () => holds<[number, number, number]>([between(50, 500), between(1.4, 2.2), between(0.1, 8)], (mm, dry, points) => {
  const inches = mm / 25.4, pcf = dry * 62.42796;
  close(one("WATERSPRAY", inches, pcf, 10, 10 + points, 0, "US") * 3.785412 / 0.8361274, one("WATERSPRAY", mm, dry, 10, 10 + points), 2e-3);
  close(one("DRYTIME", inches, pcf, 10 + points, 10, 0.2, "US"), one("DRYTIME", mm, dry, 10 + points, 10, 5.08), 2e-3);
}));
test("BLENDSHARE and BLENDWATER undo each other, and a blend lies between its soils", () => holds<[number, number, number]>([between(2, 15), between(16, 45), between(0.05, 0.95)], (dry, wet, share) => {
  const water = one("BLENDWATER", 1 - share, dry, share, wet);
  expect(water).toBeGreaterThan(dry);
  expect(water).toBeLessThan(wet);
  close(one("BLENDSHARE", dry, wet, water), 100 * share, 1e-7);
  const dryShare = one("BLENDSHARE", dry, wet, water, "dry") / 100;
  close((1 - dryShare) * dry + dryShare * wet, water, 1e-7);
}));
test("FINESFILL: denser than the coarse soil alone, and the share is of the density", () => holds<[number, number, number]>([between(1.3, 1.9), between(2.55, 2.8), between(0.9, 1.7)], (coarse, gs, fines) => {
  const [share, density] = call("FINESFILL", coarse, gs, fines)[0] as [number, number];
  close(density * (1 - share / 100), coarse, 1e-9);
  expect(density).toBeGreaterThan(coarse);
}));
test("ROLLRATE halves with twice the passes, and is the same roller in either system", () => holds<[number, number, number, number]>([between(1, 3), between(1, 8), between(100, 600), fc.integer({ min: 1, max: 12 })], (width, speed, lift, passes) => {
  const here = one("ROLLRATE", width, speed, lift, passes);
  close(one("ROLLRATE", width, speed, lift, 2 * passes), here / 2);
  close(one("ROLLRATE", width / 0.3048, speed / 1.609344, lift / 25.4, passes, 100, "US") * 0.764554858, here, 1e-8);
}));
test("ROLLFIT finds the plateau of a trial without scatter, above every density of it", () => holds<[number, number, number]>([between(1.7, 2.1), between(0.05, 0.4), between(1.5, 6)], (plateau, gain, per) => {
  const passes = [1, 2, 3, 4, 6, 8, 12], block = call("ROLLFIT", column(passes), column(passes.map((n) => plateau - gain * Math.exp(-n / per))), plateau - gain / 5) as [unknown, [string, number], [string, number]];
  close(block[1][1], plateau, 1e-5);
  close(block[2][1], per * Math.log(5), 1e-3);
}, 100));
test("GRADEWELL does not know the unit of the sizes", () => holds<[number, number, number, number]>([between(0.01, 0.5), between(1, 6), between(1, 6), between(0.01, 100)], (d10, a, b, unit) => {
  const sizes = [d10, d10 * a, d10 * a * b], [cu, cc, says] = call("GRADEWELL", ...sizes, "sand")[0] as [number, number, string], [cu2, cc2, says2] = call("GRADEWELL", ...sizes.map((size) => size * unit), "sand")[0] as [number, number, string];
  close(cu2, cu, 1e-9);
  close(cc2, cc, 1e-9);
  if (Math.abs(cu - 6) > 1e-6 && Math.abs(cc - 1) > 1e-6 && Math.abs(cc - 3) > 1e-6) expect(says2).toBe(says);
}));

test("FILLVERDICT passes exactly what lies in its zone, and names each clause that does not hold", () => {
  let passed = 0, failed = 0;
  holds<[number, number, number, number]>([between(1.65, 2.05), between(8, 22), between(88, 100), between(0.5, 4)], (dry, water, limit, gap) => {
    const verdict = call("FILLVERDICT", dry, water, 1.9, 14, `RC >= ${limit}; gap ${-gap}..${gap}`)[0]![0] as string;
    const low = one("RELCOMP", dry, 1.9) < limit, off = Math.abs(one("WATERGAP", water, 14)) > gap;
    expect(verdict === "pass").toBe(!low && !off);
    expect(verdict.includes("RC")).toBe(low);
    expect(verdict.includes("gap")).toBe(off);
    if (verdict === "pass") passed++; else failed++;
  }, 800);
  expect(passed).toBeGreaterThan(40);
  expect(failed).toBeGreaterThan(200);
});
