import type { CompactionTest, CurveWord, Fit, FitOutcome, NoFit, Oversize, PeakPlace, ReportedPeak } from "../../src/compaction/fit";
import { wholeDryDensity, wholeWater } from "../../src/compaction/oversize";
import { USUAL_SCATTER, type Scatter } from "../../src/compaction/scatter";
import type { Finding, Severity } from "../../src/findings/finding";
import { airVoidsLine, leastSpecificGravity, zeroAirVoids } from "../../src/phase/lines";
import { quantity } from "../../src/relations/quantities";
import { recogniseTable } from "../../src/tables/recognise";
import { severalTests, type TestPoints } from "../../src/tables/several";
import type { Place, Table } from "../../src/tables/table";
import { unitOfWater, type DensityUnit } from "../../src/units/density-units";
import { WATER_KG_M3_AT_20 } from "../../src/units/water-density";
import { cellName, rangeName } from "../../src/workbook/address";
import { SIGNATURE, type Area, type Mark, type MarkKind, type Snapshot } from "../../src/workbook/port";
import { unitOfId, waterShown, densityShown } from "../parts/figures";
import type { PlotData, PointMark } from "../plot/plot";
import type { Choices } from "./choices";

export interface FitterOptions { readonly scatter: Scatter; readonly weigh: boolean }
export type Fitter = (test: CompactionTest, curve: CurveWord, options: FitterOptions) => FitOutcome;

/** A test beside the one that is shown: another of the same selection, or one that the user keeps for comparison. */
export interface Beside {
  readonly name: string;
  readonly fit: Fit | null;
  /** why there is no fit */
  readonly says: string;
  /** id of its density unit */
  readonly unit: string | null;
}

/** A finding with the cells that it speaks of. */
export interface ShownFinding {
  readonly id: string;
  readonly severity: Severity;
  readonly says: string;
  /** null where it speaks of the whole test */
  readonly area: Area | null;
  readonly point: number | null;
}

export interface SpecificGravity {
  readonly value: number | null;
  readonly assumed: boolean;
  readonly from: "sheet" | "typed" | null;
  /** the text as it stands in the field */
  readonly text: string;
  readonly trouble: string | null;
}

/** Everything the pane shows of one selection, computed at once from the cells and the user's choices. */
export interface Look {
  readonly table: Table;
  readonly choices: Choices;
  readonly kind: "nothing" | "unreadable" | "no-fit" | "fitted";
  /** the table in one line */
  readonly recognised: string;
  readonly unit: DensityUnit | null;
  readonly specificGravity: SpecificGravity;
  readonly water: { readonly density: number | null; readonly trouble: string | null };
  readonly fit: Fit | null;
  readonly noFit: NoFit | null;
  readonly findings: readonly ShownFinding[];
  readonly marks: readonly PointMark[];
  /** the smallest specific gravity at which each point past the line would be possible */
  readonly leastSpecificGravities: readonly (number | null)[];
  readonly plot: PlotData | null;
  /** the tests of the selection, where it holds several, and which of them is shown */
  readonly tests: readonly TestPoints[];
  readonly shownTest: string | null;
  /** which line of the selection names the tests; −1 where it is one test */
  readonly testsIn: number;
  /** the other tests of the selection, fitted the same way */
  readonly others: readonly Beside[];
  /** what is wrong with a typed scatter or a reported peak */
  readonly settingTroubles: readonly string[];
  readonly ownScatter: boolean;
  /** the peak of the whole soil, where oversize is told */
  readonly whole: { readonly peak: PeakPlace; readonly oversize: Oversize } | null;
}

/** A typed number with either decimal sign; undefined where it is none. */
export const typedNumber = (text: string): number | undefined => /^\s*\d*[.,]?\d+\s*$/.test(text) ? Number(text.trim().replace(",", ".")) : undefined;

