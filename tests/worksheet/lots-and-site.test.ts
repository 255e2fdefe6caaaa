import { CellError, type Block, type Cell } from "../../src/worksheet/cell";
import { gaugeDry, gaugeOffset, sandDensityColumn, sandInConeColumn } from "../../src/worksheet/field-readings";
import { lotCharacteristic, lotSpots, lotTests, lotWithin, passChance } from "../../src/worksheet/lots";
import { blendShare, blendWater, dryTime, finesFill, gradeWell, rollFit, rollRate, waterSpray } from "../../src/worksheet/site-work";

const at = (value: unknown): Block => [[value]];
const down = (...values: unknown[]): Block => values.map((value) => [value]);
const says = (pattern: RegExp, code = "#VALUE!") => expect.objectContaining({ code, says: expect.stringMatching(pattern) });
const only = (answer: Cell[][] | CellError): Cell => { if (answer instanceof CellError) throw new Error(answer.says); return answer[0]![0]!; };
const number = (answer: Cell[][] | CellError): number => { const cell = only(answer); if (cell instanceof CellError) throw new Error(cell.says); return cell as number; };
const cellError = (answer: Cell[][] | CellError): CellError => answer instanceof CellError ? answer : answer[0]![0] as CellError;

describe("LOTWITHIN (FHWA TA 5080.12, table 1B: quality index by percent within limits and number of tests)", () => {
  // a sample of n values with mean 0 and sample deviation 1
  const sample = (n: number): number[] => {
    const plain = Array.from({ length: n }, (_, i) => i - (n - 1) / 2), s = Math.sqrt(plain.reduce((sum, x) => sum + x * x, 0) / (n - 1));
    return plain.map((x) => x / s);
  };
  const NS = [3, 4, 5, 6, 7, 8, 9];
  test.each([[73, [0.76, 0.69, 0.66, 0.65, 0.64, 0.63, 0.63]], [65, [0.52, 0.45, 0.43, 0.41, 0.41, 0.40, 0.40]]] as const)("row %d", (percent, row) => {
    row.forEach((q, i) => {
      const within = (quality: number): number => number(lotWithin(down(...sample(NS[i]!)), at(-quality), null));
      // the table's two decimals of quality index hold the percent between them
      expect(within(q - 0.0051)).toBeLessThan(percent);
      expect(within(q + 0.0051)).toBeGreaterThan(percent);
    });
  });
  test("the worked lot 96.2, 97.4, 95.1, 98.0, 96.8 above 95: 96.59 (derived)", () => expect(number(lotWithin(down(96.2, 97.4, 95.1, 98.0, 96.8), at(95), null))).toBeCloseTo(96.59, 2));
  test("three values have the closed form 50 + 100/pi asin(Q sqrt(3)/2), four 50 + 33.33 Q", () => {
    for (const q of [0.2, 0.7, 1.1]) {
      expect(number(lotWithin(down(...sample(3)), at(-q), null))).toBeCloseTo(50 + 100 / Math.PI * Math.asin(q * Math.sqrt(3) / 2), 8);
      expect(number(lotWithin(down(...sample(4)), at(-q), null))).toBeCloseTo(50 + 100 / 3 * q, 8);
    }
  });
  test("two limits take off what lies beyond either", () => {
    const values = down(...sample(6));
    expect(number(lotWithin(values, at(-1), at(1.2)))).toBeCloseTo(number(lotWithin(values, at(-1), null)) + number(lotWithin(values, null, at(1.2))) - 100, 9);
    expect(number(lotWithin(down(5, 5, 5), at(4), null))).toBe(100);
    expect(number(lotWithin(down(5, 5, 5), at(6), null))).toBe(0);
  });
  test.each([
    [down(1, 2), at(1), null, /at least three values; there are 2/, "#N/A"], [down(1, 2, 3), null, null, /lower limit, an upper limit/, "#VALUE!"], [down(1, 2, 3), at(5), at(2), /lies above the upper/, "#VALUE!"], [down(1, "2 x", 3), at(0), null, /row 2, column 1/, "#VALUE!"], [null, at(0), null, /give the values of the lot/, "#VALUE!"],
  ] as [Block | null, Block | null, Block | null, RegExp, string][])("bad input %#", (values, low, high, pattern, code) => expect(lotWithin(values, low, high)).toEqual(says(pattern, code)));
});

