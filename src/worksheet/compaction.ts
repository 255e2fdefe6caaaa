import { compactiveEffort } from "../compaction/effort";
import { curveName, type Fit, type PeakFigure } from "../compaction/fit";
import { mouldVolumeFromMeasures, waterForBatch, wetDensityInMould } from "../compaction/mould";
import { fineDryDensity, fineWater, wholeDryDensity, wholeWater } from "../compaction/oversize";
import type { Finding } from "../findings/finding";
import { densityUnit, densityUnits, SOIL_OVER_WATER } from "../units/density-units";
import { massUnits, volumeUnits, type MassUnit, type VolumeUnit } from "../units/mass-and-volume-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import { CellError, isLeftOut, refusal, type Block, type Cell } from "./cell";
import { argument, column } from "./column";
import { fitOnce, fitted, readTest, sentence, type TestCells } from "./compaction-test";
import { numberOf, unitOfMass, unitOfVolume } from "./readers";
import { relationColumn } from "./relation-column";

type Cells = Block | null;

export const NOT_BOUNDED = "not bounded";

/** The labelled block of PEAKFIT. Cells elsewhere refer to its rows, so their order is kept. */
export function peakBlock(cells: TestCells): Cell[][] | CellError {
  const found = fitted(cells);
  if (found instanceof CellError) return found;
  const { fit } = found;
  const figure = (label: string, { value, low, high }: PeakFigure): Cell[] => [label, value, low ?? NOT_BOUNDED, high ?? NOT_BOUNDED];
  const needsGravity = "needs the specific gravity";
  const [first, ...more] = fit.findings;
  return [
    ["", "value", "low (95 %)", "high (95 %)"],
    figure("maximum dry density", fit.maxDryDensity),
    figure("optimum water content, %", fit.optimumWater),
    ["curve", fit.curve, fit.reason, ""],
    ["standard error", fit.standardError ?? "no spare point", "", ""],
    ["interval", fit.intervalFrom, fit.intervalNote, ""],
    ["saturation at the optimum, %", fit.saturationAtOptimum ?? needsGravity, "", ""],
    ["air voids at the optimum, %", fit.airVoidsAtOptimum ?? needsGravity, "", ""],
    ["points used", fit.used.length, `of ${fit.test.waters.length}`, ""],
    ["what to look at", first ? first.says : "nothing found", more.length > 0 ? `and ${more.length} more: see CURVEFLAGS` : "", ""],
    ["curves that do as well", fit.otherCurves.length > 0 ? fit.otherCurves.map(({ curve }) => curveName(curve)).join(", ") : "none", "", ""],
    figure("dry density, whichever of them", { value: fit.maxDryDensity.value, ...fit.joined().maxDryDensity }),
    figure("optimum, whichever of them, %", { value: fit.optimumWater.value, ...fit.joined().optimumWater }),
  ];
}

const oneFigure = (pick: (fit: Fit) => number) => (cells: TestCells): Cell[][] | CellError => {
  const found = fitted(cells);
  return found instanceof CellError ? found : [[pick(found.fit)]];
};

export const peakDry = oneFigure((fit) => fit.maxDryDensity.value);
export const peakWater = oneFigure((fit) => fit.optimumWater.value);

/** Dry density on the fitted curve, inside the data it was fitted to. */
export function curveDry(at: Cells, cells: TestCells): Cell[][] | CellError {
  if (isLeftOut(at)) return refusal("give the water content at which the curve is wanted.");
  const found = fitted(cells);
  if (found instanceof CellError) return found;
  const { fit } = found;
  const used = fit.used.map((i) => fit.test.waters[i]!), driest = Math.min(...used), wettest = Math.max(...used);
  return column([argument({ ...numberOf("waterContent"), name: "water content on the curve" }, at)], (water) =>
    water < driest || water > wettest ? refusal(`${water} % lies outside the points the curve was fitted to, ${driest} to ${wettest} %: nothing was measured there.`) : fit.at(water));
}

const WEIGHT_WORDS = { impossible: "not possible", doubtful: "doubtful", ask: "ask" } as const;

/** What a reviewer should look at, one row a finding; where no curve is fitted, first why. */
export function curveFlags(cells: TestCells): Cell[][] | CellError {
  const read = readTest(cells);
  if (read instanceof CellError) return read;
  const outcome = fitOnce(read.test, read.word);
  const row = ({ place, severity, says }: Finding): Cell[] => [place.at === "point" ? `row ${read.rows[place.index]}` : "whole test", WEIGHT_WORDS[severity], sentence(says)];
  const rows = outcome.ok ? outcome.fit.findings.map(row) : [["whole test", "no curve", sentence(outcome.noFit.says)], ...outcome.noFit.findings.map(row)];
  return [["where", "what", "why"], ...(rows.length > 0 ? rows : [["whole test", "nothing found", "No finding on these points."]])];
}

export const effortColumn = (rammerMass: Cells, drop: Cells, blows: Cells, layers: Cells, mouldVolume: Cells): Cell[][] | CellError =>
  relationColumn(compactiveEffort, { rammerMass, drop, blows, layers, mouldVolume });

export const mouldVolumeColumn = (mouldDiameter: Cells, mouldHeight: Cells): Cell[][] | CellError => relationColumn(mouldVolumeFromMeasures, { mouldDiameter, mouldHeight });
export const batchWaterColumn = (moistMass: Cells, waterContent: Cells, targetWater: Cells): Cell[][] | CellError => relationColumn(waterForBatch, { moistMass, waterContent, targetWater });