/** `around` are the cells about the selection, where the specific gravity of the test may stand. */
export function lookAt(snapshot: Snapshot, choices: Choices, fitter: Fitter, around: Snapshot | null = null): Look {
  const whole = recogniseTable(snapshot, choices.corrections, around);
  const { tests, index: testsIn } = severalTests(whole, snapshot), chosen = tests.find(({ name }) => name === choices.test) ?? tests[0];
  const part = (points: readonly number[]): Table => ({ ...whole, points: points.map((i) => whole.points[i]!), groups: points.map((i) => whole.groups[i]!) });
  const table = chosen ? part(chosen.points) : whole;
  const unit = table.densityUnit === null ? null : unitOfId(table.densityUnit) ?? null;
  const specificGravity = specificGravityOf(table, choices);
  const water = waterOf(unit, choices);
  const settings = settingsOf(choices);
  const base = {
    table, choices, unit, specificGravity, water, tests, testsIn, shownTest: chosen?.name ?? null, settingTroubles: settings.troubles, ownScatter: settings.own, others: [], whole: null,
    recognised: chosen ? `${plural(tests.length, "test")} in one selection, ${chosen.name} shown: ${recognisedWords(table, unit)}` : recognisedWords(table, unit),
  };
  const nothing = { fit: null, noFit: null, findings: [], marks: [], leastSpecificGravities: [], plot: null };

  if (table.body === null && table.points.length === 0) return { ...base, ...nothing, kind: table.problems.length > 0 ? "unreadable" : "nothing" };
  if (unit === null || table.points.length === 0 || water.density === null) return { ...base, ...nothing, kind: "unreadable" };

  const { density } = water;
  const testOf = ({ points }: Table): CompactionTest => ({
    waters: points.map((point) => point.water), dries: points.map(({ dry }) => dry), waterDensity: density, tins: points.map(({ tins }) => tins),
    ...(specificGravity.value === null ? {} : { specificGravity: specificGravity.value, specificGravityAssumed: specificGravity.assumed }),
    ...(choices.soil === null ? {} : { soil: choices.soil }),
  });
  const test: CompactionTest = { ...testOf(table), ...(settings.reported ? { reported: settings.reported } : {}), ...(settings.oversize ? { oversize: settings.oversize } : {}) };
  // a point that cannot be read is not quietly left out of a curve: the functions refuse such a range too
  const waits = table.problems.length > 0 || specificGravity.trouble !== null;
  const outcome = waits ? null : fitter(test, choices.curve, settings.options);
  const found = outcome === null ? [] : outcome.ok ? outcome.fit.findings : outcome.noFit.findings;
  const findings = found.map((finding) => shownFinding(finding, table));
  const fit = outcome?.ok ? outcome.fit : null, noFit = outcome && !outcome.ok ? outcome.noFit : null;
  const others = waits ? [] : tests.filter((one) => one !== chosen).map(({ name, points }): Beside => {
    const other = fitter(testOf(part(points)), choices.curve, settings.options);
    return { name, unit: unit.id, fit: other.ok ? other.fit : null, says: other.ok ? "" : other.noFit.says };
  });
  const marks = table.points.map((_, i) => markOf(findings.filter(({ point }) => point === i)));
  return {
    ...base, fit, noFit, findings, marks, others,
    whole: fit && settings.oversize ? wholePeak(peakPlace(fit), settings.oversize, density) : null,
    kind: fit ? "fitted" : noFit ? "no-fit" : "unreadable",
    leastSpecificGravities: table.points.map((point, i) => marks[i] === "past-line"
      ? leastSpecificGravity.value({ waterContent: point.water, dryDensity: point.dry, waterDensity: test.waterDensity }) : null),
    plot: plotData(test, fit, marks, unit, others),
  };
}

/** Water content of stones where none is told, percent: a state's copy of AASHTO T 224 takes 2. */
export const USUAL_STONE_WATER = 2;

