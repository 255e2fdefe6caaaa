import type { Area } from "./port";

/** 0 → A, 25 → Z, 26 → AA. */
export function columnName(column: number): string {
  let name = "";
  for (let rest = column + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) name = String.fromCharCode(65 + (rest - 1) % 26) + name;
  return name;
}

export function columnNumber(name: string): number {
  let number = 0;
  for (const letter of name.toUpperCase()) number = number * 26 + letter.charCodeAt(0) - 64;
  return number - 1;
}

export const cellName = (row: number, column: number): string => `${columnName(column)}${row + 1}`;

/** A sheet name as a formula wants it, quoted where it must be. */
export const sheetName = (name: string): string =>
  /^[A-Za-z_][A-Za-z0-9_.]*$/.test(name) && !/^[A-Za-z]{1,3}\d+$/.test(name) && !/^[rRcC]$|^[rR]\d*[cC]\d*$/.test(name) ? name : `'${name.replace(/'/g, "''")}'`;

/** B2:D5, without the sheet. */
export const rangeName = ({ row, column, rows, columns }: Omit<Area, "sheet">): string =>
  rows === 1 && columns === 1 ? cellName(row, column) : `${cellName(row, column)}:${cellName(row + rows - 1, column + columns - 1)}`;

export const areaName = (area: Area): string => `${sheetName(area.sheet)}!${rangeName(area)}`;

/** Reads `B2`, `B2:D5` or `$B$2:$D$5`; undefined where the text is none of them. */
export function parseRange(text: string): Omit<Area, "sheet"> | undefined {
  const match = /^\$?([A-Za-z]{1,3})\$?(\d{1,7})(?::\$?([A-Za-z]{1,3})\$?(\d{1,7}))?$/.exec(text);
  if (!match) return undefined;
  const top = Number(match[2]) - 1, left = columnNumber(match[1]!);
  const bottom = match[4] ? Number(match[4]) - 1 : top, right = match[3] ? columnNumber(match[3]) : left;
  return { row: Math.min(top, bottom), column: Math.min(left, right), rows: Math.abs(bottom - top) + 1, columns: Math.abs(right - left) + 1 };
}

export const overlap = (a: Area, b: Area): boolean =>
  a.sheet === b.sheet && a.row < b.row + b.rows && b.row < a.row + a.rows && a.column < b.column + b.columns && b.column < a.column + a.columns;
