import type { Snapshot } from "../workbook/port";
import { densityUnit, type DensityUnit } from "../units/density-units";
import { ASSUMED, meanings, readUnit, SPECIFIC_GRAVITY, type UnitRead } from "./headings";
import type { GivenOnce, Role, Table } from "./table";

/** A number that stands beside its label rather than in a column of readings. */
interface Labelled { readonly label: string; readonly value: number; readonly row: number; readonly column: number; readonly after: string; readonly lonely: boolean }

/** How many cells to the right of its label a number is looked for: merged and spaced forms leave blanks between. */
const REACH = 4;

function* labelled({ values, area }: Snapshot): Generator<Labelled> {
  for (const [r, row] of values.entries()) for (const [c, cell] of row.entries()) {
    if (typeof cell !== "string" || cell.trim() === "") continue;
    for (let step = 1; step <= REACH; step++) {
      const value = row[c + step];
      if (typeof value === "string" && value.trim() !== "") break;
      if (typeof value !== "number") continue;
      const after = row[c + step + 1];
      yield {
        label: cell.trim(), value, row: area.row + r, column: area.column + c + step,
        after: typeof after === "string" ? after.trim() : "", lonely: typeof after !== "number",
      };
      break;
    }
  }
}

/** The specific gravity that stands under its own label, and whether label or neighbour calls it assumed. Where several stand, none is taken. */
export function findSpecificGravity(snapshot: Snapshot): Table["specificGravity"] {
  const found = [...labelled(snapshot)].filter(({ label, value }) => SPECIFIC_GRAVITY.test(label) && value >= 1 && value <= 6);
  const [only] = found;
  if (only === undefined || found.length > 1) return null;
  const { label, value, row, column, after } = only;
  return { value, cell: { row, column }, assumed: ASSUMED.test(label) || ASSUMED.test(after) };
}

/** A mass or volume of the mould that is given once, with the unit beside it or in its label. */
export function findGivenOnce(snapshot: Snapshot, role: Role & ("mouldMass" | "mouldVolume"), before: (row: number, column: number) => boolean): (GivenOnce & { readonly unit: UnitRead | undefined }) | null {
  for (const { label, value, row, column, after, lonely } of labelled(snapshot)) {
    const read = meanings(label);
    const unit = read.unit ?? readUnit(after);
    const roles = read.roles.length > 1 && unit ? meanings(`${label} (${unit.id})`).roles : read.roles;
    if (lonely && before(row, column) && roles.length === 1 && roles[0] === role) return { value, cell: { row, column }, unit };
  }
  return null;
}

/** A density unit named once for the whole sheet, in a title or a remark: "all densities in kN/m3". Two different ones say nothing. */
export function findUnitInTitles(snapshot: Snapshot): DensityUnit | undefined {
  const found = new Set<DensityUnit>();
  for (const row of snapshot.values) for (const cell of row) {
    if (typeof cell !== "string") continue;
    for (const word of cell.split(/[\s,;:()[\]]+/)) {
      const unit = densityUnit(word);
      if (unit) found.add(unit);
    }
  }
  return found.size === 1 ? [...found][0] : undefined;
}
