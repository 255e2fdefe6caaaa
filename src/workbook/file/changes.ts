import { CellError, type Cell } from "../../worksheet/cell";
import type { BookCell, CellPatch } from "./book";

/** A value as files hold it: errors beside the values, not among them. */
export interface Plain { readonly value: number | string | boolean | null; readonly error?: string }

export const plainOf = (cell: Cell): Plain => cell instanceof CellError ? { value: null, error: cell.code } : { value: cell };

export const fillsOf = (grid: readonly (readonly Cell[])[]): NonNullable<CellPatch["fills"]> => ({
  rows: grid.length,
  columns: grid[0]?.length ?? 0,
  results: grid.map((line) => line.map((cell) => cell instanceof CellError ? { error: cell.code } : cell)),
});

/** What a live copy of a workbook holds in one cell. */
export interface CellNow { readonly row: number; readonly column: number; readonly formula: string | undefined; readonly shown: Plain; readonly fills?: CellPatch["fills"] }

/** Twelve digits tell a changed result from the last bit of another program's arithmetic. */
const same = (a: Plain["value"], b: Plain["value"]): boolean =>
  typeof a === "number" && typeof b === "number" ? a === b || Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b)) : (a ?? "") === (b ?? "");

const samePlain = (a: Plain, b: Plain): boolean => a.error === b.error && (a.error !== undefined || same(a.value, b.value));

/** The patch that brings a cell of a file to what it is now, or undefined where it is that already. */
export function changeOf(old: BookCell | undefined, { row, column, formula, shown, fills }: CellNow): CellPatch | undefined {
  const was: Plain = old ?? { value: null };
  if (formula === undefined) {
    if (old?.formula === undefined && samePlain(was, shown)) return undefined;
    return { row, column, kind: "constant", ...shown, value: shown.value === "" ? null : shown.value };
  }
  const filled = fills ? { fills } : {};
  if (old?.formula !== formula) return { row, column, kind: "formula", formula, ...shown, ...filled };
  // a function that the engine does not know must not spoil the result that another program has left
  if (shown.error === "#NAME?" || (!fills && samePlain(was, shown))) return undefined;
  return { row, column, kind: "result", ...shown, ...filled };
}
