import { curveWords, type CompactionTest, type CurveWord, type Fit, type FitOutcome, type NoFit } from "../compaction/fit";
import { fitTest } from "../compaction/fit-test";
import { CellError, isLeftOut, notEnough, refusal, type Block } from "./cell";
import { once } from "./once";
import { readPairs } from "./pairs";
import { numberOf, waterDensity, wordOf } from "./readers";
import { single } from "./single";
import { unitGuard } from "./unit-guard";

export type Cells = Block | null;

/** The arguments that every function on a whole test shares. */
export interface TestCells { readonly waters: Cells; readonly dries: Cells; readonly curve: Cells; readonly gs: Cells; readonly water: Cells }

export interface ReadTest { readonly test: CompactionTest; readonly word: CurveWord; readonly rows: readonly number[] }

export const curveReader = wordOf("curve", curveWords, "auto");

export function readTest({ waters, dries, curve, gs, water }: TestCells): ReadTest | CellError {
  if (isLeftOut(waters)) return refusal("give the water contents of the points.");
  if (isLeftOut(dries)) return refusal("give the dry densities of the points.");
  const pairs = readPairs("waterContent", waters!, "dryDensity", dries!);
  if (pairs instanceof CellError) return pairs;
  const word = single(curveReader, curve), specificGravity = single(numberOf("specificGravity"), gs), density = single(waterDensity, water);
  for (const read of [word, specificGravity, density]) if (read instanceof CellError) return read;
  // the density of water enters with the specific gravity, or where it is given; else the fit holds in any unit
  if (!isLeftOut(gs) || !isLeftOut(water)) {
    for (const [i, dry] of pairs.second.entries()) {
      const trouble = unitGuard(dry, density as number, `row ${pairs.rows[i]} of the ranges: `);
      if (trouble) return trouble;
    }
  }
  const mixed = mixedUnits(pairs.second, pairs.rows);
  if (mixed) return mixed;
  return {
    test: { waters: pairs.first, dries: pairs.second, specificGravity: specificGravity as number | undefined, waterDensity: density as number },
    word: word as CurveWord,
    rows: pairs.rows,
  };
}

/** No soil's densest point is this many times its loosest in one test; two units are mixed. Common practice, no published source. */
const UNIT_MIX = 3;

export const fitOnce = once((test: CompactionTest, word: CurveWord): FitOutcome => fitTest(test, word));

const errorOf = ({ why, says }: NoFit): CellError => why === "too-few-points" || why === "no-spread" ? notEnough(sentence(says)) : refusal(sentence(says));
export const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

export function fitted(cells: TestCells): { fit: Fit; rows: readonly number[] } | CellError {
  const read = readTest(cells);
  if (read instanceof CellError) return read;
  const outcome = fitOnce(read.test, read.word);
  return outcome.ok ? { fit: outcome.fit, rows: read.rows } : errorOf(outcome.noFit);
}

/** Refuses densities of one test that cannot be in one unit, naming the two rows. */
export function mixedUnits(dries: readonly number[], rows: readonly number[]): CellError | undefined {
  const most = Math.max(...dries), least = Math.min(...dries);
  return most > UNIT_MIX * least ? refusal(`the dry densities run from ${least} (row ${rows[dries.indexOf(least)]} of the ranges) to ${most} (row ${rows[dries.indexOf(most)]}): they cannot be in one unit.`) : undefined;
}
