import type { Snapshot } from "../workbook/port";
import { isBlank, type Cell } from "../worksheet/cell";
import type { Place } from "./table";

/** A block seen along its points: `series` are its columns where points run down, its rows where they run across. */
export interface Grid {
  readonly orientation: "down" | "across";
  readonly series: number;
  readonly positions: number;
  value(series: number, position: number): Cell;
  format(series: number, position: number): string;
  shown(series: number, position: number): string;
  place(series: number, position: number): Place;
}

export function gridOf(snapshot: Snapshot, orientation: "down" | "across"): Grid {
  const { row, column, rows, columns } = snapshot.area;
  const pick = <T>(matrix: readonly (readonly T[])[], series: number, position: number): T | undefined =>
    orientation === "down" ? matrix[position]?.[series] : matrix[series]?.[position];
  return {
    orientation,
    series: orientation === "down" ? columns : rows,
    positions: orientation === "down" ? rows : columns,
    value: (series, position) => pick(snapshot.values, series, position) ?? null,
    format: (series, position) => pick(snapshot.formats, series, position) ?? "General",
    shown: (series, position) => pick(snapshot.texts, series, position) ?? "",
    place: (series, position) => orientation === "down" ? { row: row + position, column: column + series } : { row: row + series, column: column + position },
  };
}

export const textAt = (grid: Grid, series: number, position: number): string => {
  const value = grid.value(series, position);
  return typeof value === "string" ? value.trim() : "";
};

export const blankAt = (grid: Grid, series: number, position: number): boolean => isBlank(grid.value(series, position)) || grid.value(series, position) === " ";

export const numberAt = (grid: Grid, series: number, position: number): number | undefined => {
  const value = grid.value(series, position);
  return typeof value === "number" && Number.isFinite(value) ? value : undefined;
};

/** A number format that shows a fraction as a percent. A % inside quotes is only a text beside the number. */
export const isPercentFormat = (format: string): boolean => format.replace(/"[^"]*"|\\./g, "").includes("%");
