import fc from "fast-check";
import { HostError, shippedFunctions } from "../support/host-runtime";

const { call } = shippedFunctions();
const column = (values: readonly number[]): number[][] => values.map((value) => [value]);

/** A test as a laboratory would get it: a parabola of sensible shape, steps and scatter. */
const laboratoryTest = fc.record({
  optimum: fc.double({ min: 11, max: 24, noNaN: true }), most: fc.double({ min: 1.5, max: 2.1, noNaN: true }), drop: fc.double({ min: 0.003, max: 0.012, noNaN: true }),
  step: fc.double({ min: 1.2, max: 2.4, noNaN: true }), count: fc.integer({ min: 4, max: 8 }), shift: fc.double({ min: -0.4, max: 0.4, noNaN: true }),
  scatter: fc.array(fc.double({ min: -0.004, max: 0.004, noNaN: true }), { minLength: 8, maxLength: 8 }),
}).map(({ optimum, most, drop, step, count, shift, scatter }) => {
  const waters = Array.from({ length: count }, (_, i) => optimum + step * (i - (count - 1) / 2 + shift));
  return { waters, dries: waters.map((w, i) => most - drop * (w - optimum) ** 2 + scatter[i]! * most) };
});
const curve = fc.constantFrom("auto", "parabola", "cubic", "top three");

const peak = (waters: readonly number[], dries: readonly number[], ...more: unknown[]): unknown[][] | null => {
  try {
    return call("PEAKFIT", column(waters), column(dries), ...more);
  } catch (error) {
    if (error instanceof HostError && error.message.length > 10) return null;
    throw error;
  }
};
const close = (a: unknown, b: unknown, relative = 1e-7): void => expect(Math.abs((a as number) / (b as number) - 1)).toBeLessThan(relative);

test("a peak lies inside the data, in its own interval, and is what PEAKDRY, PEAKWATER and CURVEDRY say", () => {
  let fitted = 0, bounded = 0;
  fc.assert(fc.property(laboratoryTest, curve, ({ waters, dries }, word) => {
    const block = peak(waters, dries, word);
    if (!block) return;
    fitted++;
    const [, [, dry, dryLow], [, water, low, high]] = block as [unknown[], [string, number, number], [string, number, number | string, number | string]];
    expect(water).toBeGreaterThan(Math.min(...waters));
    expect(water).toBeLessThan(Math.max(...waters));
    expect(dryLow).toBeLessThanOrEqual(dry);
    if (typeof low === "number") expect(low).toBeLessThanOrEqual(water);
    if (typeof high === "number") expect(high).toBeGreaterThanOrEqual(water);
    if (typeof low === "number" && typeof high === "number") bounded++;
    expect(call("PEAKDRY", column(waters), column(dries), word)[0]![0]).toBe(dry);
    expect(call("PEAKWATER", column(waters), column(dries), word)[0]![0]).toBe(water);
    close(call("CURVEDRY", [[water]], column(waters), column(dries), word)[0]![0], dry, 1e-12);
  }), { numRuns: 600, seed: 31 });
  expect(fitted).toBeGreaterThan(400);
  expect(bounded).toBeGreaterThan(200);
});

test("the same soil in any unit has the same optimum, saturation and findings", () => {
  let met = 0;
  fc.assert(fc.property(laboratoryTest, curve, ({ waters, dries }, word) => {
    const here = peak(waters, dries, word, 2.72, "Mg/m3");
    for (const unit of ["kg/m3", "kN/m3", "lb/ft3"]) {
      const factor = call("DENSITYAS", 1, "Mg/m3", unit)[0]![0] as number;
      const there = peak(waters, dries.map((dry) => dry * factor), word, 2.72, unit);
      expect(there === null).toBe(here === null);
      if (!here || !there) continue;
      met++;
      expect(there[3]![1]).toBe(here[3]![1]);
      close(there[1]![1], (here[1]![1] as number) * factor);
      close(there[2]![1], here[2]![1]);
      close(there[6]![1], here[6]![1]);
      for (const end of [2, 3]) expect(typeof there[2]![end]).toBe(typeof here[2]![end]);
    }
    const flags = (block: number[][], unit: string) => call("CURVEFLAGS", column(waters), block, word, 2.72, unit).map((row) => row.slice(0, 2));
    const pcf = call("DENSITYAS", 1, "Mg/m3", "lb/ft3")[0]![0] as number;
    expect(flags(column(dries.map((dry) => dry * pcf)), "lb/ft3")).toEqual(flags(column(dries), "Mg/m3"));
  }), { numRuns: 200, seed: 32 });
  expect(met).toBeGreaterThan(300);
});

test("the order of the points does not matter, nor whether they run down or across", () => {
  let met = 0;
  fc.assert(fc.property(laboratoryTest, fc.integer({ min: 0, max: 1e6 }), ({ waters, dries }, seed) => {
    const order = waters.map((_, i) => i).sort((a, b) => ((a * 7919 + seed) % 101) - ((b * 7919 + seed) % 101));
    const plain = peak(waters, dries), mixed = peak(order.map((i) => waters[i]!), order.map((i) => dries[i]!));
    expect(mixed === null).toBe(plain === null);
    if (!plain || !mixed) return;
    met++;
    close(mixed[1]![1], plain[1]![1], 1e-9);
    close(mixed[2]![1], plain[2]![1], 1e-9);
    expect(call("PEAKDRY", [waters], [dries])[0]![0]).toBe(plain[1]![1]);
  }), { numRuns: 300, seed: 33 });
  expect(met).toBeGreaterThan(150);
});

test("a test without scatter gives its parabola back, in every curve", () => {
  let met = 0;
  fc.assert(fc.property(laboratoryTest, fc.double({ min: 0.003, max: 0.01, noNaN: true }), ({ waters }, drop) => {
    if (waters.length < 5) return;
    const optimum = waters.reduce((a, b) => a + b, 0) / waters.length + 0.1;
    for (const word of ["auto", "parabola", "cubic", "top three"]) {
      const block = peak(waters, waters.map((w) => 1.8 - drop * (w - optimum) ** 2), word)!;
      close(block[1]![1], 1.8, 1e-9);
      close(block[2]![1], optimum, 1e-6);
      met++;
    }
  }), { numRuns: 100, seed: 34 });
  expect(met).toBeGreaterThan(200);
});
