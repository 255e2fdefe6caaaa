import { CellError, columnsOf, isBlank, isHeading, quoted, refusal, rowsOf, type Block } from "./cell";
import { numberOf } from "./readers";
import type { QuantityId } from "../relations/quantities";

/** Two series read together. `rows` tells where each pair stands in the ranges, counted from 1. */
export interface Pairs { readonly first: readonly number[]; readonly second: readonly number[]; readonly rows: readonly number[] }

/** One cell a row of a range that is a row or a column. */
export const inLine = (block: Block): readonly unknown[] | undefined =>
  columnsOf(block) === 1 ? block.map((row) => row[0]) : rowsOf(block) === 1 ? block[0] : undefined;

/**
 * Reads two ranges of the same shape, one row or one column each.
 * A pair is skipped only where both cells are blank or both are texts without digits (headings);
 * one without the other is an error that names the row.
 */
export function readPairs(firstId: QuantityId, first: Block, secondId: QuantityId, second: Block): Pairs | CellError {
  const firstReader = numberOf(firstId), secondReader = numberOf(secondId);
  if (rowsOf(first) !== rowsOf(second) || columnsOf(first) !== columnsOf(second))
    return refusal(`${firstReader.name} has ${rowsOf(first)} rows and ${columnsOf(first)} columns, ${secondReader.name} has ${rowsOf(second)} and ${columnsOf(second)}: give ranges of the same size.`);
  const firsts = inLine(first), seconds = inLine(second);
  if (!firsts || !seconds) return refusal(`give ${firstReader.name} and ${secondReader.name} as one row or one column each.`);
  const trouble = firstReader.check?.(first) ?? secondReader.check?.(second);
  if (trouble) return trouble;

  const word = columnsOf(first) === 1 ? "row" : "column";
  const pairs: { first: number[]; second: number[]; rows: number[] } = { first: [], second: [], rows: [] };
  for (let i = 0; i < firsts.length; i++) {
    const a = firsts[i], b = seconds[i];
    if ((isBlank(a) && isBlank(b)) || isHeading([a, b])) continue;
    // an error that came in goes out, whatever stands beside it
    for (const value of [a, b]) if (value instanceof CellError) return value;
    for (const [value, own, other] of [[a, firstReader, secondReader], [b, secondReader, firstReader]] as const)
      if (isBlank(value)) return refusal(`${word} ${i + 1} of the ranges: ${own.name} is blank beside ${other.name} ${quoted(own === firstReader ? b : a)}. Fill it in, or clear both.`);
    const x = firstReader.read(a), y = secondReader.read(b);
    for (const read of [x, y]) if (read instanceof CellError) return refusal(`${word} ${i + 1} of the ranges: ${read.says}`);
    pairs.first.push(x as number);
    pairs.second.push(y as number);
    pairs.rows.push(i + 1);
  }
  return pairs;
}