test("LOTCHAR: mean less k s, with the Australian factors for 2 to 10 tests (from memory)", () => {
  [0.403, 0.535, 0.617, 0.675, 0.719, 0.755, 0.783, 0.808, 0.828].forEach((k, i) => {
    const values = Array.from({ length: i + 2 }, (_, j) => 95 + (j % 3) + j / 7), middle = values.reduce((a, b) => a + b) / values.length, s = Math.sqrt(values.reduce((sum, x) => sum + (x - middle) ** 2, 0) / (values.length - 1));
    expect(Math.abs(number(lotCharacteristic(down("RC", ...values), null)) - (middle - k * s))).toBeLessThan(0.0006 * s);
    expect(number(lotCharacteristic(down(...values), at(0.5)))).toBeCloseTo(middle - 0.5 * s, 10);
  });
  expect(lotCharacteristic(down(96), null)).toEqual(says(/at least two values; there is 1/, "#N/A"));
});

test("LOTSPOTS: one place in each stretch, the same for the same seed", () => {
  const spots = lotSpots(at(120), at(8), at(6), at(7)) as Cell[][];
  expect(spots[0]).toEqual(["test", "along", "across"]);
  spots.slice(1).forEach(([test, along, across], i) => {
    expect(test).toBe(i + 1);
    expect(along as number).toBeGreaterThanOrEqual(20 * i);
    expect(along as number).toBeLessThan(20 * (i + 1));
    expect(across as number).toBeGreaterThan(0);
    expect(across as number).toBeLessThan(8);
  });
  expect(lotSpots(at(120), at(8), at(6), at(7))).toEqual(spots);
  expect(lotSpots(at(120), at(8), at(6), at(8))).not.toEqual(spots);
  for (const [args, pattern] of [[[null, at(8), at(6), at(7)], /give the length/], [[at(120), at(8), at(2.5), at(7)], /whole number/], [[at(120), at(8), at(6), null], /give the seed/], [[at(120), at(8), at(5000), at(1)], /at least 1 and at most 1000/]] as [[Block | null, Block, Block, Block | null], RegExp][]) expect(lotSpots(...args)).toEqual(says(pattern));
});

test("LOTTESTS rounds up, keeps the least, and asks for none where nothing was placed", () => {
  expect(lotTests(down(0, 10, 1500, 1501, 9000), at(1500), at(3))).toEqual([[0], [3], [3], [3], [6]]);
  expect(number(lotTests(at(1501), at(1500), null))).toBe(2);
  expect(cellError(lotTests(at(10), at(0), null)).says).toMatch(/must be above 0/);
});

describe("PASSCHANCE", () => {
  const chance = (...args: unknown[]): number => number(passChance(...args.map((one) => one === null ? null : at(one)) as [Block, Block, Block, Block, Block, Block, Block]));
  test("a reading on the limit is even odds; one standard uncertainty above it 84.1 % (table of the normal distribution)", () => {
    expect(chance(1.805, 1.9, 95, 0.02, null, null, null)).toBeCloseTo(0.5, 9);
    expect(chance(1.825, 1.9, 95, 0.02, null, null, null)).toBeCloseTo(0.8413447, 6);
    // with 0.02 and 0.95 x 0.02 the standard uncertainty of the margin is 0.0275862
    expect(chance(1.805 + 0.0275862, 1.9, 95, 0.02, 0.02, null, null)).toBeCloseTo(0.8413447, 5);
  });
  test("a lot draws the reading to its mean by the weights of the two (derived: 1.82 and 1.86 with 0.02 each are 1.84 with 0.01414)", () => {
    expect(chance(1.82, 1.9, 95, 0.02, null, 1.86, 0.02)).toBeCloseTo(chance(1.84, 1.9, 95, 0.02 / Math.SQRT2, null, null, null), 9);
  });
  test.each([[[1.82, 1.9, 95, 0.02, null, 1.86, null], /both the mean and the standard deviation/], [[1.82, 1.9, 95, 1.5, null, null, null], /not in percent/], [[1.82, 18.6, 95, 0.02, null, null, null], /one unit/], [[1.82, 1.9, 0.95, 0.02, null, null, null], /below 1/]] as [unknown[], RegExp][])("bad input %#", (args, pattern) =>
    expect(cellError(passChance(...args.map((one) => one === null ? null : at(one)) as [Block, Block, Block, Block, Block, Block, Block])).says).toMatch(pattern));
});

