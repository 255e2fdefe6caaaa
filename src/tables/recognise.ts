import { densityUnits, type DensityUnit, unitItLooksLike } from "../units/density-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import type { Area, Snapshot } from "../workbook/port";
import { settle, type Readings } from "./arithmetic";
import { findGivenOnce, findSpecificGravity, findUnitInTitles } from "./given-once";
import { blankAt, gridOf, isPercentFormat, numberAt, type Grid } from "./grid";
import { KIND, FIELD_ONLY } from "./headings";
import { bodyPositions, layoutOf, type Layout } from "./layout";
import { settleMouldUnits, type MouldUnits } from "./mould-units";
import { groupPoints, neededRoles, readPoints, type Reading } from "./points";
import { nameOf, ROLE_NAMES } from "./readings";
import type { Corrections, GivenOnce, Known, Problem, Role, Series, Table } from "./table";

type Draft = { -readonly [K in keyof Series]: Series[K] };

const READ_ROLES: ReadonlySet<Role> = new Set(["waterContent", "dryDensity", "wetDensity", "mouldAndSoil", "mouldMass", "wetSoil", "mouldVolume", "wetAndTin", "dryAndTin", "tare"]);

/**
 * Reads a selection as one laboratory compaction test: which row or column is what, in which unit, and which cells
 * make its points. What headings leave open is settled by units and by the sheet's own arithmetic, and otherwise
 * left open for the user; every reading that cannot be used is named with what to change. Nothing is computed from a guess.
 * `around` are the cells about the selection: a specific gravity that stands there alone is found too.
 */
