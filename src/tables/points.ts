import { dryDensityFromWet } from "../phase/density";
import { waterContentFromMasses } from "../phase/water-content";
import { couldBeSoil, unitItLooksLike, type DensityUnit } from "../units/density-units";
import { massUnits, volumeUnits } from "../units/mass-and-volume-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import { looksLikeFractions } from "../worksheet/readers";
import { wetDensityKgM3 } from "./arithmetic";
import { blankAt, isPercentFormat, type Grid } from "./grid";
import type { MouldUnits } from "./mould-units";
import { nameOf, readCell, ROLE_NAMES, type ReadingRole } from "./readings";
import type { GivenOnce, Place, Problem, Role, Series, Table, TablePoint } from "./table";

export interface Reading {
  readonly grid: Grid;
  readonly positions: readonly number[];
  readonly series: readonly Series[];
  readonly waterFrom: Table["waterFrom"];
  readonly dryFrom: Table["dryFrom"];
  readonly densityUnit: DensityUnit | null;
  readonly mouldMass: GivenOnce | null;
  readonly mouldVolume: GivenOnce | null;
  /** units of the mould's readings, where the density comes from them */
  readonly mouldUnits: MouldUnits | null;
}

/** A number with the cell it came from. */
interface Had { readonly value: number; readonly cell: Place }

/** The positions of one point: its own, and those below it that hold only a further tin. */
export interface PointPlaces { readonly at: number; readonly moreTins: readonly number[] }

/** The roles whose cells every point needs, for the way in which water and density are read. */
export function neededRoles({ waterFrom, dryFrom, mouldMass, mouldVolume, series }: Pick<Reading, "waterFrom" | "dryFrom" | "mouldMass" | "mouldVolume" | "series">): { water: ReadingRole[]; dry: ReadingRole[] } {
  const has = (role: Role): boolean => series.some((one) => one.role === role);
  const mould: ReadingRole[] = [has("mouldAndSoil") ? "mouldAndSoil" : "wetSoil"];
  if (has("mouldAndSoil") && !mouldMass) mould.push("mouldMass");
  if (!mouldVolume) mould.push("mouldVolume");
  return {
    water: waterFrom === "column" ? ["waterContent"] : waterFrom === "tins" ? ["wetAndTin", "dryAndTin", "tare"] : [],
    dry: dryFrom === "column" ? ["dryDensity"] : dryFrom === "wet density" ? ["wetDensity"] : dryFrom === "mould" ? mould : [],
  };
}

/** Positions grouped into points. A position with a tin's masses and nothing of the density belongs to the point before it. */
export function groupPoints(reading: Reading): PointPlaces[] {
  const { grid, series, positions } = reading;
  const { water, dry } = neededRoles(reading);
  const filled = (roles: readonly Role[], position: number): boolean => series.some((one) => roles.includes(one.role) && !blankAt(grid, one.index, position));
  const groups: { at: number; moreTins: number[] }[] = [];
  for (const position of positions) {
    const last = groups.at(-1);
    if (reading.waterFrom === "tins" && last && !filled(dry, position) && filled(water, position) && filled(dry, last.at)) last.moreTins.push(position);
    else if (filled([...dry, ...water], position)) groups.push({ at: position, moreTins: [] });
  }
  return groups;
}

/** The points whose every reading can be used; the others are named in `problems`. */
export function readPoints(reading: Reading, problems: Problem[]): TablePoint[] {
  const fractionTrouble = fractionsWithoutFormat(reading);
  if (fractionTrouble) { problems.push(fractionTrouble); return []; }
  const points: TablePoint[] = [];
  const groups = groupPoints(reading);
  for (const [i, group] of groups.entries()) {
    const found: Problem[] = [];
    const point = readPoint(reading, group, found);
    problems.push(...found);
    if (!point) continue;
    const lines = [group.at, ...reading.positions.filter((position) => position > group.at && position < (groups[i + 1]?.at ?? Infinity))];
    points.push(reading.waterFrom === "column" ? { ...point, tins: tinsBeside(reading, lines) ?? point.tins } : point);
  }
  return points;
}