describe("gauge and sand", () => {
  test("dry is wet less corrected moisture; percents by their own word", () => {
    expect(number(gaugeDry(at(125), at(13.4), at(0.5), null))).toBeCloseTo(111.1, 10);
    expect(number(gaugeDry(at(2.05), at(12), at(0.5), at("percent")))).toBeCloseTo(1.8222, 4);
    expect(cellError(gaugeDry(at(2.05), at(12), null, null)).says).toMatch(/give percents with the kind "percent"/);
    expect(cellError(gaugeDry(at(125), at(1), at(-3), null)).says).toMatch(/check the sign/);
  });
  test("the offset that was found makes the gauge agree with the oven on the mean", () => {
    const wet = [125, 128, 131], gauge = [13.1, 13.9, 14.2], oven = [12.1, 12.6, 12.4], offset = number(gaugeOffset(down(...wet), down(...gauge), down(...oven), null));
    const dry = wet.map((w, i) => number(gaugeDry(at(w), at(gauge[i]), at(offset), null))), byOven = wet.map((w, i) => w / (1 + oven[i]! / 100));
    expect(dry.reduce((a, b) => a + b)).toBeCloseTo(byOven.reduce((a, b) => a + b), 9);
    expect(number(gaugeOffset(down(...wet), down(11.2, 11.9, 12), down(...oven), at("percent")))).toBeCloseTo((0.9 + 0.7 + 0.4) / 3, 9);
    expect(gaugeOffset(down(125, "x"), down(13, 13), down(12, 12), null)).toEqual(says(/row 2 of the ranges/));
  });
  test("sand and cone from their weighings (published problem: 99.0 lb/ft3 and 0.53 lb)", () => {
    expect(number(sandDensityColumn(at(11.3), at(8), at(1 / 30)))).toBeCloseTo(99, 9);
    expect(number(sandInConeColumn(at(7.53), at(7)))).toBeCloseTo(0.53, 9);
    expect(cellError(sandInConeColumn(at(7), at(7.5))).says).toMatch(/sand ran out of the bottle/);
    expect(cellError(sandDensityColumn(at(7), at(8), at(1))).says).toMatch(/must be above/);
  });
});

