import { CellError, type Cell, type ErrorCode } from "../worksheet/cell";
import type { Injector, Library } from "./library";

/* eslint-disable @typescript-eslint/no-explicit-any -- the engine's formula model is untyped at this seam */

interface RawCell { readonly v?: unknown; readonly t?: number | null | undefined; readonly f?: string | null | undefined }
/** The engine's sheet, as much of it as is read here. */
interface RawSheet { getCellRaw(row: number, column: number): unknown }
interface Span { startRow: number; endRow: number; startColumn: number; endColumn: number }

const ERROR = /^#(?:N\/A|VALUE!|NUM!|REF!|NAME\?|DIV\/0!|NULL!|SPILL!|CALC!)$/;
const BOOLEAN = 3, TEXT = 1;

export function cellOf(raw: RawCell | null | undefined, message: string | undefined): Cell {
  if (!raw || raw.v === undefined || raw.v === null || raw.v === "") return raw?.v === "" ? "" : null;
  if (raw.t === BOOLEAN) return Boolean(Number(raw.v)) || raw.v === "TRUE";
  // only a formula gives an error; a text that looks like one stays a text, but the engine does not tell them apart
  if (typeof raw.v === "string" && ERROR.test(raw.v)) return new CellError(raw.v as ErrorCode, message ?? "");
  if (raw.t === TEXT) return String(raw.v);
  return raw.v as Cell;
}

/** Reads cells as the engine holds them: full precision, spilled cells included. */
export class CellReader {
  constructor(private readonly library: Library, private readonly injector: Injector, private readonly unitId: string) {}

  private model(): any { return this.injector.get(this.library.FormulaDataModel); }

  /** what formulas have filled beyond their own cell, on one sheet */
  spills(sheet: string): readonly Span[] {
    const rows = this.model().getArrayFormulaRange()?.[this.unitId]?.[sheet] ?? {};
    return Object.values(rows).flatMap((row) => Object.values(row as object)).filter((span): span is Span => Boolean(span));
  }

  spilled(sheet: string, row: number, column: number): RawCell | undefined {
    return this.model().getArrayFormulaCellData()?.[this.unitId]?.[sheet]?.[row]?.[column] ?? undefined;
  }

  /** the cell's own content, or what a formula elsewhere filled it with */
  raw(worksheet: RawSheet, sheet: string, row: number, column: number): RawCell | null | undefined {
    const own = worksheet.getCellRaw(row, column) as RawCell | null | undefined;
    if (own && (own.f || (own.v !== undefined && own.v !== null && own.v !== ""))) return own.f ? this.spilled(sheet, row, column) ?? own : own;
    return this.spilled(sheet, row, column) ?? own;
  }
}