const wholePeak = ({ water, dry }: PeakPlace, oversize: Oversize, waterDensity: number): NonNullable<Look["whole"]> => ({
  oversize,
  peak: {
    dry: wholeDryDensity.value({ fineDryDensity: dry, stonePercent: oversize.percent, stoneGravity: oversize.gravity, waterDensity }),
    water: wholeWater.value({ fineWater: water, stonePercent: oversize.percent, stoneWater: oversize.water }),
  },
});

/** The usual scatter, or the typed one in its place; the reported peak, where one is typed. */
function settingsOf({ pointScatter, wetScatter, waterScatter, weigh, stonePercent, stoneGravity, stoneWater, reportedDry, reportedWater, standard }: Choices): { readonly oversize: Oversize | null; readonly options: FitterOptions; readonly reported: ReportedPeak | null; readonly troubles: readonly string[]; readonly own: boolean } {
  const troubles: string[] = [];
  const read = (text: string, name: string, from: number, to: number, usual: number | undefined): number | undefined => {
    if (text.trim() === "") return usual;
    const value = typedNumber(text);
    if (value !== undefined && value >= from && value <= to) return value;
    troubles.push(`${name} "${text.trim()}" is not a number between ${from} and ${to}: ${usual === undefined ? "it is left out" : `the usual ${usual} is used`} until it is mended.`);
    return usual;
  };
  const { curve, wetDensity, water } = USUAL_SCATTER;
  const scatter = {
    curve: read(pointScatter, "The scatter of a point", 0.05, 5, 100 * curve)! / 100,
    wetDensity: read(wetScatter, "The scatter of wet density", 0.05, 5, 100 * wetDensity)! / 100,
    water: read(waterScatter, "The scatter of water content", 0.02, 3, water)!,
  };
  const maxDryDensity = read(reportedDry, "The reported maximum dry density", 0.1, 4000, undefined), optimumWater = read(reportedWater, "The reported optimum", 0.1, 500, undefined);
  const percent = read(stonePercent, "The oversize percent", 0, 95, undefined), gravity = read(stoneGravity, "The specific gravity of the oversize", 1, 6, undefined), wet = read(stoneWater, "The water content of the oversize", 0, 40, undefined);
  if (percent !== undefined && gravity === undefined) troubles.push("Give the bulk specific gravity of the oversize too; without it nothing is corrected.");
  return {
    oversize: percent === undefined || gravity === undefined ? null : { percent, gravity, water: wet ?? USUAL_STONE_WATER },
    options: { scatter, weigh }, troubles,
    own: weigh || scatter.curve !== curve || scatter.wetDensity !== wetDensity || scatter.water !== water,
    reported: maxDryDensity === undefined && optimumWater === undefined ? null : { maxDryDensity, optimumWater, standard: standard ?? undefined },
  };
}

/** The optimum and peak of a fit, as a place in the plot. */
export const peakPlace = ({ optimumWater, maxDryDensity }: Fit): PeakPlace => ({ water: optimumWater.value, dry: maxDryDensity.value });

function specificGravityOf(table: Table, { specificGravity: typed, assumed }: Choices): SpecificGravity {
  const fromSheet = table.specificGravity;
  if (typed === null) return {
    value: fromSheet?.value ?? null, assumed: assumed ?? fromSheet?.assumed ?? false, from: fromSheet ? "sheet" : null,
    text: fromSheet ? String(fromSheet.value) : "", trouble: null,
  };
  const ours = { assumed: assumed ?? false, text: typed };
  if (typed.trim() === "") return { ...ours, value: null, from: null, trouble: null };
  const value = typedNumber(typed);
  const { from, to } = quantity("specificGravity");
  if (value === undefined || value < from || value > to)
    return { ...ours, value: null, from: "typed", trouble: `The specific gravity "${typed.trim()}" is not a number between ${from} and ${to}: type one, such as 2.70, or leave it out.` };
  return { ...ours, value, from: "typed", trouble: null };
}