describe("water and blends", () => {
  test("2 points in a 200 mm lift at 1.80 are 7.2 litres a m2 (common practice), and more with a loss", () => {
    expect(number(waterSpray(at(200), at(1.8), at(10), at(12), null, null))).toBeCloseTo(7.2, 9);
    expect(number(waterSpray(at(200), at(1.8), at(10), at(12), at(10), null))).toBeCloseTo(8, 9);
    expect(number(waterSpray(at(200), at(1.8), at(12), at(10), at(10), null))).toBeCloseTo(-7.2, 9);
    expect(cellError(waterSpray(at(200), at(112), at(10), at(12), null, null)).says).toMatch(/choose "US"/);
  });
  test("drying: 7.2 mm at 4 mm a day, none where it is dry enough", () => {
    expect(number(dryTime(at(200), at(1.8), at(12), at(10), at(4), null))).toBeCloseTo(1.8, 9);
    expect(number(dryTime(at(200), at(1.8), at(9), at(10), at(4), null))).toBe(0);
    expect(cellError(dryTime(at(200), at(1.8), at(12), at(10), at(0), null)).says).toMatch(/above 0/);
  });
  test("a blend, and the share that makes it", () => {
    expect(number(blendWater(at(100), at(10), at(50), at(25)))).toBeCloseTo(14.5833, 4);
    expect(number(blendShare(at(10), at(25), at(14.58333333), null))).toBeCloseTo(100 / 3, 5);
    expect(number(blendShare(at(10), at(25), at(14.58333333), at("dry")))).toBeCloseTo(30.5556, 4);
    expect(cellError(blendShare(at(10), at(25), at(30), null)).says).toMatch(/outside the two soils' 10 to 25 %/);
    expect(cellError(blendShare(at(10), at(10), at(10), null)).says).toMatch(/no blend of them has another/);
    expect(cellError(blendWater(at(0), at(10), at(0), at(25))).says).toMatch(/nothing to blend/);
  });
});

describe("rollers and gradings", () => {
  test("FM 5-434: 8 ft, 3 mph, 6 in, 50-minute hour, 4 passes give 489 yd3 an hour", () => {
    expect(Math.round(number(rollRate(at(8), at(3), at(6), at(4), at(250 / 3), at("US"))))).toBe(489);
    expect(number(rollRate(at(2), at(4), at(200), at(6), at(75), null))).toBeCloseTo(200, 9);
    expect(cellError(rollRate(at(2), at(4), at(0.2), at(6), null, null)).says).toMatch(/no lift in mm/);
  });
  test("a trial without scatter gives its plateau and its passes back", () => {
    const passes = [1, 2, 4, 6, 8, 10], dries = passes.map((n) => 1.95 - 0.25 * Math.exp(-n / 3)), block = rollFit(down(...passes), down(...dries), at(1.92), at(0.005)) as Cell[][];
    expect(block[1]![1]).toBeCloseTo(1.95, 6);
    expect(block[2]![1]).toBeCloseTo(3 * Math.log(0.25 / 0.03), 4);
    // the gain of pass n + 1 is 0.25 e^(-n/3) (1 - e^(-1/3)): below 0.005 from 3 ln(0.25 x 0.28347 / 0.005) = 7.96 on
    expect(block[3]![1]).toBe(8);
    const scattered = rollFit(down(...passes), down(...dries.map((d, i) => d + (i % 2 ? 0.004 : -0.004))), at(1.99), null) as Cell[][];
    expect(scattered[1]![2] as number).toBeLessThan(scattered[1]![1] as number);
    expect(scattered[2]![1]).toMatch(/not reached/);
  });
  test.each([[down(2, 4), down(1.8, 1.85), /at least three different/, "#N/A"], [down(1, 2, 4, 6), down(1.9, 1.86, 1.82, 1.8), /do not rise towards a plateau/, "#VALUE!"], [down(1, 2, 4), down(1.8, 1.85, 112), /one unit/, "#VALUE!"], [null, down(1), /give the passes/, "#VALUE!"]] as [Block | null, Block, RegExp, string][])("a trial that tells nothing %#", (passes, dries, pattern, code) => expect(rollFit(passes, dries, null, null)).toEqual(says(pattern, code)));
  test("FINESFILL: voids of 39.6 % filled (derived), and more of either side of it is less dense", () => {
    const [[share, density]] = finesFill(at(1.6), at(2.65), at(1.3), at(1)) as [[number, number]];
    expect(share).toBeCloseTo(24.353, 3);
    expect(density).toBeCloseTo(2.1151, 4);
    expect(finesFill(at(2.7), at(2.65), at(1.3), at(1))).toEqual(says(/has no voids/));
    expect(finesFill(at(16), at(2.65), at(13), null)).toEqual(says(/It looks like kN/));
  });
  test("GRADEWELL after ASTM D2487", () => {
    expect(gradeWell(at(0.15), at(0.9), at(2.4), at("sand"))).toEqual([[expect.closeTo(16, 9), expect.closeTo(2.25, 9), "well graded"]]);
    expect((gradeWell(at(0.5), at(0.9), at(2.4), at("gravel")) as Cell[][])[0]![2]).toBe("poorly graded");
    expect((gradeWell(at(0.5), at(1.2), at(2.4), at("sand")) as Cell[][])[0]![2]).toBe("poorly graded");
    expect(gradeWell(at(2), at(1), at(3), at("sand"))).toEqual(says(/sizes must rise/));
    expect(gradeWell(at(0.1), at(1), at(3), null)).toEqual(says(/"gravel" or "sand"/));
  });
});
