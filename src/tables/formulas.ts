import type { CurveWord } from "../compaction/fit";
import { massUnits } from "../units/mass-and-volume-units";
import { densityUnits } from "../units/density-units";
import { cellName, rangeName, sheetName } from "../workbook/address";
import type { Content } from "../workbook/port";
import type { Place, Role, Series, Table } from "./table";

export interface PeakChoices {
  readonly curve: CurveWord;
  readonly specificGravity: number | null;
  /** a number where the user typed the density of water; null takes the unit, which stands for water at 20 °C */
  readonly waterDensity: number | null;
}

/** What is to be written for a table: first the cells that its readings need in between, then the fit. */
export interface PeakFormulas {
  /** one formula that needs no cells in between; null where each point has its own count of tins */
  readonly single: string | null;
  /** rows that stand above the fit: a heading, a row a point, and one of air; none where one formula does */
  readonly rowsBefore: number;
  /** rows of contents for the top left corner given; `reaches` is what the fit's formula fills */
  block(at: Place, reaches: { rows: number; columns: number }): (Content | null)[][];
}

/** The live formula of a table's peak, in the tongue of the port: English names, commas, A1 references. */
export function peakFormulas(table: Table, choices: PeakChoices, fromSheet: string): PeakFormulas | null {
  if (table.points.length === 0 || table.densityUnit === null) return null;
  const prefix = fromSheet === table.area.sheet ? "" : `${sheetName(table.area.sheet)}!`;
  const writer = new Writer(table, prefix);
  const peak = (waters: string, dries: string): string => `=TAMP.PEAKFIT(${[waters, dries, `"${choices.curve}"`, ...lastArguments(table, choices, prefix)].join(",")})`;
  const waters = writer.waters();
  const single = waters === null ? null : peak(waters, writer.dries(waters));
  return {
    single,
    rowsBefore: single === null ? table.groups.length + 2 : 0,
    block(at, reaches) {
      if (single !== null) return [[{ formula: single, reaches }]];
      const first = at.row + 1, last = at.row + table.groups.length;
      const range = (column: number): string => rangeName({ row: first, column, rows: last - first + 1, columns: 1 });
      const unit = densityUnits.find(({ id }) => id === table.densityUnit)!.printed;
      return [
        [{ value: "Water content, %" }, { value: `Dry density, ${unit}` }],
        ...table.groups.map((lines, i): Content[] => {
          const water = cellName(first + i, at.column);
          return [{ formula: `=${writer.waterOfPoint(lines)}` }, { formula: `=${writer.dryOfPoint(lines[0]!, water)}` }];
        }),
        [null, null],
        [{ formula: peak(range(at.column), range(at.column + 1)), reaches }],
      ];
    },
  };
}

/** The live formula of a table that holds several tests, named in one of its lines; null where its figures are not in columns of their own. */
export function tableFormula(table: Table, namesAt: number, choices: PeakChoices, fromSheet: string): string | null {
  const water = table.series.find(({ role }) => role === "waterContent"), dry = table.series.find(({ role }) => role === "dryDensity"), names = table.series.find(({ index }) => index === namesAt);
  if (table.waterFrom !== "column" || table.dryFrom !== "column" || !water?.range || !dry?.range || !names) return null;
  const prefix = fromSheet === table.area.sheet ? "" : `${sheetName(table.area.sheet)}!`;
  // the names stand beside the points, whether every cell of theirs is filled or not
  const across = table.orientation === "across";
  const beside = across ? { ...water.range, row: table.area.row + namesAt } : { ...water.range, column: table.area.column + namesAt };
  return `=TAMP.PEAKTABLE(${[prefix + rangeName(beside), asPercent(water, prefix + rangeName(water.range)), prefix + rangeName(dry.range), `"${choices.curve}"`, ...lastArguments(table, choices, prefix)].join(",")})`;
}

function lastArguments(table: Table, { specificGravity, waterDensity }: PeakChoices, prefix: string): string[] {
  if (specificGravity === null) return [];
  const cell = table.specificGravity;
  const gs = cell && cell.value === specificGravity ? prefix + cellName(cell.cell.row, cell.cell.column) : String(specificGravity);
  return [gs, waterDensity === null ? `"${table.densityUnit}"` : String(waterDensity)];
}

/** Writes the terms of one table. Every reference goes through here. */
class Writer {
  constructor(private readonly table: Table, private readonly prefix: string) {}