/** Water contents of the tins that stand beside a water content typed or computed by the sheet; null where there are not two whole ones. */
function tinsBeside({ grid, series }: Reading, lines: readonly number[]): number[] | null {
  const [wet, dry, tare] = (["wetAndTin", "dryAndTin", "tare"] as const).map((role) => series.filter((one) => one.role === role)) as [Series[], Series[], Series[]];
  const waters = lines.flatMap((line) => wet.flatMap((_, i) => {
    const [wetMass, dryMass, tin] = [wet[i], dry[i], tare[i]].map((one) => one && grid.value(one.index, line));
    return typeof wetMass === "number" && typeof dryMass === "number" && typeof tin === "number" && wetMass >= dryMass && dryMass > tin ? [waterContentFromMasses.value({ wetMass, dryMass, tare: tin })] : [];
  }));
  return waters.length >= 2 ? waters : null;
}

/** Water contents that all lie below 1 in cells not formatted as %: percents or fractions, only the user can say. */
function fractionsWithoutFormat({ grid, positions, series, waterFrom }: Reading): Problem | null {
  const water = series.find(({ role }) => role === "waterContent");
  if (waterFrom !== "column" || !water || water.unit === "fraction" || water.unitKnown === "chosen") return null;
  if (!looksLikeFractions(positions.map((position) => [grid.value(water.index, position)]))) return null;
  return {
    cell: grid.place(water.index, positions[0]!),
    says: `Every water content lies below 1 (${nameOf(grid.place(water.index, positions[0]!))} holds ${String(grid.value(water.index, positions[0]!))}): choose "fraction" as its unit if 0.125 means 12.5 %, or type percents.`,
  };
}

function readPoint(reading: Reading, { at, moreTins }: PointPlaces, problems: Problem[]): TablePoint | null {
  const { grid, series, densityUnit } = reading;
  const needs = neededRoles(reading);
  const cellsOf = (role: Role, position: number): { index: number; asFraction: boolean }[] =>
    series.filter((one) => one.role === role).map(({ index, unit }) => ({ index, asFraction: unit === "fraction" })).filter(({ index }, i) => i === 0 || !blankAt(grid, index, position));

  function had(role: ReadingRole, position: number): Had[] | null {
    const out: Had[] = [];
    let whole = true;
    for (const { index, asFraction } of cellsOf(role, position)) {
      const cell = grid.place(index, position);
      if (blankAt(grid, index, position)) { problems.push(blankBeside(reading, role, cell, at)); whole = false; continue; }
      if (role === "waterContent" && !asFraction && isPercentFormat(grid.format(index, position)) && typeof grid.value(index, position) === "number") {
        problems.push({ cell, says: `${nameOf(cell)} is formatted as % and so holds the fraction ${String(grid.value(index, position))}, while other water contents are percents: give all of them one format.` });
        whole = false;
        continue;
      }
      const read = readCell(grid.value(index, position), cell, role, asFraction);
      if (typeof read === "number") out.push({ value: read, cell });
      else { problems.push(read); whole = false; }
    }
    return whole ? out : null;
  }

  let whole = true;
  const byRole = new Map<ReadingRole, Had[]>();
  for (const role of [...needs.water, ...needs.dry]) {
    const places = needs.water.includes(role) && role !== "waterContent" ? [at, ...moreTins] : [at];
    const all = places.map((position) => had(role, position));
    if (all.includes(null)) whole = false;
    byRole.set(role, all.flatMap((some) => some ?? []));
  }
  if (!whole) return null;
  const get = (role: ReadingRole): Had[] => byRole.get(role) ?? [];

  const tins = reading.waterFrom === "tins" ? watersOfTins(get("wetAndTin"), get("dryAndTin"), get("tare"), problems) : [get("waterContent")[0]!.value];
  if (tins === null) return null;
  const water = tins.reduce((sum, one) => sum + one, 0) / tins.length;
  const dryCells = needs.dry.flatMap((role) => get(role).map(({ cell }) => cell));
  const dry = dryDensityOf(reading, get, water);
  if (!couldBeSoil(dry, densityUnit!, WATER_KG_M3_AT_20)) {
    const really = unitItLooksLike(dry, WATER_KG_M3_AT_20);
    const cell = dryCells[0]!;
    problems.push({
      cell,
      says: reading.dryFrom === "column"
        ? `${nameOf(cell)} holds ${dry}, which cannot be a soil's dry density in ${densityUnit!.printed}${really && really !== densityUnit ? `; it looks like ${really.printed}` : ""}: correct the reading, or choose the unit.`
        : `The readings of ${dryCells.map(nameOf).join(", ")} give a dry density of ${Number(dry.toPrecision(4))} ${densityUnit!.printed}, which cannot be a soil's: correct them.`,
    });
    return null;
  }
  return { water, dry, tins, waterCells: needs.water.flatMap((role) => get(role).map(({ cell }) => cell)), dryCells };
}

