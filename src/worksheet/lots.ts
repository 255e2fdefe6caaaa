import { chanceOfPassing } from "../lots/chance";
import { stratifiedSpots } from "../lots/spots";
import { characteristicFactor, mean, percentWithin, sampleDeviation } from "../lots/within-limits";
import type { QuantityId } from "../relations/quantities";
import { CellError, isBlank, isLeftOut, notEnough, quoted, refusal, type Block, type Cell } from "./cell";
import { argument, column } from "./column";
import { numberOf, type Reader } from "./readers";
import { single } from "./single";
import { sameUnitGuard } from "./unit-guard";

type Cells = Block | null;

/** A plain number with limits of its own, for figures that are no quantity of the soil. */
function plain(name: string, from: number, to: number, { above = false, whole = false, leftOut }: { above?: boolean; whole?: boolean; leftOut?: number } = {}): Reader<number> {
  return {
    name,
    ...(leftOut === undefined ? {} : { leftOut }),
    read(value) {
      if (value instanceof CellError) return value;
      if (isBlank(value)) return refusal(`${name} is blank.`);
      if (typeof value !== "number" || !Number.isFinite(value)) return refusal(`${name} must be a number, not ${quoted(value)}.`);
      if (value < from || value > to || (above && value === from)) return refusal(`${name} must be ${above ? "above" : "at least"} ${from}${to === Infinity ? "" : ` and at most ${to}`}, not ${value}.`);
      return whole && !Number.isInteger(value) ? refusal(`${name} must be a whole number, not ${value}.`) : value;
    },
  };
}

/** Every number of a range, texts without digits and blanks passed over; anything else is refused with its place. */
function valuesOf(block: Cells, name: string): number[] | CellError {
  if (isLeftOut(block)) return refusal(`give the ${name}.`);
  const out: number[] = [];
  for (const [r, row] of block!.entries()) for (const [c, value] of row.entries()) {
    if (isBlank(value) || (typeof value === "string" && !/\d/.test(value))) continue;
    if (value instanceof CellError) return value;
    if (typeof value !== "number" || !Number.isFinite(value)) return refusal(`row ${r + 1}, column ${c + 1} of the ${name}: ${quoted(value)} is not a number.`);
    out.push(value);
  }
  return out;
}

/** Percent of a lot within its limits, estimated from its tests. */
export function lotWithin(values: Cells, lower: Cells, upper: Cells): Cell[][] | CellError {
  const numbers = valuesOf(values, "values of the lot");
  if (numbers instanceof CellError) return numbers;
  const low = isLeftOut(lower) ? null : single(plain("lower limit", -Infinity, Infinity), lower), high = isLeftOut(upper) ? null : single(plain("upper limit", -Infinity, Infinity), upper);
  for (const read of [low, high]) if (read instanceof CellError) return read;
  if (low === null && high === null) return refusal("give a lower limit, an upper limit, or both.");
  if (low !== null && high !== null && (low as number) > (high as number)) return refusal(`the lower limit ${low as number} lies above the upper limit ${high as number}.`);
  if (numbers.length < 3) return notEnough(`A lot needs at least three values; there ${numbers.length === 1 ? "is 1" : `are ${numbers.length}`}.`);
  return [[percentWithin(numbers, low as number | null, high as number | null)]];
}

/** Characteristic value of a lot, mean − k·s. */
export function lotCharacteristic(values: Cells, k: Cells): Cell[][] | CellError {
  const numbers = valuesOf(values, "values of the lot");
  if (numbers instanceof CellError) return numbers;
  if (numbers.length < 2) return notEnough(`A characteristic value needs at least two values; there ${numbers.length === 1 ? "is 1" : `are ${numbers.length}`}.`);
  const factor = isLeftOut(k) ? characteristicFactor(numbers.length) : single(plain("factor k", 0, 100), k);
  return factor instanceof CellError ? factor : [[mean(numbers) - factor! * sampleDeviation(numbers)]];
}

const MOST_SPOTS = 1000;

/** Where to test: one random place in each of equal stretches of the lot. */
export function lotSpots(length: Cells, width: Cells, count: Cells, seed: Cells): Cell[][] | CellError {
  const along = single(plain("length of the lot", 0, Infinity, { above: true }), length), across = single(plain("width of the lot", 0, Infinity), width), tests = single(plain("count of tests", 1, MOST_SPOTS, { whole: true }), count), start = single(plain("seed", 0, 2 ** 31, { whole: true }), seed);
  for (const [read, name] of [[along, "length of the lot"], [across, "width of the lot"], [tests, "count of tests"], [start, "seed, any whole number; the same seed gives the same places"]] as const) {
    if (read instanceof CellError) return read;
    if (read === undefined) return refusal(`give the ${name}.`);
  }
  return [["test", "along", "across"], ...stratifiedSpots(along as number, across as number, tests as number, start as number).map((spot, i): Cell[] => [i + 1, spot.along, spot.across])];
}

/** How many tests a quantity needs. */
export const lotTests = (quantity: Cells, perTest: Cells, minimum: Cells): Cell[][] | CellError =>
  column([argument(plain("quantity", 0, Infinity), quantity), argument(plain("quantity a test stands for", 0, Infinity, { above: true }), perTest), argument(plain("least number of tests", 0, 1e6, { whole: true, leftOut: 1 }), minimum)],
    (all, each, least) => all === 0 ? 0 : Math.max(least, Math.ceil(all / each - 1e-9)));

/** Probability that the true relative compaction meets its limit. */
export const passChance = (dry: Cells, maxDry: Cells, limit: Cells, sdDry: Cells, sdMax: Cells, lotMean: Cells, lotSd: Cells): Cell[][] | CellError => {
  if (isLeftOut(lotMean) !== isLeftOut(lotSd)) return refusal("give both the mean and the standard deviation of the lot, or neither.");
  const optional = <T>(id: QuantityId): Reader<number | null> => ({ ...numberOf(id) as Reader<number | null>, leftOut: null } satisfies Reader<T | number | null>);
  return column([
    argument(numberOf("dryDensity"), dry), argument(numberOf("maxDryDensity"), maxDry), argument(numberOf("relativeCompaction"), limit),
    argument(plain("standard uncertainty of a test", 0, Infinity), sdDry), argument(plain("standard uncertainty of the maximum dry density", 0, Infinity, { leftOut: 0 }), sdMax),
    argument({ ...optional("dryDensity"), name: "mean dry density of the lot" }, lotMean), argument({ ...plain("standard deviation of the lot", 0, Infinity), leftOut: null } as Reader<number | null>, lotSd),
  ], (dryDensity, maxDryDensity, percent, deviation, maxDeviation, middle, spread) =>
    sameUnitGuard(dryDensity, "dry density", maxDryDensity, "maximum dry density", 0.5, 1.5)
    ?? (deviation > 0.2 * dryDensity ? refusal(`a standard uncertainty of ${deviation} beside a dry density of ${dryDensity} is no test's: give it in the unit of the density, not in percent.`) : undefined)
    ?? (middle === null ? undefined : sameUnitGuard(dryDensity, "dry density", middle, "mean dry density of the lot", 0.5, 1.5))
    ?? chanceOfPassing({ dryDensity, maxDryDensity, limit: percent, deviation, maxDeviation, lot: middle === null || spread === null ? undefined : { mean: middle, deviation: spread } }));
};
