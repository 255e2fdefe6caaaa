import { gainAtEffort, optimumAtEffort, optimumFromPlasticLimit, standardOptimumFromPlasticLimit, standardUnitWeightFromPlasticLimit, unitWeightFromOptimum } from "../compaction/correlations";
import { familyOf, pickFromFamily, pickRules } from "../compaction/family";
import type { CompactionTest, PeakFigure } from "../compaction/fit";
import { fitTest } from "../compaction/fit-test";
import { kindOfCurve, usualKinds } from "../compaction/kind";
import { gapOfRapidMethod, rapidPeak } from "../compaction/rapid-method";
import { USUAL_SCATTER } from "../compaction/scatter";
import { waterSpan } from "../compaction/water-span";
import { relativeCompaction } from "../field/relative-compaction";
import { densityUnit } from "../units/density-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import { CellError, columnsOf, isBlank, isLeftOut, isRange, notEnough, refusal, rowsOf, type Block, type Cell } from "./cell";
import { curveReader, fitted, mixedUnits, readTest, sentence, type TestCells } from "./compaction-test";
import { NOT_BOUNDED } from "./compaction";
import { inLine, readPairs } from "./pairs";
import { numberOf, waterDensity, wordOf } from "./readers";
import { readAll, single } from "./single";
import { sameUnitGuard, unitGuard } from "./unit-guard";

type Cells = Block | null;

const SAME_UNIT = { low: 0.5, high: 1.5 };

/** Shape of the points in words; with a liquid limit, also whether that is usual. */
export function curveKind(waters: Cells, dries: Cells, liquidLimit: Cells): Cell[][] | CellError {
  const read = readTest({ waters, dries, curve: null, gs: null, water: null });
  if (read instanceof CellError) return read;
  if (read.test.waters.length < 3) return notEnough("A shape needs at least three points, and a test should have five.");
  const limit = isLeftOut(liquidLimit) ? undefined : single(numberOf("liquidLimit"), liquidLimit);
  if (limit instanceof CellError) return limit;
  const { kind } = kindOfCurve(read.test, USUAL_SCATTER);
  return [[limit === undefined || usualKinds(limit).includes(kind) ? kind : `${kind} (not usual for a liquid limit of ${limit})`]];
}

/** The two water contents between which the curve stays above a percent of its maximum. */
export function spanOfWater(percent: Cells, cells: TestCells): Cell[][] | CellError {
  if (isLeftOut(percent)) return refusal("give the percent of the maximum dry density, such as 95.");
  const wanted = single(numberOf("relativeCompaction"), percent);
  if (wanted instanceof CellError) return wanted;
  if (!(wanted! < 100)) return refusal(`the percent of the maximum dry density must be below 100, not ${wanted}: no curve stays above its own peak.`);
  const found = fitted(cells);
  if (found instanceof CellError) return found;
  const { low, high } = waterSpan(found.fit, wanted!);
  return [[low ?? "not reached dry of the optimum", high ?? "not reached wet of the optimum"]];
}

interface SheetTest { readonly id: string; readonly test: CompactionTest; readonly rows: readonly number[]; readonly trouble: CellError | undefined }

/**
 * Many tests below one another. A name stands on every row of its test, or on the first alone (as a merged cell leaves it);
 * so may the specific gravity.
 */