function dryDensityOf({ dryFrom, series, densityUnit, mouldMass, mouldVolume, mouldUnits }: Reading, get: (role: ReadingRole) => Had[], water: number): number {
  if (dryFrom === "column") return get("dryDensity")[0]!.value;
  if (dryFrom === "wet density") return dryDensityFromWet.value({ wetDensity: get("wetDensity")[0]!.value, waterContent: water });
  const unitOf = (role: Role): string | null => series.find((one) => one.role === role)?.unit ?? null;
  const kg = (role: Role): number => (massUnits.find(({ id }) => id === unitOf(role)) ?? mouldUnits!.mass).kg;
  const gross = get("mouldAndSoil")[0], net = get("wetSoil")[0];
  const mould = gross ? (get("mouldMass")[0]?.value ?? mouldMass!.value) * kg("mouldMass") : 0;
  const m3 = (get("mouldVolume")[0]?.value ?? mouldVolume!.value) * (volumeUnits.find(({ id }) => id === unitOf("mouldVolume")) ?? mouldUnits!.volume).m3;
  const wet = wetDensityKgM3(gross ? gross.value * kg("mouldAndSoil") : net!.value * kg("wetSoil"), mould, m3);
  return dryDensityFromWet.value({ wetDensity: wet / densityUnit!.kgM3, waterContent: water });
}

/** The water content of each tin of one point. */
function watersOfTins(wets: readonly Had[], dries: readonly Had[], tares: readonly Had[], problems: Problem[]): number[] | null {
  const count = Math.min(wets.length, dries.length, tares.length);
  if (wets.length !== dries.length || dries.length !== tares.length) {
    problems.push({ cell: wets[0]!.cell, says: `The tins at ${nameOf(wets[0]!.cell)} have ${wets.length} wet, ${dries.length} dry and ${tares.length} empty masses: every tin needs all three.` });
    return null;
  }
  const each: number[] = [];
  for (let i = 0; i < count; i++) {
    const wet = wets[i]!, dry = dries[i]!, tare = tares[i]!;
    if (dry.value <= tare.value) {
      problems.push({ cell: dry.cell, says: `${nameOf(dry.cell)} (dry soil and tin, ${dry.value}) must weigh more than the empty tin in ${nameOf(tare.cell)} (${tare.value}): correct the one that is wrong.` });
      return null;
    }
    if (wet.value < dry.value) {
      problems.push({ cell: wet.cell, says: `${nameOf(wet.cell)} (wet soil and tin, ${wet.value}) weighs less than ${nameOf(dry.cell)} after drying (${dry.value}): were the two swapped?` });
      return null;
    }
    each.push(waterContentFromMasses.value({ wetMass: wet.value, dryMass: dry.value, tare: tare.value }));
  }
  return each;
}

function blankBeside(reading: Reading, role: ReadingRole, cell: Place, position: number): Problem {
  const { grid, series } = reading;
  const { water, dry } = neededRoles(reading);
  const beside = series.find((one) => [...water, ...dry].includes(one.role as ReadingRole) && !blankAt(grid, one.index, position));
  const other = beside ? ` beside ${nameOf(grid.place(beside.index, position))} (${ROLE_NAMES[beside.role]} ${grid.shown(beside.index, position) || String(grid.value(beside.index, position))})` : "";
  return { cell, says: `${nameOf(cell)} is blank where the ${ROLE_NAMES[role]} should be${other}: fill it in, or clear the point's cells.` };
}
