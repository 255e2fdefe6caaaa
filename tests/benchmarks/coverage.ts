/**
 * Do the intervals hold? Seeded tests are drawn from a known curve, each reading with its own error, and the truth is looked
 * for in the interval: npm run coverage. Tests without a peak inside the data are refused, and counted apart.
 * Arguments: tests a row (10000), seed (1).
 */
import type { CurveWord, Fit } from "../../src/compaction/fit";
import { fitTest } from "../../src/compaction/fit-test";
import { saturationCurve, summitWithSlopes } from "../../src/compaction/curves/saturation-model";
import { seeded } from "../../src/numerics/random";

const tests = Number(process.argv[2] ?? 10_000), seed = Number(process.argv[3] ?? 1);
const WET_DENSITY = 0.004, WATER = 0.3;
const GS = 2.7, RHO = 0.9982, SHAPE = { mostSaturation: 0.92, waterThere: 18, sharpness: 4, dryShape: 0.5 };
const summit = summitWithSlopes([SHAPE.mostSaturation, SHAPE.waterThere, SHAPE.sharpness, SHAPE.dryShape], GS, RHO, null, null)!;

interface Truth { readonly name: string; readonly water: number; readonly dry: number; at(water: number): number }
const truths: readonly Truth[] = [
  { name: "parabola", water: 14, dry: 1.85, at: (w) => 1.85 - 0.006 * (w - 14) ** 2 },
  { name: "saturation", water: summit.water, dry: summit.dry, at: (w) => saturationCurve(w, SHAPE, GS, RHO) },
];

interface Row { readonly truth: Truth; readonly points: number; readonly curve: CurveWord; readonly weigh: boolean }

/** Points 1.8 apart about the optimum, where a laboratory puts them, with the whole set shifted at random. */
function drawTest({ truth, points }: Row, random: ReturnType<typeof seeded>): { waters: number[]; dries: number[] } {
  const shift = (random.uniform() - 0.5) * 1.2, waters: number[] = [], dries: number[] = [];
  for (let i = 0; i < points; i++) {
    const water = truth.water + 1.8 * (i - (points - 1) / 2) + shift + 0.3 * random.normal();
    const wet = truth.at(water) * (1 + water / 100) * (1 + WET_DENSITY * random.normal()), read = water + WATER * random.normal();
    waters.push(read);
    dries.push(wet / (1 + read / 100));
  }
  return { waters, dries };
}

const holds = (low: number | null, high: number | null, value: number): boolean => value >= (low ?? -Infinity) && value <= (high ?? Infinity);
function coverage(row: Row): string[] {
  const random = seeded(seed * 1000 + row.points);
  let fitted = 0, water = 0, dry = 0, waterJoined = 0, dryJoined = 0, bounded = 0, width = 0, bias = 0;
  for (let k = 0; k < tests; k++) {
    const { waters, dries } = drawTest(row, random);
    const outcome = fitTest({ waters, dries, specificGravity: GS, waterDensity: RHO }, row.curve, { weigh: row.weigh });
    if (!outcome.ok) continue;
    const { optimumWater, maxDryDensity, joined: join }: Fit = outcome.fit, joined = join(), { truth } = row;
    fitted++;
    bias += optimumWater.value - truth.water;
    if (holds(optimumWater.low, optimumWater.high, truth.water)) water++;
    if (holds(maxDryDensity.low, maxDryDensity.high, truth.dry)) dry++;
    if (holds(joined.optimumWater.low, joined.optimumWater.high, truth.water)) waterJoined++;
    if (holds(joined.maxDryDensity.low, joined.maxDryDensity.high, truth.dry)) dryJoined++;
    if (optimumWater.low !== null && optimumWater.high !== null) { bounded++; width += optimumWater.high - optimumWater.low; }
  }
  const share = (count: number): string => (100 * count / fitted).toFixed(1);
  return [row.truth.name, String(row.points), row.curve + (row.weigh ? ", weighed" : ""), share(water), share(dry), share(waterJoined), share(dryJoined), share(bounded), (width / bounded / 2).toFixed(2), (bias / fitted).toFixed(2), (100 * (1 - fitted / tests)).toFixed(1)];
}

const heads = ["truth", "points", "curve", "optimum %", "density %", "optimum, joined %", "density, joined %", "bounded %", "± points", "bias", "refused %"];
const rows: Row[] = truths.flatMap((truth) => [4, 5, 6, 7, 8].flatMap((points) => [
  { truth, points, curve: truth.name as CurveWord, weigh: false }, { truth, points, curve: truth.name as CurveWord, weigh: true }, { truth, points, curve: "auto", weigh: false }, { truth, points, curve: "auto", weigh: true },
] as Row[]).filter(({ curve, weigh }) => curve !== "saturation" || !weigh));
const lines = [heads, ...rows.map(coverage)];
const widths = heads.map((_, c) => Math.max(...lines.map((line) => line[c]!.length)));
console.log(`${tests} tests a row, seed ${seed}; wet density scatters by ${100 * WET_DENSITY} %, water content by ${WATER} points. Share of tests whose 95 % interval holds the truth.`);
for (const line of lines) console.log(line.map((cell, c) => cell.padEnd(widths[c]!)).join("  "));