function readTests(tests: Cells, waters: Cells, dries: Cells, gs: Cells, water: Cells): readonly SheetTest[] | CellError {
  if (isLeftOut(tests)) return refusal("give the names of the tests, one beside every point or beside the first of each test.");
  if (isLeftOut(waters) || isLeftOut(dries)) return refusal("give the water contents and the dry densities of the points.");
  const pairs = readPairs("waterContent", waters!, "dryDensity", dries!);
  if (pairs instanceof CellError) return pairs;
  const density = single(waterDensity, water);
  if (density instanceof CellError) return density;
  const guarded = !isLeftOut(gs) || !isLeftOut(water);
  const names = inLine(tests!), gravities = gs && isRange(gs) ? inLine(gs) : undefined, length = inLine(waters!)!.length;
  if (!names || names.length !== length) return refusal(`the names of the tests have ${names?.length ?? "several"} cells${names ? "" : " a row"}, the water contents ${length}: give ranges of the same size.`);
  if (gs && isRange(gs) && gravities?.length !== length) return refusal(`the specific gravities have ${gravities?.length ?? "several"} cells${gravities ? "" : " a row"}, the water contents ${length}: give one cell, or a range of the same size.`);
  const lone = isLeftOut(gs) || gravities ? undefined : single(numberOf("specificGravity"), gs);
  if (lone instanceof CellError) return lone;

  const groups = new Map<string, { waters: number[]; dries: number[]; rows: number[]; gravity: unknown }>();
  const own = new Set(pairs.rows.map((row) => row - 1));
  let name: string | null = null;
  for (let i = 0, k = 0; i < length; i++) {
    const given = names[i];
    if (given instanceof CellError) return given;
    if (!isBlank(given)) name = own.has(i) ? String(given).trim() : null;
    if (!own.has(i)) continue;
    if (name === null) return refusal(`row ${i + 1} of the ranges: name the test that this point belongs to.`);
    const group: { waters: number[]; dries: number[]; rows: number[]; gravity: unknown } = groups.get(name) ?? { waters: [], dries: [], rows: [], gravity: null };
    groups.set(name, group);
    group.waters.push(pairs.first[k]!);
    group.dries.push(pairs.second[k]!);
    group.rows.push(i + 1);
    if (isBlank(group.gravity)) group.gravity = gravities?.[i] ?? null;
    k++;
  }
  return [...groups].map(([id, { gravity, rows, ...points }]) => {
    const specificGravity = isBlank(gravity) ? lone : numberOf("specificGravity").read(gravity);
    let trouble = specificGravity instanceof CellError ? specificGravity : mixedUnits(points.dries, rows);
    if (guarded) points.dries.forEach((dry, i) => { trouble ??= unitGuard(dry, density!, `row ${rows[i]} of the ranges: `); });
    return { id, rows, trouble, test: { ...points, specificGravity: specificGravity instanceof CellError ? undefined : specificGravity, waterDensity: density! } };
  });
}

const TABLE_HEADS = ["test", "maximum dry density", "low (95 %)", "high (95 %)", "optimum water content, %", "low (95 %)", "high (95 %)", "curve", "points", "what to look at"];

/** One row a test; a test without a peak says why in its row. */
export function peakTable(tests: Cells, { waters, dries, curve, gs, water }: TestCells): Cell[][] | CellError {
  const word = single(curveReader, curve);
  if (word instanceof CellError) return word;
  const read = readTests(tests, waters, dries, gs, water);
  if (read instanceof CellError) return read;
  if (read.length === 0) return notEnough("There are no points.");
  const figure = ({ value, low, high }: PeakFigure): Cell[] => [value, low ?? NOT_BOUNDED, high ?? NOT_BOUNDED];
  return [TABLE_HEADS, ...read.map(({ id, test, trouble }): Cell[] => {
    const outcome = trouble ? undefined : fitTest(test, word!);
    if (!outcome?.ok) return [id, "", "", "", "", "", "", "no curve", test.waters.length, sentence(trouble?.says ?? outcome!.noFit.says)];
    const { fit } = outcome, [first, ...more] = fit.findings;
    return [id, ...figure(fit.maxDryDensity), ...figure(fit.optimumWater), fit.curve, test.waters.length, first ? `${sentence(first.says)}${more.length > 0 ? ` (and ${more.length} more)` : ""}` : "nothing found"];
  })];
}