export function recogniseTable(snapshot: Snapshot, corrections: Corrections = {}, around: Snapshot | null = null): Table {
  const orientation = corrections.orientation ?? likelyOrientation(snapshot);
  const grid = gridOf(snapshot, orientation);
  const layout = layoutOf(grid);
  const notes: string[] = [], problems: Problem[] = [];
  const series = draftSeries(grid, layout, corrections);

  const wanted = series.filter(({ role }) => READ_ROLES.has(role) || role === "open").map(({ index }) => index);
  const everything = layout.headingAt < 0 || layout.score === 0 ? series.map(({ index }) => index) : wanted;
  const first = bodyPositions(grid, layout.bodyFrom, everything.length > 0 ? everything : series.map(({ index }) => index));
  settleRoles(grid, layout, first, series, notes);
  const ofField = series.find(({ heading }) => FIELD_ONLY.test(heading));
  if (ofField && Object.keys(corrections.roles ?? {}).length === 0)
    problems.push({ cell: null, says: `"${ofField.heading}" says that these are field tests, through which no compaction curve runs. Select a laboratory test; or, if this is one, choose the meaning of its ${orientation === "down" ? "columns" : "rows"}.` });

  const named = series.filter(({ role }) => READ_ROLES.has(role)).map(({ index }) => index);
  const positions = named.length > 0 ? bodyPositions(grid, layout.bodyFrom, named) : first;
  keepOneOfEach(grid, positions, series, notes);
  settlePercents(grid, positions, series, notes);

  // a mould's mass or volume that stands once, in its column or beside a label above the readings
  const isBefore = (row: number, column: number): boolean => orientation === "down"
    ? row < snapshot.area.row + layout.bodyFrom : !series.some(({ index, role }) => READ_ROLES.has(role) && grid.place(index, 0).row === row) || column < snapshot.area.column;
  const once = (role: "mouldMass" | "mouldVolume"): GivenOnce | null => {
    const own = series.find((one) => one.role === role);
    const filled = own ? positions.filter((position) => numberAt(grid, own.index, position) !== undefined) : [];
    if (own && filled.length === 1 && positions.length > 1) return { value: numberAt(grid, own.index, filled[0]!)!, cell: grid.place(own.index, filled[0]!) };
    return own && filled.length > 0 ? null : findGivenOnce(snapshot, role, isBefore);
  };
  const mouldMass = once("mouldMass"), mouldVolume = once("mouldVolume");

  const columns = (role: Role): Draft[] => series.filter((one) => one.role === role);
  // a column that has its heading but no figure yet gives way to the readings that it would be computed from
  const holds = (role: Role): boolean => columns(role).some(({ index }) => positions.some((position) => !blankAt(grid, index, position)));
  const hasTins = columns("wetAndTin").length > 0 && columns("dryAndTin").length > 0;
  const water = columns("waterContent").length > 0 && (holds("waterContent") || !hasTins) ? "column" : hasTins ? "tins" : null;
  const hasMould = (columns("wetSoil").length > 0 || (columns("mouldAndSoil").length > 0 && (columns("mouldMass").length > 0 || mouldMass !== null)))
    && (columns("mouldVolume").length > 0 || mouldVolume !== null);
  const dry = holds("dryDensity") ? "column" : holds("wetDensity") ? "wet density" : hasMould ? "mould" : columns("dryDensity").length > 0 ? "column" : columns("wetDensity").length > 0 ? "wet density" : null;

  if (positions.length > 0) sayWhatIsMissing(series, water, dry, mouldMass, mouldVolume, problems);
  if (water === "tins" && columns("tare").length === 0)
    problems.push({ cell: null, says: "No column holds the mass of the empty tins, so the masses of wet and dry soil cannot be told: choose the column that does." });

  let densityUnit: DensityUnit | null = null, densityUnitKnown: Known = "not known", mouldUnits: MouldUnits | null = null;
  if (dry === "column" || dry === "wet density") {
    const source = columns(dry === "column" ? "dryDensity" : "wetDensity")[0]!;
    ({ densityUnit, densityUnitKnown } = settleDensityUnit(snapshot, grid, positions, source, notes, problems));
  } else if (dry === "mould") {
    const labelUnit = (role: "mouldMass" | "mouldVolume"): string | undefined => findGivenOnce(snapshot, role, isBefore)?.unit?.id;
    const settled = settleMouldUnits(grid, positions, series, mouldMass, mouldVolume, { mass: labelUnit("mouldMass"), volume: labelUnit("mouldVolume") }, notes, problems);
    if (settled) ({ densityUnit, densityUnitKnown, units: mouldUnits } = settled);
  }

  for (const one of series) one.range = rangeOf(grid, one.index, positions);
  const canRead = water !== null && dry !== null && densityUnit !== null && !(water === "tins" && columns("tare").length === 0);
  const reading: Reading = { grid, positions, series, waterFrom: water, dryFrom: dry, densityUnit, mouldMass, mouldVolume, mouldUnits };
  const points = canRead ? readPoints(reading, problems) : [];
  return {
    area: snapshot.area, orientation, series, points,
    densityUnit: densityUnit?.id ?? null, densityUnitKnown, waterFrom: water, dryFrom: dry,
    specificGravity: findSpecificGravity(snapshot) ?? (around && findSpecificGravity(around)), mouldMass, mouldVolume, mouldUnits: mouldUnits && { mass: mouldUnits.mass.id, volume: mouldUnits.volume.id }, problems, notes,
    groups: canRead ? groupPoints(reading).map(({ at, moreTins }) => [at, ...moreTins]) : [],
    body: bodyArea(snapshot.area, grid, series, positions, neededRoles(reading)),
  };
}

/** The way in which more headings say something known; without headings, the longer side runs along the points. */
function likelyOrientation(snapshot: Snapshot): "down" | "across" {
  const down = layoutOf(gridOf(snapshot, "down")).score, across = layoutOf(gridOf(snapshot, "across")).score;
  if (down !== across) return down > across ? "down" : "across";
  return snapshot.area.rows >= snapshot.area.columns ? "down" : "across";
}