export const wholeDryColumn = (fine: Cells, stonePercent: Cells, stoneGravity: Cells, water: Cells): Cell[][] | CellError =>
  relationColumn(wholeDryDensity, { fineDryDensity: fine, stonePercent, stoneGravity, waterDensity: water });
export const fineDryColumn = (whole: Cells, stonePercent: Cells, stoneGravity: Cells, water: Cells): Cell[][] | CellError =>
  relationColumn(fineDryDensity, { wholeDryDensity: whole, stonePercent, stoneGravity, waterDensity: water }, { impossible: "the oversize alone would weigh more than the whole soil: check the oversize percent, its specific gravity and the dry density." });
export const wholeWaterColumn = (fine: Cells, stonePercent: Cells, stoneWater: Cells): Cell[][] | CellError =>
  relationColumn(wholeWater, { fineWater: fine, stonePercent, stoneWater });
export const fineWaterColumn = (whole: Cells, stonePercent: Cells, stoneWater: Cells): Cell[][] | CellError =>
  relationColumn(fineWater, { wholeWater: whole, stonePercent, stoneWater }, { impossible: "the oversize alone would hold more water than the whole soil: check the oversize percent and its water content." });

/** Which unit of mass goes with which unit of volume, where only one is named. */
const PARTNER_OF_MASS: Readonly<Record<string, string>> = { g: "cm3", kg: "L", lb: "ft3", Mg: "m3" };
const PARTNER_OF_VOLUME: Readonly<Record<string, string>> = { cm3: "g", L: "kg", m3: "kg", ft3: "lb", in3: "lb", mm3: "g" };
/** The density that comes out, by the unit of volume: pounds a cubic foot where feet or inches are in use. */
const RESULT_UNIT: Readonly<Record<string, string>> = { ft3: "lb/ft3", in3: "lb/ft3", m3: "kg/m3" };

const wetDensity = wetDensityInMould.by("mouldAndSoil", "mouldMass", "mouldVolume");

/** Wet density in a mould or drive cylinder. Without units it is plain mass over volume, which must then look like a soil. */
export const mouldWet = (gross: Cells, mould: Cells, volume: Cells, massUnit: Cells, volumeUnit: Cells): Cell[][] | CellError =>
  column([
    argument(numberOf("mouldAndSoil"), gross), argument(numberOf("mouldMass"), mould), argument(numberOf("mouldVolume"), volume),
    argument(unitOfMass, massUnit), argument(unitOfVolume, volumeUnit),
  ], (mouldAndSoil, mouldMass, mouldVolume, ofMass, ofVolume) => {
    if (mouldAndSoil <= mouldMass) return refusal(`mass of mould and wet soil ${mouldAndSoil} must be above the mass of the mould ${mouldMass}.`);
    const plain = wetDensity(mouldAndSoil, mouldMass, mouldVolume);
    if (ofMass === null && ofVolume === null) return looksLikeSoil(plain) ? plain : refusal(unitAdvice(plain));
    const mass = ofMass ?? massUnits.find(({ id }) => id === PARTNER_OF_VOLUME[ofVolume!.id])!;
    const space = ofVolume ?? volumeUnits.find(({ id }) => id === PARTNER_OF_MASS[ofMass!.id])!;
    const kgM3 = plain * mass.kg / space.m3;
    if (!isSoil(kgM3)) return refusal(`${mouldAndSoil - mouldMass} ${mass.printed} of soil in ${mouldVolume} ${space.printed} would be ${Number(kgM3.toPrecision(3))} kg/m³, which no soil is: check the units and the readings.`);
    return kgM3 / densityUnit(RESULT_UNIT[space.id] ?? "Mg/m3")!.kgM3;
  });

const isSoil = (kgM3: number): boolean => kgM3 / WATER_KG_M3_AT_20 >= SOIL_OVER_WATER.low && kgM3 / WATER_KG_M3_AT_20 <= SOIL_OVER_WATER.high;
const looksLikeSoil = (density: number): boolean => densityUnits.some((unit) => isSoil(density * unit.kgM3));

/** Names the units that mass over volume looks like, where plain division gives no soil in any. */
function unitAdvice(plain: number): string {
  const pairs = massUnits.flatMap((mass: MassUnit) => volumeUnits.map((space: VolumeUnit) => ({ mass, space, kgM3: plain * mass.kg / space.m3 })));
  const usual = ["g ft3", "kg cm3", "g m3", "kg ft3", "g L", "lb in3", "kg mm3", "g mm3"];
  const likely = pairs.filter(({ kgM3 }) => isSoil(kgM3)).sort((a, b) => rank(a) - rank(b))[0];
  function rank({ mass, space }: { mass: MassUnit; space: VolumeUnit }): number {
    const place = usual.indexOf(`${mass.id} ${space.id}`);
    return place < 0 ? usual.length : place;
  }
  const advice = likely ? ` It looks like ${likely.mass.printed} over ${likely.space.printed}: give "${likely.mass.id}" and "${likely.space.id}" as the units.` : "";
  return `mass over volume is ${Number(plain.toPrecision(4))}, a soil's density in no unit.${advice}`;
}