/** The peak of a field soil from one compacted point and a family of curves. */
export function familyPick(waterContent: Cells, dry: Cells, family: Cells, rule: Cells): Cell[][] | CellError {
  if (isLeftOut(waterContent) || isLeftOut(dry)) return refusal("give the water content and the dry density of the compacted point.");
  if (isLeftOut(family)) return refusal("give the family: three columns, curve, water content, dry density, one row a point.");
  const water = single(numberOf("waterContent"), waterContent), density = single(numberOf("dryDensity"), dry), picked = single(wordOf("rule", pickRules, "between"), rule);
  for (const read of [water, density, picked]) if (read instanceof CellError) return read;
  const lines = columnsOf(family!) === 3 ? family! : rowsOf(family!) === 3 ? family![0]!.map((_, c) => family!.map((row) => row[c])) : undefined;
  if (!lines) return refusal(`the family has ${columnsOf(family!)} columns: give three, curve, water content, dry density, one row a point.`);
  const part = (c: number): Block => lines.map((row) => [row[c]]);
  const read = readTests(part(0), part(1), part(2), null, null);
  if (read instanceof CellError) return read;
  const dries = read.flatMap(({ test }) => test.dries), mixed = mixedUnits([...dries, density as number], [...read.flatMap(({ rows }) => rows), 0]);
  if (mixed) return refusal(`the point's dry density ${density} and the family's, ${Math.min(...dries)} to ${Math.max(...dries)}, cannot be in one unit.`);
  const all = familyOf(read, "auto"), answer = pickFromFamily(all, { water: water as number, dry: density as number }, picked as "between");
  if (!answer.ok) return refusal(sentence(answer.says));
  const doubts = [...all.doubts, ...all.left.map(({ id, says }) => `curve ${id} was left out: ${says}`)];
  return [
    ["maximum dry density", answer.peak.dry, ""],
    ["optimum water content, %", answer.peak.water, ""],
    [answer.curves.length > 1 ? "between curves" : "curve", answer.curves.join(" and "), ""],
    ["what to look at", doubts[0] ? sentence(doubts[0]) : "nothing found", doubts.length > 1 ? `and ${doubts.length - 1} more` : ""],
  ];
}

/** The water content that is assumed where none is given; the ratio does not need it. Common practice, no published source. */
const ASSUMED_WATER = 15;

/** The rapid method: compaction ratio before any water content is known. */
export function rapidMethod(added: Cells, wetDensities: Cells, fieldWet: Cells, fieldWater: Cells): Cell[][] | CellError {
  if (isLeftOut(added) || isLeftOut(wetDensities)) return refusal("give the added water and the wet density of each point.");
  if (isLeftOut(fieldWet)) return refusal("give the wet density of the fill.");
  const pairs = readPairs("addedWaterShare", added!, "wetDensity", wetDensities!);
  if (pairs instanceof CellError) return pairs;
  const field = single(numberOf("wetDensity"), fieldWet), water = isLeftOut(fieldWater) ? undefined : single(numberOf("waterContent"), fieldWater);
  for (const read of [field, water]) if (read instanceof CellError) return read;
  if (new Set(pairs.first).size < 3) return notEnough(`The rapid method needs points at three different additions of water at least; there are ${new Set(pairs.first).size}.`);
  const unlike = sameUnitGuard(field as number, "the wet density of the fill", Math.max(...pairs.second), "the points'", SAME_UNIT.low, SAME_UNIT.high);
  if (unlike) return unlike;
  const peak = rapidPeak(pairs.first, pairs.second);
  if (!peak) {
    const highest = pairs.second.map((wet, i) => wet / (1 + pairs.first[i]! / 100)), at = pairs.first[highest.indexOf(Math.max(...highest))]!;
    return refusal(`The converted wet densities have no peak between the points; they are greatest at ${at} % of added water. Add a point ${at === Math.max(...pairs.first) ? "wetter" : at === Math.min(...pairs.first) ? "drier" : "beside it, and look at the readings"}.`);
  }
  const own = pairs.second.filter((_, i) => pairs.first[i] === 0), atFill = own.length > 0 ? own.reduce((sum, wet) => sum + wet / own.length, 0) : peak.atFill;
  const ratio = (to: number): number => relativeCompaction.value({ dryDensity: field as number, maxDryDensity: to });
  const used = (water as number | undefined) ?? ASSUMED_WATER;
  return [
    ["D ratio, % (fill over the peak: its relative compaction)", ratio(peak.peak), ""],
    ["C ratio, % (fill over its own soil compacted as it came)", ratio(atFill), own.length > 0 ? "" : "read from the curve, as no point has no added water"],
    ["added water at the peak, % of moist mass", peak.added, ""],
    ["peak converted wet density", peak.peak, ""],
    ["distance from optimum, points (+ is wet)", gapOfRapidMethod.value({ peakAddedWater: peak.added, waterContent: used }), water === undefined ? `with an assumed water content of ${ASSUMED_WATER} %` : `at the water content ${used} %`],
    ["points", pairs.first.length, peak.standardError === null ? "no spare point" : `standard error ${Number(peak.standardError.toPrecision(2))}`],
  ];
}

