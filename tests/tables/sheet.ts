import type { Snapshot } from "../../src/workbook/port";
import type { Cell } from "../../src/worksheet/cell";

/** A cell of a test sheet: a value, or a value with its number format. */
export type Typed = Cell | { readonly value: Cell; readonly format: string };

const isFormatted = (typed: Typed): typed is { readonly value: Cell; readonly format: string } => typeof typed === "object" && typed !== null && "format" in typed;

/** A snapshot of rows as a person typed them, with its top left corner at a place (A1 where none is given). */
export function sheet(rows: readonly (readonly Typed[])[], at = { row: 0, column: 0 }): Snapshot {
  const columns = Math.max(...rows.map(({ length }) => length));
  const full = rows.map((row) => Array.from({ length: columns }, (_, c) => row[c] ?? null));
  const values = full.map((row) => row.map((typed) => isFormatted(typed) ? typed.value : typed));
  return {
    area: { sheet: "Lab", ...at, rows: rows.length, columns },
    values,
    formulas: values.map((row) => row.map(() => null)),
    formats: full.map((row) => row.map((typed) => isFormatted(typed) ? typed.format : "General")),
    texts: values.map((row) => row.map((value) => value === null ? "" : String(value))),
  };
}

export const percent = (value: Cell): Typed => ({ value, format: "0.0%" });
export const turned = <T>(rows: readonly (readonly T[])[]): T[][] => rows[0]!.map((_, c) => rows.map((row) => row[c]!));
