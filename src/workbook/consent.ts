import { areaName, overlap } from "./address";
import type { Area, Content, Done, Placement, Why } from "./port";

/** One cell to be written, with everything that it will fill. */
export interface Target { readonly at: Area; readonly content: Content; readonly reach: Area }

export function targetsOf(what: readonly Placement[]): Target[] {
  return what.flatMap(({ sheet, row, column, cells }) => cells.flatMap((line, r) => line.flatMap((content, c): Target[] => {
    if (content === null) return [];
    const at: Area = { sheet, row: row + r, column: column + c, rows: 1, columns: 1 };
    return [{ at, content, reach: "formula" in content && content.reaches ? { ...at, ...content.reaches } : at }];
  })));
}

export const spills = ({ reach }: Target): boolean => reach.rows * reach.columns > 1;

export function* cellsOf({ sheet, row, column, rows, columns }: Area): Generator<Area> {
  for (let r = row; r < row + rows; r++) for (let c = column; c < column + columns; c++) yield { sheet, row: r, column: c, rows: 1, columns: 1 };
}

/** What a host knows of its sheets when it is asked to write. */
export interface SheetsToWrite {
  has(sheet: string): boolean;
  isProtected(sheet: string): boolean;
  /** how many rows and columns the sheet has */
  size(sheet: string): { readonly rows: number; readonly columns: number };
  merges(sheet: string): readonly Area[];
  tables(sheet: string): readonly Area[];
  isFilled(cell: Area): boolean;
}

export const refused = (why: Why, where: readonly Area[], says: string): Done<never> => ({ ok: false, why, where, says });

export const noSheet = (area: Area): Done<never> => refused("gone", [area], `There is no sheet "${area.sheet}".`);
export const isProtected = (area: Area): Done<never> => refused("protected", [area], `The sheet "${area.sheet}" is protected: unprotect it first, or choose another.`);
export const isMerged = (area: Area): Done<never> => refused("merged", [area], `${areaName(area)} holds merged cells: choose cells that are not.`);
export const isInTable = (area: Area): Done<never> => refused("table", [area], `${areaName(area)} lies in a table, which takes no spilling formulas: choose a place outside it.`);
export const areFilled = (filled: readonly Area[]): Done<never> =>
  refused("filled", filled, `${filled.length} cell${filled.length === 1 ? " is" : "s are"} filled: ${filled.slice(0, 6).map(areaName).join(", ")}${filled.length > 6 ? " …" : ""}.`);

/** The first reason against writing, or undefined where all of it can be written. Consent is by cell. */
export function againstWriting(targets: readonly Target[], over: readonly Area[], sheets: SheetsToWrite): Done<never> | undefined {
  const filled: Area[] = [];
  for (const target of targets) {
    const { reach } = target, { sheet } = reach;
    if (!sheets.has(sheet)) return noSheet(reach);
    if (sheets.isProtected(sheet)) return isProtected(reach);
    const { rows, columns } = sheets.size(sheet);
    if (reach.row + reach.rows > rows || reach.column + reach.columns > columns) return refused("too-large", [reach], `${areaName(reach)} lies beyond the sheet.`);
    if (sheets.merges(sheet).some((merge) => overlap(merge, reach))) return isMerged(reach);
    if (spills(target) && sheets.tables(sheet).some((table) => overlap(table, reach))) return isInTable(reach);
    for (const cell of cellsOf(reach)) if (sheets.isFilled(cell) && !over.some((one) => overlap(one, cell))) filled.push(cell);
  }
  return filled.length > 0 ? areFilled(filled) : undefined;
}
