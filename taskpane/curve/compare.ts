import { compareEfforts, type Efforts } from "../../src/compaction/efforts";
import { familyFrom, type Family } from "../../src/compaction/family";
import type { Fit } from "../../src/compaction/fit";
import type { Area } from "../../src/workbook/port";
import { areaName } from "../../src/workbook/address";
import { typedNumber, type Beside, type Look } from "./model";

/** A test that the user keeps beside whatever is selected next. It travels in the workbook, by sheet and range. */
export interface KeptTest { readonly area: Area; readonly name: string }

/** What the workbook remembers of a comparison: the kept tests, and the compactive effort of each test by its name. */
export interface Comparing { readonly kept: readonly KeptTest[]; readonly efforts: Readonly<Record<string, string>> }

export const noComparing: Comparing = { kept: [], efforts: {} };
const MOST = 24, LONGEST = 60;

export const writeComparing = (comparing: Comparing): string => JSON.stringify({ version: 1, ...comparing });

/** Reads what was remembered. A workbook may come from anyone: what is not understood is left out. */
export function readComparing(text: string | null): Comparing {
  try {
    const read = JSON.parse(text ?? "null") as { kept?: unknown; efforts?: unknown } | null;
    const whole = (value: unknown): value is number => Number.isInteger(value) && (value as number) >= 0 && (value as number) < 2 ** 21;
    const kept = (Array.isArray(read?.kept) ? read.kept as { name?: unknown; area?: Partial<Area> }[] : []).flatMap(({ name, area }): KeptTest[] =>
      typeof name === "string" && name.length <= LONGEST && typeof area?.sheet === "string" && whole(area.row) && whole(area.column) && whole(area.rows) && whole(area.columns)
        ? [{ name, area: { sheet: area.sheet, row: area.row, column: area.column, rows: area.rows, columns: area.columns } }] : []).slice(0, MOST);
    const efforts = Object.entries(typeof read?.efforts === "object" && read.efforts !== null ? read.efforts as Record<string, unknown> : {})
      .filter((entry): entry is [string, string] => entry[0] !== "__proto__" && entry[0].length <= LONGEST && typeof entry[1] === "string" && entry[1].length <= 20).slice(0, MOST);
    return { kept, efforts: Object.fromEntries(efforts) };
  } catch { return noComparing; }
}

export interface ComparedTest extends Beside {
  readonly is: "own" | "in the selection" | "kept";
  readonly effort: string;
}

export interface Comparison {
  readonly tests: readonly ComparedTest[];
  /** the test that is shown is among the kept ones */
  readonly ownKept: boolean;
  readonly efforts: Efforts | null;
  readonly effortTroubles: readonly string[];
  readonly family: Family | null;
  /** tests that are left out of efforts and family, as their densities are in another unit */
  readonly otherUnit: readonly string[];
}

export const nameOfLook = (look: Look): string => (look.shownTest ?? areaName(look.table.body ?? look.table.area)).slice(0, LONGEST);

/** Compactive efforts that a test can have, kJ/m³. */
const EFFORT = { from: 50, to: 10_000 };

/** Everything that several tests say together: how efforts bear on the peak, and the family that they form. */
export function compare(look: Look, kept: readonly (KeptTest & Beside)[], comparing: Comparing): Comparison | null {
  if (!look.fit && look.others.length === 0 && kept.length === 0) return null;
  const own = nameOfLook(look), ownArea = look.table.area;
  const same = (area: Area): boolean => areaName(area) === areaName(ownArea);
  const named = (one: Beside, is: ComparedTest["is"]): ComparedTest => ({ name: one.name, fit: one.fit, says: one.says, unit: one.unit, is, effort: comparing.efforts[one.name] ?? "" });
  const tests: ComparedTest[] = [
    named({ name: own, fit: look.fit, says: look.noFit?.says ?? "It is not read yet.", unit: look.unit?.id ?? null }, "own"),
    ...look.others.map((one) => named(one, "in the selection")),
    ...kept.filter(({ area }) => !same(area)).map((one) => named(one, "kept")),
  ];
  const unit = tests.find(({ fit }) => fit !== null)?.unit ?? null;
  const fitted = tests.filter((one): one is ComparedTest & { fit: Fit } => one.fit !== null && one.unit === unit);
  const effortTroubles: string[] = [];
  const withEffort = fitted.flatMap(({ name, fit, effort }) => {
    if (effort.trim() === "") return [];
    const value = typedNumber(effort);
    if (value !== undefined && value >= EFFORT.from && value <= EFFORT.to) return [{ id: name, effort: value, fit }];
    effortTroubles.push(`The effort "${effort.trim()}" of ${name} is not a number between ${EFFORT.from} and ${EFFORT.to} kJ/m³; standard compaction is near 595, modified near 2700.`);
    return [];
  });
  return {
    tests, effortTroubles, ownKept: kept.some(({ area }) => same(area)),
    efforts: withEffort.length >= 2 ? compareEfforts(withEffort) : null,
    family: fitted.length >= 2 ? familyFrom(fitted.map(({ name, fit }) => ({ id: name, fit }))) : null,
    otherUnit: tests.filter(({ fit, unit: theirs }) => fit !== null && theirs !== unit).map(({ name }) => name),
  };
}