function waterOf(unit: DensityUnit | null, { waterDensity }: Choices): Look["water"] {
  if (unit === null) return { density: null, trouble: null };
  const at20 = WATER_KG_M3_AT_20 / unit.kgM3;
  if (waterDensity.trim() === "") return { density: at20, trouble: null };
  const typed = typedNumber(waterDensity);
  if (typed !== undefined && unitOfWater(typed, WATER_KG_M3_AT_20) === unit) return { density: typed, trouble: null };
  return { density: at20, trouble: `The density of water "${waterDensity.trim()}" is none in ${unit.printed}, where it is about ${Number(at20.toPrecision(3))}: water at 20 °C is used until it is mended.` };
}

const areaOfCells = (sheet: string, cells: readonly Place[]): Area => {
  const rows = cells.map(({ row }) => row), columns = cells.map(({ column }) => column);
  const row = Math.min(...rows), column = Math.min(...columns);
  return { sheet, row, column, rows: Math.max(...rows) - row + 1, columns: Math.max(...columns) - column + 1 };
};

function shownFinding({ id, severity, says, place }: Finding, table: Table): ShownFinding {
  const point = place.at === "point" ? place.index : null;
  const cells = point === null ? [] : table.points[point]!.dryCells;
  return { id, severity, says, point, area: cells.length > 0 ? areaOfCells(table.area.sheet, cells.slice(0, 1)) : null };
}

const PAST_LINE = "past-line";

/** The weightiest finding of a point gives its shape. */
function markOf(findings: readonly ShownFinding[]): PointMark {
  if (findings.some(({ id }) => id === PAST_LINE)) return "past-line";
  if (findings.some(({ severity }) => severity !== "ask")) return "doubtful";
  return findings.length > 0 ? "ask" : "plain";
}

/** The lines of constant air voids that a curve is read against. */
const AIR_LINES = [5, 10] as const;

export const besideInPlot = ({ name, fit }: Beside): PlotData["beside"] => fit === null ? [] : [{
  name, at: (water) => fit.at(water), peak: peakPlace(fit),
  from: Math.min(...fit.used.map((i) => fit.test.waters[i]!)), to: Math.max(...fit.used.map((i) => fit.test.waters[i]!)),
}];

function plotData(test: CompactionTest, fit: Fit | null, marks: readonly PointMark[], unit: DensityUnit, others: readonly Beside[]): PlotData {
  const { specificGravity, waterDensity } = test;
  return {
    unit: unit.printed,
    points: test.waters.map((water, i) => ({ water, dry: test.dries[i]!, mark: marks[i]!, used: fit === null || fit.used.includes(i) })),
    curve: fit ? { at: (water) => fit.at(water), bandAt: (water) => fit.bandAt(water) } : null,
    peak: fit ? { water: fit.optimumWater.value, dry: fit.maxDryDensity.value, waterInterval: fit.optimumWater, dryInterval: fit.maxDryDensity } : null,
    beside: others.flatMap(besideInPlot),
    lines: specificGravity === undefined ? [] : [
      { labels: ["zero air voids", "0 % air"], at: (waterContent) => zeroAirVoids.value({ waterContent, specificGravity, waterDensity }) },
      ...AIR_LINES.map((airVoids) => ({ labels: [`${airVoids} % air`, `${airVoids} %`], at: (waterContent: number) => airVoidsLine.value({ waterContent, specificGravity, waterDensity, airVoids }) })),
    ],
  };
}

const plural = (count: number, word: string): string => `${count} ${word}${count === 1 ? "" : "s"}`;