  private of(role: Role): Series[] { return this.table.series.filter((one) => one.role === role); }

  private range({ range }: Series): string { return this.prefix + rangeName(range!); }

  private cell({ index }: Series, line: number): string {
    const { area, orientation } = this.table;
    return this.prefix + (orientation === "down" ? cellName(area.row + line, area.column + index) : cellName(area.row + index, area.column + line));
  }

  /** Water contents of all points as one term, or null where the points have unequal counts of tins. */
  waters(): string | null {
    const { table } = this;
    if (table.waterFrom === "column") return asPercent(this.of("waterContent")[0]!, this.range(this.of("waterContent")[0]!));
    const wet = this.of("wetAndTin"), dry = this.of("dryAndTin"), tare = this.of("tare");
    const tins = Math.min(wet.length, dry.length, tare.length);
    if (table.groups.some(({ length }) => length > 1) || table.points.some(({ waterCells }) => waterCells.length !== 3 * tins)) return null;
    const each = Array.from({ length: tins }, (_, i) => `TAMP.WATERPCT(${this.range(wet[i]!)},${this.range(dry[i]!)},${this.range(tare[i]!)})`);
    return tins === 1 ? each[0]! : `(${each.join("+")})/${tins}`;
  }

  dries(waters: string): string {
    const { dryFrom } = this.table;
    if (dryFrom === "column") return this.range(this.of("dryDensity")[0]!);
    if (dryFrom === "wet density") return `TAMP.SOILDRY(${this.range(this.of("wetDensity")[0]!)},${waters})`;
    return `TAMP.SOILDRY(${this.mouldWet((series) => this.range(series))},${waters})`;
  }

  private mouldWet(reference: (series: Series) => string): string {
    const { table } = this;
    const units = table.mouldUnits!;
    const once = (role: "mouldMass" | "mouldVolume"): string | null => {
      const given = table[role];
      return given ? this.prefix + cellName(given.cell.row, given.cell.column) : null;
    };
    const gross = this.of("mouldAndSoil")[0], net = this.of("wetSoil")[0], mould = this.of("mouldMass")[0], volume = this.of("mouldVolume")[0];
    const massOf = (series: Series | undefined): string => series?.unit ?? units.mass;
    const lead = massOf(gross ?? net);
    const inLead = (text: string, unit: string): string => {
      const kg = (id: string): number => massUnits.find((one) => one.id === id)!.kg;
      return unit === lead ? text : `${text}*${Number((kg(unit) / kg(lead)).toPrecision(15))}`;
    };
    const empty = gross ? inLead(once("mouldMass") ?? reference(mould!), massOf(mould)) : "0";
    return `TAMP.MOULDWET(${[reference((gross ?? net)!), empty, once("mouldVolume") ?? reference(volume!), `"${lead}"`, `"${volume?.unit ?? units.volume}"`].join(",")})`;
  }

  /** One point's water content: the mean over its tins. */
  waterOfPoint(lines: readonly number[]): string {
    const { table } = this;
    if (table.waterFrom === "column") return asPercent(this.of("waterContent")[0]!, this.cell(this.of("waterContent")[0]!, lines[0]!));
    const wet = this.of("wetAndTin"), dry = this.of("dryAndTin"), tare = this.of("tare");
    const used = new Set(table.points.flatMap(({ waterCells }) => waterCells.map(({ row, column }) => this.prefix + cellName(row, column))));
    const tins = lines.flatMap((line) => wet.map((_, i) => [wet[i]!, dry[i], tare[i]].map((series) => series ? this.cell(series, line) : "")))
      .filter((cells) => cells.every((cell) => used.has(cell)));
    const each = tins.map((cells) => `TAMP.WATERPCT(${cells.join(",")})`);
    return each.length === 1 ? each[0]! : `AVERAGE(${each.join(",")})`;
  }

  dryOfPoint(line: number, water: string): string {
    const { dryFrom } = this.table;
    if (dryFrom === "column") return this.cell(this.of("dryDensity")[0]!, line);
    if (dryFrom === "wet density") return `TAMP.SOILDRY(${this.cell(this.of("wetDensity")[0]!, line)},${water})`;
    return `TAMP.SOILDRY(${this.mouldWet((series) => this.cell(series, line))},${water})`;
  }
}

/** Fractions in cells formatted as % become percents in the formula, as the pane reads them. */
const asPercent = ({ unit }: Series, reference: string): string => unit === "fraction" ? `${reference}*100` : reference;
