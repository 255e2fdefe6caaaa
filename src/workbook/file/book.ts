import type { Mark } from "../port";

/** A workbook read from an .xlsx file, as much of it as our hosts show and compute. The file itself stays the truth. */
export interface Book {
  readonly sheets: readonly BookSheet[];
  readonly names: readonly DefinedName[];
  readonly tables: readonly BookTable[];
  /** cell styles by index; a cell names its own */
  readonly styles: readonly CellStyle[];
  readonly date1904: boolean;
  /** our own settings that travel in the file */
  readonly settings: Readonly<Record<string, string>>;
}

export interface BookSheet {
  readonly name: string;
  /** the part inside the package, `xl/worksheets/sheet1.xml` */
  readonly part: string;
  readonly hidden: boolean;
  readonly protected: boolean;
  readonly cells: readonly BookCell[];
  /** one more than the last used row and column */
  readonly rows: number;
  readonly columns: number;
  readonly merges: readonly Rectangle[];
  readonly hiddenRows: readonly number[];
  readonly hiddenColumns: readonly number[];
  /** widths in characters and heights in points, where they are not the default */
  readonly widths: ReadonlyMap<number, number>;
  readonly heights: ReadonlyMap<number, number>;
  readonly frozen: { readonly rows: number; readonly columns: number };
  readonly notes: readonly BookNote[];
  /** marks of ours that the file carries */
  readonly marks: readonly BookMark[];
}

export interface Rectangle { readonly row: number; readonly column: number; readonly rows: number; readonly columns: number }

export interface BookCell {
  readonly row: number;
  readonly column: number;
  /** a constant, or a formula's cached result; errors stand as their code in `error` */
  readonly value: number | string | boolean | null;
  readonly error?: string;
  /** in our one tongue: no `=`, no storage prefixes, `TAMP.NAME(` */
  readonly formula?: string;
  /** the range an array formula filled when the file was saved; its other cells are caches and are not listed */
  readonly fills?: { readonly rows: number; readonly columns: number; /** resizes by itself */ readonly dynamic: boolean };
  /** index into the book's styles */
  readonly style: number;
}

export interface CellStyle {
  readonly format: string;
  readonly bold?: boolean;
  readonly italic?: boolean;
  readonly underline?: boolean;
  /** `#rrggbb` */
  readonly colour?: string;
  readonly fill?: string;
  readonly fontSize?: number;
  readonly horizontal?: "left" | "center" | "right";
  readonly vertical?: "top" | "center" | "bottom";
  readonly wrap?: boolean;
  readonly borders?: Readonly<Partial<Record<"top" | "right" | "bottom" | "left", { readonly style: string; readonly colour: string }>>>;
}

export interface BookNote { readonly row: number; readonly column: number; readonly text: string; readonly ours: boolean }
export interface BookMark { readonly ranges: readonly Rectangle[]; readonly kind: Mark["kind"] }
export interface DefinedName { readonly name: string; readonly refersTo: string; readonly sheet?: string }
export interface BookTable { readonly name: string; readonly sheet: string; readonly range: Rectangle; readonly columns: readonly string[] }

/** Why a file was not opened, said so that its owner knows what to do. The open workbook stays as it is. */
export class BookRefusal extends Error {
  override readonly name = "BookRefusal";
  constructor(readonly why: "not-xlsx" | "damaged" | "encrypted" | "macros" | "too-large" | "old-format" | "cannot-change", readonly says: string) { super(says); }
}

/** What changes in one sheet. Cells that are not named stay byte for byte. */
export interface SheetPatch {
  readonly sheet: string;
  readonly cells: readonly CellPatch[];
  /** the marks that the sheet shall carry from now on; absent leaves them as they are */
  readonly marks?: readonly BookMark[];
  /** the notes of ours that the sheet shall carry from now on; absent leaves them as they are */
  readonly notes?: readonly { readonly row: number; readonly column: number; readonly text: string }[];
}

export interface CellPatch {
  readonly row: number;
  readonly column: number;
  /**
   * - `constant`: the cell becomes this value (null clears it, keeping its style)
   * - `formula`: the cell becomes this formula with this result
   * - `result`: the formula stays, only its cached result changes
   */
  readonly kind: "constant" | "formula" | "result";
  readonly value: number | string | boolean | null;
  readonly error?: string;
  readonly formula?: string;
  /** a formula that spills: the size of what it fills and the results, this cell's included */
  readonly fills?: { readonly rows: number; readonly columns: number; readonly results: readonly (readonly (number | string | boolean | null | { readonly error: string })[])[] };
}

export interface BookPatch { readonly sheets: readonly SheetPatch[]; readonly settings?: Readonly<Record<string, string>> }
