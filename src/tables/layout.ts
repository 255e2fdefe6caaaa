import { meanings, readUnit, SUMMARY, type UnitRead } from "./headings";
import { blankAt, numberAt, textAt, type Grid } from "./grid";
import type { Role } from "./table";

/** Where a grid's headings, units and readings stand. Positions count along the points. */
export interface Layout {
  /** the last position of the headings, or -1 where there are none */
  readonly headingAt: number;
  readonly unitAt: number;
  readonly headings: readonly string[];
  readonly meanings: readonly (readonly Role[])[];
  /** unit of each series, or undefined */
  readonly unitOf: readonly ({ readonly read: UnitRead; readonly from: "heading" | "unit row" } | undefined)[];
  /** first position of the readings */
  readonly bodyFrom: number;
  /** how many headings say something known: the measure by which an orientation is chosen */
  readonly score: number;
}

/** Headings stand near the start; a title and a few facts of the job may come before them. */
const FURTHEST_HEADING = 14;

const known = (roles: readonly Role[]): boolean => roles.some((role) => role !== "other");

export function layoutOf(grid: Grid): Layout {
  let best = { score: 0, at: -1, headings: [] as string[] };
  for (let position = 0; position < Math.min(grid.positions, FURTHEST_HEADING); position++) {
    const headings = Array.from({ length: grid.series }, (_, series) => headingAt(grid, series, position));
    // a lone unit is no heading by which a table's direction is told: a unit row has many
    const score = headings.filter((heading) => heading !== "" && !readUnit(heading) && known(meanings(heading).roles)).length;
    if (score > best.score) best = { score, at: position, headings };
  }
  const headings = best.at >= 0 ? best.headings : leadingTexts(grid);
  const lastHeading = best.at >= 0 ? best.at : leadingPositions(grid) - 1;
  const unitAt = isUnitPosition(grid, lastHeading + 1) ? lastHeading + 1 : -1;
  const read = headings.map((heading) => heading === "" ? { roles: [], unit: undefined } : meanings(heading));
  const unitOf = read.map(({ unit }, series) => {
    const below = unitAt >= 0 ? readUnit(textAt(grid, series, unitAt)) : undefined;
    return unit ? { read: unit, from: "heading" as const } : below ? { read: below, from: "unit row" as const } : undefined;
  });
  return {
    headingAt: lastHeading, unitAt, headings, unitOf,
    meanings: read.map(({ roles }, series) => fittingUnit(roles, headings[series]!, unitOf[series]?.read)),
    bodyFrom: (unitAt >= 0 ? unitAt : lastHeading) + 1,
    score: best.score,
  };
}

/** A heading may be broken over two rows: "Dry" above "density". The two together are taken where only together they say something. */
function headingAt(grid: Grid, series: number, position: number): string {
  const own = textAt(grid, series, position);
  if (own === "") return "";
  if (position === 0 || meanings(own).roles.length === 1) return own;
  const above = textAt(grid, series, position - 1);
  const joined = `${above} ${own}`;
  return above !== "" && meanings(above).roles.length !== 1 && meanings(joined).roles.length === 1 ? joined : own;
}

/** A unit row narrows what a short heading can mean, as a unit in the heading itself does. */
const fittingUnit = (roles: readonly Role[], heading: string, unit: UnitRead | undefined): readonly Role[] =>
  roles.length > 1 && unit ? meanings(`${heading} (${unit.id})`).roles : roles;

function isUnitPosition(grid: Grid, position: number): boolean {
  if (position >= grid.positions) return false;
  let units = 0;
  for (let series = 0; series < grid.series; series++) {
    if (numberAt(grid, series, position) !== undefined) return false;
    if (readUnit(textAt(grid, series, position))) units++;
  }
  return units > 0;
}

/** Positions before the first number: headings that say nothing known, or none. */
function leadingPositions(grid: Grid): number {
  for (let position = 0; position < grid.positions; position++)
    for (let series = 0; series < grid.series; series++)
      if (numberAt(grid, series, position) !== undefined) return isUnitPosition(grid, position - 1) ? position - 1 : position;
  return 0;
}

function leadingTexts(grid: Grid): string[] {
  const last = leadingPositions(grid) - 1;
  return Array.from({ length: grid.series }, (_, series) => last >= 0 ? textAt(grid, series, last) : "");
}

/** Two blank positions end a table; one is only a gap. */
const GAP_THAT_ENDS = 2;

/** The positions that hold readings in any of the series asked for, up to a line that sums up or a wide gap. */
export function bodyPositions(grid: Grid, from: number, wanted: readonly number[]): number[] {
  const positions: number[] = [];
  let blanks = 0;
  for (let position = from; position < grid.positions; position++) {
    if (isSummary(grid, position)) break;
    if (wanted.every((series) => blankAt(grid, series, position))) {
      if (++blanks >= GAP_THAT_ENDS && positions.length > 0) break;
      continue;
    }
    blanks = 0;
    // a line of texts only is a note or a second heading, not a reading
    if (wanted.some((series) => numberAt(grid, series, position) !== undefined || looksTyped(textAt(grid, series, position)))) positions.push(position);
  }
  return positions;
}

/** A text that was meant as a number: it has a digit and starts like one. */
const looksTyped = (text: string): boolean => /^[-+]?[\d.,]+\s*%?$/.test(text) && /\d/.test(text);

function isSummary(grid: Grid, position: number): boolean {
  for (let series = 0; series < grid.series; series++) {
    if (blankAt(grid, series, position)) continue;
    return SUMMARY.test(textAt(grid, series, position));
  }
  return false;
}
