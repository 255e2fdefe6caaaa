import type { Cell } from "../worksheet/cell";

/** A block of cells. Rows and columns count from 0. */
export interface Area { readonly sheet: string; readonly row: number; readonly column: number; readonly rows: number; readonly columns: number }

/** What the pane sees of a block: everything but colours. */
export interface Snapshot {
  readonly area: Area;
  readonly values: readonly (readonly Cell[])[];
  /** the formula as typed, with its `=`, or null where the cell holds a constant or is filled by a spill */
  readonly formulas: readonly (readonly (string | null)[])[];
  /** number format codes, `"General"` where none is set */
  readonly formats: readonly (readonly string[])[];
  /** the texts as shown */
  readonly texts: readonly (readonly string[])[];
}

/** Why a request was refused, for the pane to say in words. */
export type Why = "filled" | "protected" | "merged" | "table" | "spill" | "gone" | "too-large" | "several-areas" | "unsupported";

export type Done<T = void> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly why: Why; readonly where: readonly Area[]; readonly says: string };

/** Formulas are written in one tongue: English names, commas, A1 references, `TAMP.NAME`. Each host stores what it stores. */
export type Content = { readonly value: Cell } | { readonly formula: string; /** how far a spilling formula will fill today */ readonly reaches?: { readonly rows: number; readonly columns: number } };

export interface Placement {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
  /** rows of contents; null leaves a cell as it is */
  readonly cells: readonly (readonly (Content | null)[])[];
}

export type MarkKind = "past-line" | "doubtful" | "ask";

/** A mark on a block of cells, with a note on its first cell where the user has none of their own there. */
export interface Mark { readonly area: Area; readonly kind: MarkKind; readonly note?: string }

/** What a host can do beyond values and formulas. */
export interface Abilities { readonly marks: boolean; readonly notes: boolean; readonly spills: boolean }

export interface SheetInfo { readonly name: string; /** the part of the sheet that holds anything */ readonly used: Area | null; readonly hidden: boolean; readonly protected: boolean }

/**
 * The one way from the pane to a workbook, whichever host holds it. Everything crosses as plain data and every call
 * is a promise, because the office host and the bench's frame allow nothing else.
 * A request that cannot be carried out is answered, not thrown; a rejected promise means the host itself failed.
 */
export interface WorkbookPort {
  abilities(): Promise<Abilities>;
  sheets(): Promise<SheetInfo[]>;
  /** the selected block (the first of several), or null; never trimmed */
  selection(): Promise<Area | null>;
  read(area: Area): Promise<Done<Snapshot>>;
  /**
   * All or nothing. A cell that holds something (and every cell that a spill would reach) is refused
   * unless it lies in `over`, the very cells that the user agreed to lose.
   */
  write(what: readonly Placement[], over: readonly Area[]): Promise<Done<{ readonly written: readonly Area[] }>>;
  /**
   * Marks are conditional formats that carry our signature and leave the user's own formats alone,
   * so that unmarking removes exactly those, after saving, reopening, inserted rows or a change of host.
   */
  mark(marks: readonly Mark[]): Promise<Done<{ /** cells with a note of the user's, which were marked without ours */ readonly notesLeftOut: readonly Area[] }>>;
  /** takes away marks and notes of ours on one sheet, or everywhere; says how many marks went */
  unmark(sheet: string | null): Promise<Done<{ readonly removed: number }>>;
  goTo(area: Area): Promise<Done>;
  /** small settings of ours that travel in the file (columns chosen, specific gravity) */
  recall(key: string): Promise<string | null>;
  remember(key: string, value: string | null): Promise<void>;
  on(event: PortEvent, hear: (area: Area) => void): () => void;
}

export type PortEvent = "selection" | "change";

/** Every mark's formula and every note of ours carry this name. */
export const SIGNATURE = "Tampsheet";

/** A mark's formula is true in every cell and says whose it is, in a form that other programs leave alone when they save. */
export const markFormula = (kind: MarkKind): string => `"${SIGNATURE}:${kind}"<>""`;
export const markKindOf = (formula: string): MarkKind | undefined => new RegExp(`"${SIGNATURE}:(past-line|doubtful|ask)"`).exec(formula)?.[1] as MarkKind | undefined;
