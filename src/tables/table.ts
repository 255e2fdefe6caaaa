import type { Area } from "../workbook/port";

/** What the readings of one row or column of a laboratory sheet are. `other` is of no use here; `open` is for the user to say. */
export const roles = [
  "waterContent", "dryDensity", "wetDensity", "mouldAndSoil", "mouldMass", "wetSoil", "mouldVolume",
  "wetAndTin", "dryAndTin", "tare", "tinNumber", "trialWater", "pointName", "other", "open",
] as const;
export type Role = (typeof roles)[number];

/** How a meaning or a unit came to be known, the surest last. */
export type Known = "not known" | "size" | "shape" | "arithmetic" | "given once" | "number format" | "unit row" | "heading" | "chosen";

export interface Place { readonly row: number; readonly column: number }

/** One row or column of readings. `index` counts the lines of the selection from 0, across the direction of the points. */
export interface Series {
  readonly index: number;
  readonly heading: string;
  readonly role: Role;
  readonly roleKnown: Known;
  /** meanings that the heading leaves possible, where it leaves more than one */
  readonly candidates: readonly Role[];
  /** id of a density, mass or volume unit, `%` or `fraction`; null where there is none or it is not known */
  readonly unit: string | null;
  readonly unitKnown: Known;
  /** the cells from the first point to the last */
  readonly range: Omit<Area, "sheet"> | null;
}

export interface TablePoint {
  /** percent of dry mass */
  readonly water: number;
  /** in the table's density unit */
  readonly dry: number;
  /** water content of each tin; one where it stands in a column */
  readonly tins: readonly number[];
  readonly waterCells: readonly Place[];
  readonly dryCells: readonly Place[];
}

/** What keeps a reading from being used, and what to change. */
export interface Problem { readonly cell: Place | null; readonly says: string }

export interface GivenOnce { readonly value: number; readonly cell: Place }

/** A selection read as one compaction test. */
export interface Table {
  readonly area: Area;
  readonly orientation: "down" | "across";
  readonly series: readonly Series[];
  readonly points: readonly TablePoint[];
  readonly densityUnit: string | null;
  readonly densityUnitKnown: Known;
  readonly waterFrom: "column" | "tins" | null;
  readonly dryFrom: "column" | "wet density" | "mould" | null;
  /** specific gravity that stands in the selection, and whether its label says it is assumed */
  readonly specificGravity: (GivenOnce & { readonly assumed: boolean }) | null;
  readonly mouldMass: GivenOnce | null;
  readonly mouldVolume: GivenOnce | null;
  /** ids of the units of the mould's readings, where the density comes from them */
  readonly mouldUnits: { readonly mass: string; readonly volume: string } | null;
  /** each point's lines along the points, counted from 0 in the selection: its own, then those that hold a further tin only */
  readonly groups: readonly (readonly number[])[];
  readonly problems: readonly Problem[];
  /** how the table was read, where that is not plain from its headings */
  readonly notes: readonly string[];
  /** the cells of the points' readings, headings left out; null where there are none */
  readonly body: Area | null;
}

/** What the user said instead. Series by index; an orientation where the table was turned the wrong way. */
export interface Corrections {
  readonly orientation?: "down" | "across";
  readonly roles?: Readonly<Record<number, Role>>;
  readonly units?: Readonly<Record<number, string>>;
}