const PLAUSIBILITY = "for plausibility only; never in place of a test";
/** A unit weight of kN/m³ in the sheet's unit, by the density of water in it. */
const fromUnitWeight = (unitWeight: number, water: number): number => unitWeight * water / (WATER_KG_M3_AT_20 / densityUnit("kN/m3")!.kgM3);

/** What a published correlation expects under another effort. */
export function effortPeak(maxDry: Cells, optimum: Cells, effort: Cells, other: Cells, liquidLimit: Cells, water: Cells): Cell[][] | CellError {
  const values = readAll({ maxDryDensity: maxDry, optimumWater: optimum, compactiveEffort: effort, otherEffort: other, liquidLimit });
  if (values instanceof CellError) return values;
  const density = single(waterDensity, water);
  if (density instanceof CellError) return density;
  const { maxDryDensity, optimumWater, compactiveEffort, otherEffort, liquidLimit: limit } = values;
  const trouble = unitGuard(maxDryDensity, density!);
  if (trouble) return trouble;
  for (const [name, value] of [["compactive effort", compactiveEffort], ["the other compactive effort", otherEffort]] as const)
    if (value < EFFORT.from || value > EFFORT.to) return refusal(`${name} ${value} kJ/m³ lies outside what the correlation was made for, ${EFFORT.from} to ${EFFORT.to}; standard compaction is near 595, modified near 2700.`);
  if (limit < LIQUID.from || limit > LIQUID.to) return refusal(`the liquid limit ${limit} lies outside what the correlation was made for, ${LIQUID.from} to ${LIQUID.to}.`);
  const inputs = { liquidLimit: limit, compactiveEffort, otherEffort };
  return [
    ["expected maximum dry density", maxDryDensity + fromUnitWeight(gainAtEffort.value(inputs), density!), PLAUSIBILITY],
    ["expected optimum water content, %", optimumAtEffort.value({ ...inputs, optimumWater }), gainAtEffort.source.title],
  ];
}

/** Efforts and liquid limits of the soils that the correlation was made from (17 to 70), with a little room. From memory. */
const EFFORT = { from: 200, to: 4000 }, LIQUID = { from: 15, to: 80 };

/** What published correlations expect of a soil of a given plastic limit. */
export function plasticPeak(plasticLimit: Cells, effort: Cells, water: Cells): Cell[][] | CellError {
  if (isLeftOut(plasticLimit)) return refusal("give the plastic limit.");
  const limit = single(numberOf("plasticLimit"), plasticLimit), work = isLeftOut(effort) ? STANDARD_EFFORT : single(numberOf("compactiveEffort"), effort), density = single(waterDensity, water);
  for (const read of [limit, work, density]) if (read instanceof CellError) return read;
  const compactiveEffort = work as number, plastic = limit as number;
  if (compactiveEffort < EFFORT.from || compactiveEffort > EFFORT.to) return refusal(`compactive effort ${compactiveEffort} kJ/m³ lies outside what the correlation was made for, ${EFFORT.from} to ${EFFORT.to}; standard compaction is near 595, modified near 2700.`);
  if (plastic < PLASTIC.from || plastic > PLASTIC.to) return refusal(`the plastic limit ${plastic} lies outside what the correlations were made for, ${PLASTIC.from} to ${PLASTIC.to}.`);
  const optimum = optimumFromPlasticLimit.value({ plasticLimit: plastic, compactiveEffort });
  const standard = Math.abs(compactiveEffort / STANDARD_EFFORT - 1) < 0.05;
  return [
    ["", "maximum dry density", "optimum water content, %", PLAUSIBILITY],
    ["by effort and plastic limit", fromUnitWeight(unitWeightFromOptimum.value({ optimumWater: optimum }), density as number), optimum, optimumFromPlasticLimit.source.title],
    standard
      ? ["by plastic limit, standard compaction", fromUnitWeight(standardUnitWeightFromPlasticLimit.value({ plasticLimit: plastic }), density as number), standardOptimumFromPlasticLimit.value({ plasticLimit: plastic }), standardOptimumFromPlasticLimit.source.title]
      : ["by plastic limit, standard compaction", "not for this effort", "not for this effort", standardOptimumFromPlasticLimit.source.title],
  ];
}

/** Compactive effort of the standard test, kJ/m³: ASTM D698. */
const STANDARD_EFFORT = 592.5;
/** Plastic limits of the soils behind the correlations, with a little room. From memory. */
const PLASTIC = { from: 10, to: 60 };

