import { CellError, columnsOf, isBlank, isHeading, isLeftOut, isRange, refusal, rowsOf, type Block, type Cell } from "./cell";
import type { Reader } from "./readers";

/** An argument of a function: how it is read, and the cells it was given (absent where it was left out). */
export interface Argument<T> { readonly reader: Reader<T>; readonly block: Block | null | undefined }

export const argument = <T>(reader: Reader<T>, block: Block | null | undefined): Argument<T> => ({ reader, block });

/** Rows and columns up to the last cell that holds anything, over all ranges together: A:A means its used part. */
function usedSize(ranges: readonly Block[]): { rows: number; columns: number } {
  let rows = 0, columns = 0;
  for (const block of ranges) {
    for (let r = block.length - 1; r >= 0; r--) {
      const row = block[r]!;
      for (let c = row.length - 1; c >= 0; c--) {
        if (isBlank(row[c])) continue;
        if (block.length > 1) rows = Math.max(rows, r + 1);
        columns = Math.max(columns, row.length > 1 ? c + 1 : 0);
        break;
      }
    }
  }
  return { rows: Math.max(1, rows), columns: Math.max(1, columns) };
}

function sizeTrouble(given: readonly Argument<unknown>[]): CellError | undefined {
  const ranges = given.filter(({ block }) => block && isRange(block));
  for (const [size, word] of [[rowsOf, "rows"], [columnsOf, "columns"]] as const) {
    const long = ranges.filter(({ block }) => size(block!) > 1);
    const odd = long.find(({ block }) => size(block!) !== size(long[0]!.block!));
    if (odd) return refusal(`${long[0]!.reader.name} has ${size(long[0]!.block!)} ${word}, ${odd.reader.name} has ${size(odd.block!)}: give ranges of the same size.`);
  }
  return undefined;
}

/**
 * The one path of every scalar function: cells or whole columns in, one answer a row out.
 * - shapes broadcast as the host's own operators do (one cell, or one row against one column);
 * - a row whose ranged inputs are all blank gives a blank, a row of headings too;
 * - a bad row keeps its own error in its own cell;
 * - what is wrong with a whole argument (sizes, fractions for percents) refuses the call.
 */
export function column<Values extends readonly unknown[]>(
  given: { readonly [Place in keyof Values]: Argument<Values[Place]> }, compute: (...values: Values) => Cell,
): Cell[][] | CellError {
  const all = given as readonly Argument<unknown>[];
  const trouble = sizeTrouble(all) ?? firstCheck(all);
  if (trouble) return trouble;

  const blocks = all.map(({ block }) => isLeftOut(block) ? undefined : block!);
  const ranged = blocks.map((block) => block !== undefined && isRange(block));
  const anyRange = ranged.includes(true);
  const { rows, columns } = usedSize(blocks.filter((block, i): block is Block => ranged[i]!));
  const row = new Array<unknown>(all.length);
  const values = new Array<unknown>(all.length);

  function answer(r: number, c: number): Cell {
    let allPlain = true;
    for (let i = 0; i < all.length; i++) {
      const block = blocks[i], { reader } = all[i]!;
      if (block === undefined) {
        row[i] = undefined;
        values[i] = reader.leftOut;
        if (reader.leftOut === undefined) allPlain = false;
        continue;
      }
      const line = block[block.length === 1 ? 0 : r]!;
      const value = row[i] = line[line.length === 1 ? 0 : c];
      if (reader.plain?.(value)) values[i] = value;
      else allPlain = false;
    }
    return allPlain ? finite(compute(...values as unknown as Values)) : carefully();
  }

  function carefully(): Cell {
    // a constant beside a column does not make a blank row full
    const own = anyRange ? row.filter((_, i) => ranged[i]) : row.filter((_, i) => blocks[i] !== undefined);
    if (own.every(isBlank) || (anyRange && isHeading(own))) return "";
    for (let i = 0; i < all.length; i++) {
      const { reader } = all[i]!;
      const read = isBlank(row[i]) && reader.leftOut !== undefined ? reader.leftOut : reader.read(row[i]);
      if (read instanceof CellError) return read;
      values[i] = read;
    }
    return finite(compute(...values as unknown as Values));
  }

  return Array.from({ length: rows }, (_, r) => Array.from({ length: columns }, (__, c) => answer(r, c)));
}

function firstCheck(given: readonly Argument<unknown>[]): CellError | undefined {
  for (const { reader, block } of given) {
    const trouble = block ? reader.check?.(block) : undefined;
    if (trouble) return trouble;
  }
  return undefined;
}

const finite = (cell: Cell): Cell => typeof cell === "number" && !Number.isFinite(cell) ? refusal("no answer can be had from these values.") : cell;