function draftSeries(grid: Grid, layout: Layout, { roles, units }: Corrections): Draft[] {
  return Array.from({ length: grid.series }, (_, index): Draft => {
    const meant = layout.meanings[index] ?? [], unit = layout.unitOf[index];
    const chosenRole = roles?.[index], chosenUnit = units?.[index];
    const role: Role = chosenRole ?? (meant.length === 1 ? meant[0]! : meant.length > 1 ? "open" : "other");
    const fits = unit !== undefined && (KIND[role] === null || KIND[role] === unit.read.kind);
    return {
      index, heading: layout.headings[index] ?? "", role,
      roleKnown: chosenRole ? "chosen" : meant.length === 1 ? "heading" : "not known",
      candidates: meant.length > 1 ? meant : [],
      unit: chosenUnit ?? (fits ? unit.read.id : null),
      unitKnown: chosenUnit ? "chosen" : fits ? unit.from : "not known",
      range: null,
    };
  });
}

const readingsOf = (grid: Grid, positions: readonly number[], index: number): Readings => positions.map((position) => numberAt(grid, index, position));

function settleRoles(grid: Grid, layout: Layout, positions: readonly number[], series: Draft[], notes: string[]): void {
  const certain = new Map<Role, Readings>();
  for (const { role, index } of series) if (READ_ROLES.has(role) && !certain.has(role)) certain.set(role, readingsOf(grid, positions, index));

  const filled = (index: number): boolean => positions.filter((position) => numberAt(grid, index, position) !== undefined).length * 2 > positions.length;
  const headless = layout.score === 0;
  const open = series.filter(({ role, roleKnown, heading, index }) => role === "open" || (headless && roleKnown !== "chosen" && heading === "" && filled(index)));
  if (headless) {
    const counting = open.find(({ index }) => open.length > 2 && isCount(readingsOf(grid, positions, index)));
    if (counting) { Object.assign(counting, { role: "pointName", roleKnown: "shape" }); open.splice(open.indexOf(counting), 1); }
    for (const one of open) { one.role = "open"; one.candidates = ["waterContent", "dryDensity", "wetDensity"]; }
  }
  const settled = settle(certain, open.map(({ candidates, index }) => ({ candidates: [...candidates, ...(headless && open.length > 3 ? ["other" as const] : [])], readings: readingsOf(grid, positions, index) })));
  for (const [place, role] of settled) {
    const one = open[place]!;
    Object.assign(one, { role, roleKnown: "arithmetic" });
    notes.push(`${label(grid, one)} is taken as ${ROLE_NAMES[role]}: so the figures of the table agree with each other.`);
  }
  const left = open.filter(({ role }) => role === "open");
  if (headless && settled.size === 0) settleTwoBare(grid, positions, series, left, notes);
}

/** 1, 2, 3 …: a count of the points, not a reading. */
const isCount = (readings: Readings): boolean => readings.every((value, i) => value === i + 1);

/** A selection of bare numbers: water content tells itself from density by size, or by rising steadily where the density rises and falls. */
function settleTwoBare(grid: Grid, positions: readonly number[], series: readonly Draft[], open: readonly Draft[], notes: string[]): void {
  const chosen = (role: Role): boolean => series.some((one) => one.role === role && one.roleKnown === "chosen");
  if (open.length === 1 && (chosen("waterContent") !== (chosen("dryDensity") || chosen("wetDensity")))) {
    const role: Role = chosen("waterContent") ? "dryDensity" : "waterContent";
    Object.assign(open[0]!, { role, roleKnown: "shape" });
    return;
  }
  if (open.length !== 2) return;
  const numbers = open.map(({ index }) => readingsOf(grid, positions, index).filter((value) => value !== undefined));
  if (numbers.some((one) => one.length < 2)) return;
  const water = waterBySize(numbers) ?? waterByShape(numbers);
  if (water === undefined) return;
  const how: Known = waterBySize(numbers) === undefined ? "shape" : "size";
  Object.assign(open[water]!, { role: "waterContent", roleKnown: how });
  Object.assign(open[1 - water]!, { role: "dryDensity", roleKnown: how });
  notes.push(`No headings: ${label(grid, open[water]!)} is taken as water content and ${label(grid, open[1 - water]!)} as dry density, from their ${how === "size" ? "size" : "shape: the one rises steadily, the other rises and falls"}.`);
}

const looksLikeDensity = (values: readonly number[]): boolean => {
  const units = values.map((value) => unitItLooksLike(value, WATER_KG_M3_AT_20));
  return units[0] !== undefined && units.every((unit) => unit === units[0]);
};

