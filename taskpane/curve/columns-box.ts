import { densityUnits } from "../../src/units/density-units";
import { massUnits, volumeUnits } from "../../src/units/mass-and-volume-units";
import { KIND, type UnitKind } from "../../src/tables/headings";
import { ROLE_NAMES } from "../../src/tables/readings";
import { roles, type Known, type Role, type Series, type Table } from "../../src/tables/table";
import { columnName } from "../../src/workbook/address";
import { h } from "../parts/dom";
import type { Choices } from "./choices";
import type { Look } from "./model";

/** Only what does not stand in the heading is said. */
const KNOWN_WORDS: Readonly<Record<Known, string>> = {
  "not known": "", size: "from the size of the numbers", shape: "from the shape of the numbers", arithmetic: "because the figures agree so", "given once": "given once in the sheet",
  "number format": "from the number format", "unit row": "", heading: "", chosen: "as you chose",
};

const UNITS: Readonly<Record<UnitKind, readonly { readonly id: string; readonly printed: string }[]>> = {
  density: densityUnits, mass: massUnits, volume: volumeUnits, percent: [{ id: "%", printed: "%" }, { id: "fraction", printed: "fraction" }],
};

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
const lineOf = (table: Table, { index }: Series): string => table.orientation === "down" ? columnName(table.area.column + index) : String(table.area.row + index + 1);

/** What each column (or row) holds and in which unit, to be corrected. */
export function columnsBox(look: Look, choose: (change: Partial<Choices>) => void): HTMLElement {
  const { table, choices } = look;
  const down = table.orientation === "down";
  const shown = table.series.filter(({ role, heading, range }) => role !== "other" || heading !== "" || range !== null);
  const mustAsk = table.series.some(({ role }) => role === "open") && table.points.length === 0;

  function setRole(index: number, role: Role): void {
    const { [index]: _dropped, ...units } = choices.corrections.units ?? {};
    choose({ corrections: { ...choices.corrections, roles: { ...choices.corrections.roles, [index]: role }, units } });
  }
  const setUnit = (index: number, unit: string): void => choose({ corrections: { ...choices.corrections, units: { ...choices.corrections.units, [index]: unit } } });

  function rowOf(series: Series): HTMLElement {
    const line = lineOf(table, series), id = `line-${series.index}`;
    const kind = KIND[series.role];
    const role = h("select", { id: `${id}-role`, onchange: () => setRole(series.index, role.value as Role) },
      ...ordered(series).map((one) => h("option", { value: one, selected: one === series.role }, capital(ROLE_NAMES[one]))));
    const unit = kind === null ? null : h("select", { id: `${id}-unit`, "aria-label": `Unit of ${down ? "column" : "row"} ${line}`, onchange: () => setUnit(series.index, unit!.value) },
      series.unit === null ? h("option", { value: "", selected: true, disabled: true }, "unit?") : null,
      ...UNITS[kind].map((one) => h("option", { value: one.id, selected: one.id === series.unit }, one.printed)));
    const how = [KNOWN_WORDS[series.roleKnown], kind !== null && series.unitKnown !== series.roleKnown && KNOWN_WORDS[series.unitKnown] ? `unit ${KNOWN_WORDS[series.unitKnown]}` : ""].filter((words) => words !== "").join("; ");
    return h("div", { class: "line", role: "group", "aria-label": `${down ? "Column" : "Row"} ${line}` },
      h("label", { for: `${id}-role` }, h("b", {}, line), series.heading ? ` ${series.heading}` : " no heading"),
      h("div", { class: "line-choices" }, role, unit),
      how ? h("p", { class: "quiet" }, capital(how)) : null);
  }

  const turn = h("select", { id: "orientation", onchange: () => choose({ corrections: { orientation: turn.value as "down" | "across" } }) },
    h("option", { value: "down", selected: down }, "down the rows"), h("option", { value: "across", selected: !down }, "across the columns"));
  return h("details", { id: "columns", open: mustAsk },
    h("summary", {}, down ? "Columns and units" : "Rows and units"),
    h("div", { class: "lines" },
      ...shown.map(rowOf),
      h("div", { class: "line" }, h("label", { for: "orientation" }, "Points run"), turn),
      Object.keys(choices.corrections).length > 0 ? h("div", { class: "buttons" }, h("button", { type: "button", id: "forget", onclick: () => choose({ corrections: {} }) }, "Read it afresh")) : null));
}

/** The meanings that the heading leaves possible stand first. */
function ordered({ candidates, role }: Series): Role[] {
  const rest = roles.filter((one) => !candidates.includes(one) && (one !== "open" || role === "open"));
  return role === "open" ? ["open", ...candidates, ...rest.filter((one) => one !== "open")] : [...candidates, ...rest];
}
