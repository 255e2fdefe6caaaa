import type { Snapshot } from "../workbook/port";
import { isBlank } from "../worksheet/cell";
import type { Table } from "./table";

/** The points of one of several tests in a selection, as indices of the table's points. */
export interface TestPoints { readonly name: string; readonly points: readonly number[] }

const NAMED = /^(test|curve|sample|soil|specimen|lab|laboratory|proctor|compaction|material|effort|series|report)\b/i;
/** A test has at least three points; a column that changes with every row numbers the points. */
const LEAST = 3;

/** The tests, and the line of the selection that names them (−1 where it is one test). */
export interface SeveralTests { readonly tests: readonly TestPoints[]; readonly index: number }
const ONE: SeveralTests = { tests: [], index: -1 };

/**
 * Tests below one another in one selection, told apart by a column of names: each name beside every point of its test, or
 * beside its first alone as a merged cell leaves it. Empty where the selection is one test.
 */
export function severalTests(table: Table, { area, values }: Snapshot): SeveralTests {
  if (table.points.length < 2 * LEAST || table.groups.length !== table.points.length) return ONE;
  for (const series of table.series) {
    if ((series.role !== "other" && series.role !== "pointName") || !NAMED.test(series.heading.trim())) continue;
    const groups = new Map<string, number[]>();
    let name: string | null = null;
    for (const [point, lines] of table.groups.entries()) {
      const line = lines[0]!, value = table.orientation === "down"
        ? values[line + table.area.row - area.row]?.[series.index + table.area.column - area.column]
        : values[series.index + table.area.row - area.row]?.[line + table.area.column - area.column];
      if (!isBlank(value)) name = String(value).trim();
      if (name === null) break;
      groups.set(name, [...groups.get(name) ?? [], point]);
    }
    const covered = [...groups.values()].reduce((sum, { length }) => sum + length, 0);
    if (groups.size >= 2 && covered === table.points.length && [...groups.values()].every(({ length }) => length >= LEAST)) return { tests: [...groups].map(([id, points]) => ({ name: id, points })), index: series.index };
  }
  return ONE;
}
