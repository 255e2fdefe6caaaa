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
const curve = fc.constantFrom("auto", "parabola", "cubic", "quartic", "top three", "smooth");

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

test("PEAKTABLE says of every test what PEAKFIT says of it alone, in whatever order they stand", () => {
  let met = 0;
  fc.assert(fc.property(fc.array(laboratoryTest, { minLength: 1, maxLength: 4 }), curve, fc.integer({ min: 0, max: 1000 }), (tests, word, seed) => {
    const points = tests.flatMap(({ waters, dries }, t) => waters.map((water, i) => ({ id: `T${t}`, water, dry: dries[i]! }))).sort((a, b) => ((a.water * 7919 + seed) % 13) - ((b.water * 7919 + seed) % 13));
    const table = call("PEAKTABLE", column(points.map(({ id }) => id) as never), column(points.map(({ water }) => water)), column(points.map(({ dry }) => dry)), word);
    for (const row of table.slice(1)) {
      const own = points.filter(({ id }) => id === row[0]), alone = peak(own.map(({ water }) => water), own.map(({ dry }) => dry), word);
      expect(row[7] === "no curve").toBe(alone === null);
      if (!alone) continue;
      met++;
      expect(row.slice(1, 7)).toEqual([...alone[1]!.slice(1), ...alone[2]!.slice(1)]);
    }
  }), { numRuns: 100, seed: 35 });
  expect(met).toBeGreaterThan(100);
});

test("the span of water at a percent lies about the optimum, inside the data, and narrows as the percent rises", () => {
  let met = 0;
  fc.assert(fc.property(laboratoryTest, fc.double({ min: 90, max: 99.8, noNaN: true }), ({ waters, dries }, percent) => {
    const block = peak(waters, dries);
    if (!block) return;
    const [low, high] = call("WATERSPAN", column(waters), column(dries), percent)[0] as (number | string)[], [nearLow, nearHigh] = call("WATERSPAN", column(waters), column(dries), (percent + 100) / 2)[0] as (number | string)[];
    for (const [side, near, far] of [[-1, nearLow, low], [1, nearHigh, high]] as const) {
      if (typeof far !== "number") continue;
      met++;
      expect(side * (far - (block[2]![1] as number))).toBeGreaterThan(0);
      expect(side * (far - (near as number))).toBeGreaterThanOrEqual(0);
      close(call("CURVEDRY", [[far]], column(waters), column(dries))[0]![0], (block[1]![1] as number) * percent / 100, 1e-7);
    }
  }), { numRuns: 300, seed: 36 });
  expect(met).toBeGreaterThan(200);
});

test("the rapid method finds the relative compaction of any soil without its water content", () => {
  let met = 0;
  const soil = fc.record({ most: fc.double({ min: 1.4, max: 2.1, noNaN: true }), off: fc.double({ min: -1.2, max: 1.2, noNaN: true }), fill: fc.double({ min: 6, max: 30, noNaN: true }), field: fc.double({ min: 0.9, max: 1.02, noNaN: true }) });
  fc.assert(fc.property(soil, ({ most, off, fill, field }) => {
    const z = [-2, -1, 0, 1, 2], peakZ = off;
    // converted wet density a parabola of the added water: then the method is exact
    const converted = z.map((one) => most * (1 + fill / 100) - 0.01 * (one - peakZ) ** 2), wet = converted.map((one, i) => one * (1 + z[i]! / 100));
    const block = call("RAPIDPEAK", column(z), column(wet), field * most * (1 + fill / 100), fill);
    close(block[0]![1], 100 * field, 1e-9);
    expect(Math.abs((block[2]![1] as number) - peakZ)).toBeLessThan(1e-7);
    expect(Math.abs((block[4]![1] as number) + peakZ * (1 + fill / 100))).toBeLessThan(1e-6);
    expect(call("RAPIDPEAK", column(z), column(wet), field * most * (1 + fill / 100))[0]![1]).toBe(block[0]![1]);
    met++;
  }), { numRuns: 200, seed: 37 });
  expect(met).toBe(200);
});

test("a point on a curve of a family picks that curve, and one between two a peak between theirs", () => {
  let met = 0;
  fc.assert(fc.property(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0.86, max: 0.97, noNaN: true }), (share, wet) => {
    const curves = [{ id: "x", w: 18, d: 1.7 }, { id: "y", w: 16, d: 1.78 }, { id: "z", w: 14, d: 1.86 }];
    const family = curves.flatMap(({ id, w, d }) => [-5, -2.5, 0, 2.5].map((step) => [id, w + step, d - 0.004 * step * step]));
    const at = (i: number, water: number): number => curves[i]!.d - 0.004 * (water - curves[i]!.w) ** 2, water = wet * (18 - 2 * share);
    let block: unknown[][];
    try { block = call("FAMILYPICK", water, at(0, water) + share * (at(1, water) - at(0, water)), family); } catch { return; }
    met++;
    expect(block[0]![1] as number).toBeGreaterThan(1.7 - 0.002);
    expect(block[0]![1] as number).toBeLessThan(1.78 + 0.002);
    expect(Math.abs((block[1]![1] as number) - (18 - 2 * share))).toBeLessThan(0.05);
  }), { numRuns: 200, seed: 38 });
  expect(met).toBeGreaterThan(90);
});

test("a heavier effort is expected to give more density at less water, and a plastic limit a peak that falls with it", () => {
  fc.assert(fc.property(fc.double({ min: 300, max: 2000, noNaN: true }), fc.double({ min: 1.1, max: 1.9, noNaN: true }), fc.double({ min: 20, max: 70, noNaN: true }), (effort, times, limit) => {
    const [[, dry], [, water]] = call("EFFORTPEAK", 1.7, 18, effort, effort * times, limit) as [[string, number], [string, number]];
    expect(dry).toBeGreaterThan(1.7);
    expect(water).toBeLessThan(18);
    const plastic = 10 + limit / 2, [, one] = call("PLASTICPEAK", plastic) as [unknown, [string, number, number]], [, more] = call("PLASTICPEAK", plastic + 2) as [unknown, [string, number, number]];
    expect(more[1]).toBeLessThan(one[1]);
    expect(more[2]).toBeGreaterThan(one[2]);
  }), { numRuns: 200, seed: 39 });
});