/** Above this a compacted soil holds no water, so that the number is a density. Common practice, no published source. */
const WETTEST = 80;

function waterBySize([a, b]: readonly number[][]): 0 | 1 | undefined {
  // 0.4 to 3.5 could be a density in Mg/m3 only; a water content so low throughout is no compaction test
  const onlyDensity = (values: readonly number[]): boolean => looksLikeDensity(values) && (values.every((value) => value >= 0.4 && value <= 3.5) || values.every((value) => value > WETTEST));
  const first = onlyDensity(a!), second = onlyDensity(b!);
  if (first === second) return undefined;
  return first ? 1 : 0;
}

function waterByShape([a, b]: readonly number[][]): 0 | 1 | undefined {
  const steady = (values: readonly number[]): boolean => values.every((value, i) => i === 0 || value > values[i - 1]!);
  const first = steady(a!), second = steady(b!);
  if (first === second) return undefined;
  const density = first ? b! : a!;
  return looksLikeDensity(density) ? (first ? 0 : 1) : undefined;
}

const label = (grid: Grid, { heading, index }: Series): string => heading !== "" ? `"${heading}"` : lineName(grid, index);

/** "column C" or "row 4". */
function lineName(grid: Grid, index: number): string {
  const place = grid.place(index, 0);
  return grid.orientation === "down" ? `column ${nameOf(place).replace(/\d+$/, "")}` : `row ${place.row + 1}`;
}

const ALONE: readonly Role[] = ["waterContent", "dryDensity", "wetDensity", "mouldAndSoil", "mouldMass", "wetSoil", "mouldVolume"];

/** Where two columns claim one meaning, a mean wins over its parts, else the first with readings; the choice is said. */
function keepOneOfEach(grid: Grid, positions: readonly number[], series: readonly Draft[], notes: string[]): void {
  const count = (one: Draft): number => positions.filter((position) => numberAt(grid, one.index, position) !== undefined).length;
  for (const role of ALONE) {
    const all = series.filter((one) => one.role === role);
    if (all.length < 2) continue;
    const keep = all.find(({ roleKnown }) => roleKnown === "chosen") ?? all.find(({ heading }) => /\b(?:mean|average|avg)\b/i.test(heading)) ?? all.find((one) => count(one) > 0) ?? all[0]!;
    for (const one of all) if (one !== keep && one.roleKnown !== "chosen") { one.role = "other"; }
    if (all.filter(({ role: now }) => now === role).length === 1 && all.some((one) => one !== keep && count(one) > 0))
      notes.push(`More than one ${grid.orientation === "down" ? "column" : "row"} says ${ROLE_NAMES[role]}: ${label(grid, keep)} (${lineName(grid, keep.index)}) is used.`);
  }
}

/** Cells formatted as % hold fractions; they are converted, and that is said. */
function settlePercents(grid: Grid, positions: readonly number[], series: readonly Draft[], notes: string[]): void {
  for (const one of series) {
    if (one.role !== "waterContent") continue;
    const filled = positions.filter((position) => numberAt(grid, one.index, position) !== undefined);
    const percents = filled.filter((position) => isPercentFormat(grid.format(one.index, position)));
    if (one.unitKnown !== "chosen" && filled.length > 0 && percents.length === filled.length) {
      Object.assign(one, { unit: "fraction", unitKnown: "number format" });
      notes.push(`The cells of ${label(grid, one)} are formatted as %, so they hold fractions: they are multiplied by 100.`);
    } else if (one.unit === null) Object.assign(one, { unit: "%", unitKnown: "size" });
  }
}