/** "5 points, B5:D9, down the rows; water content in %, dry density in Mg/m³". */
function recognisedWords(table: Table, unit: DensityUnit | null): string {
  if (table.body === null) return "";
  const { waterFrom, dryFrom, orientation, points, groups } = table;
  const count = points.length === groups.length || groups.length === 0 ? plural(points.length, "point") : `${points.length} of ${plural(groups.length, "point")}`;
  const waterSeries = table.series.find(({ role }) => role === "waterContent");
  const water = waterFrom === "column" ? `water content ${waterSeries?.unit === "fraction" ? "as fractions" : "in %"}` : waterFrom === "tins" ? "water content from tins" : null;
  const density = dryFrom === null ? null : `dry density in ${unit?.printed ?? "a unit not known yet"}${dryFrom === "wet density" ? ", from wet density" : dryFrom === "mould" ? ", from mould and soil" : ""}`;
  const found = [water, density].filter((part) => part !== null).join(", ");
  return `${points.length === 0 ? "No point yet" : count}, ${rangeName(table.body)}, ${orientation === "down" ? "down the rows" : "across the columns"}${found ? `; ${found}` : ""}`;
}

const MARK_KINDS: Readonly<Record<Exclude<PointMark, "plain">, MarkKind>> = { "past-line": "past-line", doubtful: "doubtful", ask: "ask" };

/** Marks for every point that a finding speaks of: its dry density carries the note, its water content the colour. */
export function marksOf(look: Look): Mark[] {
  const { table } = look;
  return table.points.flatMap((point, i): Mark[] => {
    const mark = look.marks[i];
    if (!mark || mark === "plain") return [];
    const kind = MARK_KINDS[mark];
    const note = `${SIGNATURE}: ${look.findings.filter((finding) => finding.point === i).map(({ says }) => says).join(" ")}`;
    const cell = (place: Place): Area => ({ sheet: table.area.sheet, ...place, rows: 1, columns: 1 });
    return [
      { area: cell(point.dryCells[0]!), kind, note },
      { area: cell(point.waterCells[0]!), kind },
    ];
  });
}

/** A point in words: what it is and where it stands. */
export function pointWords(look: Look, index: number): string {
  const point = look.table.points[index]!, unit = look.unit!;
  const cells = [...new Set([point.waterCells[0]!, point.dryCells[0]!].map(({ row, column }) => cellName(row, column)))].join(", ");
  const flag = { plain: "", "past-line": "; past the zero-air-voids line", doubtful: "; doubtful", ask: "; a question" }[look.marks[index] ?? "plain"];
  return `Point ${index + 1} (${cells}): water content ${waterShown(point.water)} %, dry density ${densityShown(point.dry, unit.id)} ${unit.printed}${flag}`;
}

/** The plot in words, for those who do not see it. */
export function plotWords(look: Look): string {
  const { fit, unit, table } = look;
  const past = look.marks.filter((mark) => mark === "past-line").length;
  const waters = table.points.map(({ water }) => water);
  return [
    `Dry density against water content: ${plural(table.points.length, "point")} from ${waterShown(Math.min(...waters))} to ${waterShown(Math.max(...waters))} % water content.`,
    fit ? `Fitted ${CURVE_NAMES[fit.curve].toLowerCase()} with its 95 % band, highest at ${waterShown(fit.optimumWater.value)} % and ${densityShown(fit.maxDryDensity.value, unit!.id)} ${unit!.printed}.` : "No fitted curve.",
    look.plot && look.plot.lines.length > 0 ? `Lines of zero, 5 % and 10 % air voids for a specific gravity of ${look.specificGravity.value}.` : "",
    past > 0 ? `${plural(past, "point")} past the zero-air-voids line.` : "",
  ].filter((part) => part !== "").join(" ");
}

export const CURVE_NAMES: Readonly<Record<CurveWord, string>> = { auto: "Automatic", parabola: "Parabola", cubic: "Cubic", quartic: "Quartic", saturation: "Saturation curve", smooth: "Smooth curve", "top three": "Top three points" };
export const SEVERITY_WORDS: Readonly<Record<Severity, string>> = { impossible: "Not possible", doubtful: "Doubtful", ask: "Question" };
