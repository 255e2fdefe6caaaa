import { quantity } from "../relations/quantities";
import { cellName } from "../workbook/address";
import { CellError, isBlank, quoted, type Cell } from "../worksheet/cell";
import type { Place, Problem, Role } from "./table";

/** What a meaning is called where a person reads it. */
export const ROLE_NAMES: Readonly<Record<Role, string>> = {
  waterContent: "water content", dryDensity: "dry density", wetDensity: "wet density",
  mouldAndSoil: "mould and wet soil", mouldMass: "empty mould", wetSoil: "wet soil in the mould", mouldVolume: "volume of the mould",
  wetAndTin: "wet soil and tin", dryAndTin: "dry soil and tin", tare: "empty tin",
  tinNumber: "tin or mould number", trialWater: "trial or added water (not measured)", pointName: "point number", other: "not used", open: "not known yet",
};

export const nameOf = ({ row, column }: Place): string => cellName(row, column);

const PERCENT_TEXT = /^\s*(\d+(?:\.\d+)?)\s*%\s*$/;

const LIMITS = {
  waterContent: quantity("waterContent"), dryDensity: quantity("dryDensity"), wetDensity: quantity("wetDensity"),
  mouldAndSoil: quantity("mouldAndSoil"), mouldMass: quantity("mouldMass"), wetSoil: quantity("wetMass"), mouldVolume: quantity("mouldVolume"),
  wetAndTin: quantity("wetMass"), dryAndTin: quantity("dryMass"), tare: quantity("tare"),
} as const;

export type ReadingRole = keyof typeof LIMITS;

/** A cell's number as it is used, or what is wrong with it. Water content comes back in percent of dry mass. */
export function readCell(value: Cell, place: Place, role: ReadingRole, asFraction: boolean): number | Problem {
  const cell = nameOf(place);
  const fail = (says: string): Problem => ({ cell: place, says });
  if (value instanceof CellError) return fail(`${cell} holds the error ${value.code}: mend its formula, or clear the point's cells.`);
  if (value === null || isBlank(value)) return fail(`${cell} is blank.`);
  if (typeof value === "boolean") return fail(`${cell} holds ${String(value).toUpperCase()} where the ${ROLE_NAMES[role]} should be: type the reading, or clear the point's cells.`);
  let number: number;
  if (typeof value === "string") {
    const percent = role === "waterContent" ? PERCENT_TEXT.exec(value)?.[1] : undefined;
    if (percent === undefined) return fail(textProblem(cell, value, role));
    number = Number(percent);
  } else number = asFraction ? value * 100 : value;

  const { from, to, above, name } = LIMITS[role];
  if (above ? number <= from : number < from) return fail(`${cell} holds ${value}: ${name} must be ${above ? "above" : "at least"} ${from}. Correct the reading.`);
  if (role === "waterContent" && asFraction && number > FRACTION_TYPED_AS_PERCENT)
    return fail(`${cell} holds ${value} in a column of fractions, which is ${Math.round(number)} %: was a percent typed into a cell formatted as %? Type ${value} % there.`);
  if (number > to) return fail(`${cell} holds ${value}: ${name} cannot be above ${to}. Correct the reading.`);
  return number;
}

/** No soil that is compacted holds so much water; beyond it a percent was taken for a fraction. Common practice, no published source. */
const FRACTION_TYPED_AS_PERCENT = 200;

function textProblem(cell: string, value: string, role: ReadingRole): string {
  const text = `${cell} holds the text ${quoted(value)}`;
  const trimmed = value.trim();
  if (trimmed === "") return `${cell} holds only spaces: clear it, or type the reading.`;
  if (/^-?\d+,\d+\s*%?$/.test(trimmed)) return `${text}, not a number: type it with the decimal sign of this workbook.`;
  if (Number.isFinite(Number(trimmed))) return `${text}, not a number: retype it, or convert the text to a number.`;
  return `${text} where the ${ROLE_NAMES[role]} should be: type the reading, or clear the point's cells.`;
}