function settleDensityUnit(
  snapshot: Snapshot, grid: Grid, positions: readonly number[], source: Draft, notes: string[], problems: Problem[],
): { densityUnit: DensityUnit | null; densityUnitKnown: Known } {
  const byId = (id: string | null): DensityUnit | undefined => densityUnits.find((unit) => unit.id === id);
  const own = byId(source.unit);
  if (own) return { densityUnit: own, densityUnitKnown: source.unitKnown };
  const found = (unit: DensityUnit, known: Known): { densityUnit: DensityUnit; densityUnitKnown: Known } => {
    Object.assign(source, { unit: unit.id, unitKnown: known });
    return { densityUnit: unit, densityUnitKnown: known };
  };
  const once = findUnitInTitles(snapshot);
  if (once) return found(once, "given once");
  const numbers = positions.map((position) => numberAt(grid, source.index, position)).filter((value) => value !== undefined);
  if (numbers.length === 0) return { densityUnit: null, densityUnitKnown: "not known" };
  const units = numbers.map((value) => unitItLooksLike(value, WATER_KG_M3_AT_20));
  if (units[0] && units.every((unit) => unit === units[0])) {
    notes.push(`No unit is given for ${label(grid, source)}: taken as ${units[0].printed} from the size of its numbers.`);
    return found(units[0], "size");
  }
  problems.push({ cell: null, says: `The numbers of ${label(grid, source)} (${numbers.slice(0, 3).join(", ")}…) fit no one unit of density: choose its unit, or its meaning.` });
  return { densityUnit: null, densityUnitKnown: "not known" };
}

function sayWhatIsMissing(
  series: readonly Series[], water: Table["waterFrom"], dry: Table["dryFrom"], mouldMass: GivenOnce | null, mouldVolume: GivenOnce | null, problems: Problem[],
): void {
  const has = (role: Role): boolean => series.some((one) => one.role === role);
  const doubtful = series.filter(({ role }) => role === "open").map(({ heading, candidates }) => heading === "" ? null : `"${heading}" may be ${candidates.map((role) => ROLE_NAMES[role]).join(" or ")}`).filter((text) => text !== null);
  const hint = doubtful.length > 0 ? ` (${doubtful.join("; ")})` : "";
  if (water === null) problems.push({
    cell: null,
    says: has("wetAndTin") !== has("dryAndTin")
      ? `Water content needs the masses of both wet and dry soil with their tin; only ${has("wetAndTin") ? "the wet" : "the dry"} one was found: choose the other.`
      : `No ${has("trialWater") ? "measured " : ""}water content was found: choose which column or row holds it${hint}.${has("trialWater") ? " A trial or added water is not taken for a measured one." : ""}`,
  });
  if (dry !== null) return;
  const raw = has("mouldAndSoil") || has("wetSoil");
  problems.push({
    cell: null,
    says: raw
      ? `Dry density needs the ${has("mouldAndSoil") && !has("mouldMass") && mouldMass === null ? "mass of the empty mould" : "volume of the mould"}: ${has("mouldVolume") || mouldVolume !== null || has("mouldMass") ? "choose which column or row holds it" : "choose which column or row holds it, or take the cell that gives it into the selection"}.`
      : `No dry density was found, nor readings that give it: choose which column or row holds it${hint}.`,
  });
}

function rangeOf(grid: Grid, index: number, positions: readonly number[]): Omit<Area, "sheet"> | null {
  if (positions.length === 0) return null;
  const first = grid.place(index, positions[0]!), last = grid.place(index, positions.at(-1)!);
  return { row: first.row, column: first.column, rows: last.row - first.row + 1, columns: last.column - first.column + 1 };
}

/** From the first reading that the points rest on to the last; before both water and density are known, all readings. */
function bodyArea(area: Area, grid: Grid, series: readonly Series[], positions: readonly number[], { water, dry }: ReturnType<typeof neededRoles>): Area | null {
  const needed: ReadonlySet<Role> = water.length > 0 && dry.length > 0 ? new Set([...water, ...dry]) : READ_ROLES;
  const used = series.filter(({ role }) => needed.has(role));
  if (used.length === 0 || positions.length === 0) return null;
  const corners = [grid.place(used[0]!.index, positions[0]!), grid.place(used.at(-1)!.index, positions.at(-1)!)];
  return { sheet: area.sheet, row: corners[0]!.row, column: corners[0]!.column, rows: corners[1]!.row - corners[0]!.row + 1, columns: corners[1]!.column - corners[0]!.column + 1 };
}
