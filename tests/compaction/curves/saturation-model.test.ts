import fc from "fast-check";
import { fitSaturation, saturationCurve, type SaturationParameters } from "../../../src/compaction/curves/saturation-model";
import { degreeOfSaturation, zeroAirVoids } from "../../../src/phase/lines";

const WATER = 0.9982;
const shape: fc.Arbitrary<SaturationParameters> = fc.record({
  mostSaturation: fc.double({ min: 0.7, max: 1, noNaN: true }), waterThere: fc.double({ min: 10, max: 30, noNaN: true }),
  sharpness: fc.double({ min: 1, max: 10, noNaN: true }), dryShape: fc.double({ min: 0.1, max: 1, noNaN: true }),
});
const gravity = fc.double({ min: 2.5, max: 2.9, noNaN: true });
const saturationOf = (dryDensity: number, waterContent: number, specificGravity: number): number =>
  degreeOfSaturation.value({ dryDensity, waterContent, specificGravity, waterDensity: WATER });

test("saturation starts from nothing, reaches its greatest value where it says, and stays there", () => {
  let met = 0;
  fc.assert(fc.property(shape, gravity, (one, gs) => {
    expect(saturationOf(saturationCurve(one.waterThere, one, gs, WATER), one.waterThere, gs)).toBeCloseTo(100 * one.mostSaturation, 6);
    expect(saturationOf(saturationCurve(one.waterThere + 3, one, gs, WATER), one.waterThere + 3, gs)).toBeCloseTo(100 * one.mostSaturation, 6);
    expect(saturationOf(saturationCurve(0.001, one, gs, WATER), 0.001, gs)).toBeLessThan(0.3);
    met++;
  }), { numRuns: 300, seed: 11 });
  expect(met).toBe(300);
});

test("it never crosses the zero-air-voids line, and is continuous down to no water", () => {
  fc.assert(fc.property(shape, gravity, fc.double({ min: 0.01, max: 45, noNaN: true }), (one, specificGravity, waterContent) => {
    const dry = saturationCurve(waterContent, one, specificGravity, WATER);
    expect(dry).toBeLessThanOrEqual(zeroAirVoids.value({ waterContent, specificGravity, waterDensity: WATER }) * (1 + 1e-12));
    expect(dry).toBeGreaterThan(0);
    expect(saturationCurve(0, one, specificGravity, WATER) / saturationCurve(1e-6, one, specificGravity, WATER)).toBeCloseTo(1, 4);
  }), { numRuns: 1000, seed: 12 });
});

test("the points of two hundred seeded curves give their curves back to one part in a million", () => {
  let state = 1;
  const uniform = (low: number, high: number): number => { state = (Math.imul(state, 1664525) + 1013904223) >>> 0; return low + (high - low) * state / 2 ** 32; };
  const wrong: number[] = [];
  for (let k = 0; k < 200; k++) {
    const one = { mostSaturation: uniform(0.82, 0.98), waterThere: uniform(14, 22), sharpness: uniform(2, 8), dryShape: uniform(0.15, 0.65) }, gs = uniform(2.6, 2.8);
    const waters = Array.from({ length: 8 }, (_, i) => one.waterThere * (0.5 + 0.1 * i)), dries = waters.map((w) => saturationCurve(w, one, gs, WATER));
    const fit = fitSaturation({ waters, dries, specificGravity: gs, waterDensity: WATER });
    expect(fit.converged).toBe(true);
    if (waters.some((w, i) => Math.abs(saturationCurve(w, fit.shape, gs, WATER) / dries[i]! - 1) > 1e-6)) wrong.push(k);
  }
  expect(wrong).toEqual([]);
});
