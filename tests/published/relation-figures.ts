import { gainAtEffort, optimumAtEffort, optimumFromPlasticLimit, standardOptimumFromPlasticLimit, standardUnitWeightFromPlasticLimit, unitWeightFromOptimum } from "../../src/compaction/correlations";
import { convertedWetDensity, gapOfRapidMethod } from "../../src/compaction/rapid-method";
import { dryingDaysSi, dryingDaysUs, dryShareOfBlend, moistShareOfBlend, sprayGallons, sprayLitres, waterOfBlend } from "../../src/earthwork/conditioning";
import { curvatureCoefficient, finesThatFill, packedDensity, uniformityCoefficient } from "../../src/earthwork/packing";
import { rollRateSi, rollRateUs } from "../../src/earthwork/rolling";
import { dryDensityByGauge, dryDensityByGaugePercent, offsetOfGauge, offsetOfGaugePercent } from "../../src/field/gauge";
import { densityOfSand, sandInConeFromWeighing } from "../../src/field/sand-replacement";
import { compactiveEffort } from "../../src/compaction/effort";
import { mouldVolumeFromMeasures, waterForBatch, wetDensityInMould } from "../../src/compaction/mould";
import { fineDryDensity, fineWater, wholeDryDensity, wholeWater } from "../../src/compaction/oversize";
import { bankVolumeForFill } from "../../src/earthwork/borrow";
import { bulkingOfSand, looseLift, shrinkOfBank, shrinkOfFill, swellOfBank, swellOfLoose } from "../../src/earthwork/states";
import { waterNeedGallons, waterNeedLitres, waterToSpray } from "../../src/earthwork/water";
import { relativeCompaction, relativeDensity, waterGap, waterRatio } from "../../src/field/relative-compaction";
import { wetDensityBySand, wetDensityOfHole } from "../../src/field/sand-replacement";
import { dryDensityFromWet, wetDensityFromDry } from "../../src/phase/density";
import { airVoidsLine, airVoidsOfPoint, degreeOfSaturation, leastSpecificGravity, saturationLine, saturationWater, zeroAirVoids } from "../../src/phase/lines";
import { porosityFromDensity, voidRatioFromDensity } from "../../src/phase/voids";
import { waterContentFromMasses, waterContentFromWetBasis } from "../../src/phase/water-content";
import { densityOfWater } from "../../src/units/water-density";
import type { AnyRelation } from "../relations-of-all-rooms";

/** One printed figure: it must come out within half a unit of the last digit printed. */
export interface Figure {
  readonly relation: AnyRelation;
  readonly inputs: Readonly<Record<string, number>>;
  readonly says: string;
  readonly source: string;
  /** half a unit of the last digit, unless the source's own rounding is coarser and is stated here */
  readonly within?: number;
}

const as = (relation: unknown): AnyRelation => relation as AnyRelation;

const handbook = "Geotechnical Engineering: Soil and Foundation Principles and Practice, table 13.1, water 62.4 lb/ft3";
/** Rows: water content. Columns: specific gravity 2.5, 2.6, 2.65, 2.7, 3.0. The 0 % row and 45 further entries. */
const ZERO_AIR_VOIDS_TABLE: readonly (readonly [number, ...string[]])[] = [
  [0, "156.0", "162.2", "165.4", "168.5", "187.2"],
  [5, "138.7", "143.6", "146.0", "148.4", "162.8"],
  [10, "124.8", "128.8", "130.7", "132.7", "144.0"],
  [15, "113.5", "116.7", "118.3", "119.9", "129.1"],
  [20, "104.0", "106.7", "108.1", "109.4", "117.0"],
  [25, "96.0", "98.3", "99.5", "100.6", "107.0"],
  [30, "89.1", "91.1", "92.1", "93.1", "98.5"],
  [40, "78.0", "79.5", "80.3", "81.0", "85.1"],
  [50, "69.3", "70.5", "71.1", "71.7", "74.9"],
];
const GRAVITIES = [2.5, 2.6, 2.65, 2.7, 3.0];

const zeroAirVoidsFigures: Figure[] = ZERO_AIR_VOIDS_TABLE.flatMap(([waterContent, ...row]) => row.map((says, i) => ({
  relation: as(zeroAirVoids), inputs: { waterContent, specificGravity: GRAVITIES[i]!, waterDensity: 62.4 }, says, source: handbook,
})));

const cipm = "CIPM 2001 (Metrologia 38, 301), check values in kg/m3";
const waterDensityFigures: Figure[] = ([[4, "999.9749"], [5, "999.9668"], [10, "999.7027"], [15, "999.1026"], [20, "998.2067"], [25, "997.0470"], [30, "995.6488"]] as const)
  .map(([temperature, says]) => ({ relation: as(densityOfWater), inputs: { temperature }, says, source: cipm }));

const POUND = 0.45359237, INCH = 25.4, CUBIC_FOOT = 28316.846592;
const efforts: Figure[] = [
  ["ASTM D698 methods A and B", 5.5 * POUND, 12 * INCH, 25, 3, CUBIC_FOOT / 30, "592.5"],
  ["ASTM D698 method C", 5.5 * POUND, 12 * INCH, 56, 3, 0.075 * CUBIC_FOOT, "589.9"],
  ["ASTM D1557 methods A and B", 10 * POUND, 18 * INCH, 25, 5, CUBIC_FOOT / 30, "2693.3"],
  ["ASTM D1557 method C", 10 * POUND, 18 * INCH, 56, 5, 0.075 * CUBIC_FOOT, "2681.3"],
  ["BS 1377-4, 2.5 kg rammer, one-litre mould", 2.5, 300, 27, 3, 1000, "595.8"],
  ["BS 1377-4, 2.5 kg rammer, CBR mould", 2.5, 300, 62, 3, 2305, "593.5"],
  ["IS 2720-7 light compaction", 2.6, 310, 25, 3, 1000, "592.8"],
  ["IS 2720-8 heavy compaction", 4.9, 450, 25, 5, 1000, "2703.0"],
].map(([source, rammerMass, drop, blows, layers, mouldVolume, says]) => ({
  relation: as(compactiveEffort), inputs: { rammerMass, drop, blows, layers, mouldVolume } as Record<string, number>, says: says as string, source: `${source as string}, compactive effort from its own apparatus`,
}));

const text9 = "Principles of Geotechnical Engineering, 9th edition";
const sheetG = "published BS 1377 laboratory sheet (set G)";

export const figures: readonly Figure[] = [
  ...zeroAirVoidsFigures,
  ...waterDensityFigures,
  ...efforts,
  { relation: as(dryDensityFromWet), inputs: { wetDensity: 124.5, waterContent: 10.6 }, says: "112.57", source: `${text9}, problem 6.4, recomputed (the source truncates to 112.5)` },
  { relation: as(dryDensityFromWet), inputs: { wetDensity: 111, waterContent: 8.6 }, says: "102.2", source: `${text9}, problem 6.4` },
  { relation: as(dryDensityFromWet), inputs: { wetDensity: 124, waterContent: 13.7 }, says: "109.06", source: `${text9}, problem 6.5` },
  { relation: as(wetDensityFromDry), inputs: { dryDensity: 15.725, waterContent: 13 }, says: "17.77", source: `${text9}, problem 6.14, moist unit weight` },
  { relation: as(relativeCompaction), inputs: { dryDensity: 109.06, maxDryDensity: 125.0 }, says: "87.2", source: `${text9}, problem 6.5` },
  { relation: as(relativeCompaction), inputs: { dryDensity: 16.341, maxDryDensity: 16.9 }, says: "96.69", source: `${text9}, problem 6.12` },
  { relation: as(degreeOfSaturation), inputs: { dryDensity: 120.63, waterContent: 14.9, specificGravity: 2.69, waterDensity: 62.4 }, says: "102.4", source: `${text9}, problem 6.4: the fourth point is impossible`, within: 0.15 },
  { relation: as(voidRatioFromDensity), inputs: { dryDensity: 125.0, specificGravity: 2.69, waterDensity: 62.4 }, says: "0.343", source: `${text9}, problem 6.5` },
  { relation: as(porosityFromDensity), inputs: { dryDensity: 125.0, specificGravity: 2.69, waterDensity: 62.4 }, says: "25.5", source: `${text9}, problem 6.5: e/(1+e) of the void ratio 0.343` },
  { relation: as(leastSpecificGravity), inputs: { dryDensity: 120.63, waterContent: 14.9, waterDensity: 62.4 }, says: "2.715", source: `${text9}, problem 6.4: derived from the impossible point` , within: 0.003 },
  { relation: as(saturationWater), inputs: { dryDensity: 107.0, specificGravity: 3.0, waterDensity: 62.4 }, says: "25.0", source: `${handbook}, read backwards` },
  ...([[3168, 10, 11.3, 62.1], [3300, 11, 4.5, 82.7], [3334, 12, 1.9, 92.6], [3320, 14, 0.4, 98.6]] as const).map(([gross, ...rest]) => [(gross - 1125) / 1000 / (1 + rest[0] / 100), ...rest] as const).flatMap(([dryDensity, waterContent, air, saturation]) => [
    { relation: as(airVoidsOfPoint), inputs: { dryDensity, waterContent, specificGravity: 2.65, waterDensity: 1 }, says: air.toFixed(1), source: "exercise of a UK soil-mechanics text (set A): air voids of its points, recomputed" },
    { relation: as(degreeOfSaturation), inputs: { dryDensity, waterContent, specificGravity: 2.65, waterDensity: 1 }, says: saturation.toFixed(1), source: "the same (set A): degree of saturation, recomputed" },
  ]),
  // the lines themselves, through the same exercise read backwards: the density at the printed air voids and saturation
  { relation: as(airVoidsLine), inputs: { waterContent: 11, specificGravity: 2.65, airVoids: 4.5, waterDensity: 1 }, says: "1.959", source: "the same (set A), read backwards", within: 0.002 },
  { relation: as(airVoidsLine), inputs: { waterContent: 0, specificGravity: 3, airVoids: 50, waterDensity: 62.4 }, says: "93.6", source: `${handbook}: half of 187.2, as half the volume is air; derived` },
  { relation: as(saturationLine), inputs: { waterContent: 11, specificGravity: 2.65, saturation: 82.7, waterDensity: 1 }, says: "1.959", source: "the same (set A), read backwards", within: 0.002 },
  ...([[70, 65.3, 27], [60, 55.6, 24.6], [54, 49.7, 24]] as const).map(([wetMass, dryMass, tare], i) => ({
    relation: as(waterContentFromMasses), inputs: { wetMass, dryMass, tare }, says: ["12.27", "14.19", "16.73"][i]!, source: `${sheetG}: one tin, derived from its masses` })),
  { relation: as(waterContentFromMasses), inputs: { wetMass: 601.7, dryMass: 577.9, tare: 39.6 }, says: "4.42", source: "municipal D1557 record (set O), first point" },
  { relation: as(waterContentFromMasses), inputs: { wetMass: 511.0, dryMass: 479.3, tare: 38.4 }, says: "7.19", source: "the same, second point" },
  ...([[5, "5.26"], [8, "8.70"], [10, "11.11"], [12, "13.64"], [15, "17.65"], [18, "21.95"], [25, "33.33"]] as const).map(([wetBasisWater, says]) => ({
    relation: as(waterContentFromWetBasis), inputs: { wetBasisWater }, says, source: "AASHTO T 217: reading on wet mass to water content, derived from its formula" })),
  { relation: as(wetDensityInMould), inputs: { mouldAndSoil: 3168, mouldMass: 1125, mouldVolume: 1000 }, says: "2.043", source: "exercise of a UK soil-mechanics text (set A), first point" },
  { relation: as(wetDensityInMould), inputs: { mouldAndSoil: 4231, mouldMass: 2015, mouldVolume: 1017.6 }, says: "2.178", source: `${sheetG}, third point: 1.86 dry at 17.10 %` },
  { relation: as(wholeDryDensity), inputs: { fineDryDensity: 1.97, stonePercent: 10, stoneGravity: 2.73, waterDensity: 1 }, says: "2.03", source: "exercise of a UK soil-mechanics text (set A), part 2" },
  { relation: as(wholeDryDensity), inputs: { fineDryDensity: 134.0, stonePercent: 9.4, stoneGravity: 2.7, waterDensity: 62.4 }, says: "136.63", source: "municipal D1557 record (set O), recomputed (it prints 136.5, to the nearest 0.5)" },
  { relation: as(wholeDryDensity), inputs: { fineDryDensity: 120.0, stonePercent: 15, stoneGravity: 2.65, waterDensity: 62.4 }, says: "125.15", source: "derived from ASTM D4718" },
  { relation: as(wholeDryDensity), inputs: { fineDryDensity: 118.0, stonePercent: 25, stoneGravity: 2.6, waterDensity: 62.4 }, says: "126.63", source: "derived from ASTM D4718" },
  { relation: as(fineDryDensity), inputs: { wholeDryDensity: 125.15, stonePercent: 15, stoneGravity: 2.65, waterDensity: 62.4 }, says: "120.0", source: "the same, read backwards" },
  { relation: as(wholeWater), inputs: { fineWater: 12.0, stonePercent: 15, stoneWater: 2.0 }, says: "10.5", source: "a state's copy of AASHTO T 224: (12.0 x 85 + 2.0 x 15) / 100" },
  { relation: as(wholeWater), inputs: { fineWater: 7.5, stonePercent: 9.4, stoneWater: 1.0 }, says: "6.89", source: "municipal D1557 record (set O), recomputed (it prints 7.0, to the nearest 0.5)" },
  { relation: as(fineWater), inputs: { wholeWater: 10.5, stonePercent: 15, stoneWater: 2.0 }, says: "12.0", source: "the same, read backwards" },
  ...([[16.341, 14.2, 16.9, "82.0"], [15.98, 13.8, 17, "72.5"], [15.725, 15.4, 18.5, "12.3"]] as const).map(([dryDensity, minDryDensity, maxDryDensity, says]) => ({
    relation: as(relativeDensity), inputs: { dryDensity, minDryDensity, maxDryDensity }, says, source: `${text9}, problems 6.12 to 6.14` })),
  { relation: as(waterRatio), inputs: { waterContent: 12, optimumWater: 13.5 }, says: "88.9", source: "derived from its definition" },
  { relation: as(wetDensityBySand), inputs: { soilMass: 8.11, sandUsed: 7.0, sandInCone: 0.53, sandDensity: 99.0 }, says: "124.09", source: "published sand-cone problem: sand of 99.0 lb/ft3, hole 0.065354 ft3; derived, as it is unsolved there" },
  { relation: as(wetDensityOfHole), inputs: { soilMass: 8.11, holeVolume: 0.065354 }, says: "124.09", source: "the same, from the volume of its hole" },
  { relation: as(mouldVolumeFromMeasures), inputs: { mouldDiameter: 101.175, mouldHeight: 116.2 }, says: "934205.5", source: "student report after D698 (set H): 934 205.5 mm3", within: 0.3 },
  { relation: as(mouldVolumeFromMeasures), inputs: { mouldDiameter: 10.5, mouldHeight: 11.55 }, says: "1000.1", source: "BS 1377-4 one-litre mould, derived" },
  { relation: as(waterForBatch), inputs: { moistMass: 1000, waterContent: 5, targetWater: 11 }, says: "57.14", source: "derived: 952.4 g of dry soil and six points" },
  { relation: as(swellOfBank), inputs: { bankDryDensity: 1, looseDryDensity: 0.8 }, says: "25.0", source: "FM 5-434: dry earth, swell 25 %, load factor 0.80" },
  { relation: as(swellOfLoose), inputs: { bankDryDensity: 1, looseDryDensity: 0.8 }, says: "20.0", source: "the same, of the loose volume: 1 - 0.80" },
  { relation: as(shrinkOfBank), inputs: { bankDryDensity: 0.9, fillDryDensity: 1 }, says: "10.0", source: "FM 5-434: common earth, bank to compacted 0.90" },
  { relation: as(shrinkOfFill), inputs: { bankDryDensity: 0.9, fillDryDensity: 1 }, says: "11.1", source: "the same: compacted to bank 1.11" },
  { relation: as(looseLift), inputs: { thickness: 1, fillDryDensity: 1 / 0.9, looseDryDensity: 1 / 1.25 }, says: "1.39", source: "FM 5-434: common earth, compacted to loose 1.39 from its 1.25 and 0.90" },
  { relation: as(bulkingOfSand), inputs: { moistDryDensity: 160, looseDryDensity: 200 }, says: "25.0", source: "IS 2386-3 example: 200 mm moist, 160 mm flooded" },
  ...([[20, "1.9950", "1.9551", -2], [0, "2.0496", "2.0906", 2]] as const).map(([, says, wetDensity, addedWaterShare]) => ({
    relation: as(convertedWetDensity), inputs: { wetDensity: Number(wetDensity), addedWaterShare }, says, source: "exact rapid-method check made for the purpose: true curve 1.80 - 0.0035 (w - 15.5)^2, fill at 14 %; derived" })),
  { relation: as(gapOfRapidMethod), inputs: { peakAddedWater: 1.31579, waterContent: 14 }, says: "-1.500", source: "the same: the optimum is 1.50 points wetter than the fill" },
  { relation: as(optimumFromPlasticLimit), inputs: { plasticLimit: 22, compactiveEffort: 2700 }, says: "14.2", source: "Gurtug and Sridharan (2004), PL 22, modified; recomputed", within: 0.03 },
  ...([[480, "30.7", "12.93"], [600, "29.5", "13.22"], [720, "28.5", "13.46"], [1200, "25.7", "14.16"]] as const).flatMap(([compactiveEffort, says, weight]) => [
    { relation: as(optimumFromPlasticLimit), inputs: { plasticLimit: 33, compactiveEffort }, says, source: "Gurtug and Sridharan (2004), PL 33 by blows; recomputed" },
    { relation: as(unitWeightFromOptimum), inputs: { optimumWater: Number(says) }, says: weight, source: "Gurtug and Sridharan (2004), PL 33 by blows; recomputed", within: 0.011 },
  ]),
  { relation: as(standardOptimumFromPlasticLimit), inputs: { plasticLimit: 20 }, says: "18.4", source: "Sridharan and Nagaraj (2005), PL 20; recomputed" },
  { relation: as(standardUnitWeightFromPlasticLimit), inputs: { plasticLimit: 20 }, says: "16.86", source: "Sridharan and Nagaraj (2005), PL 20; recomputed" },
  { relation: as(optimumAtEffort), inputs: { optimumWater: 20, liquidLimit: 45, compactiveEffort: 592.5, otherEffort: 2693.3 }, says: "14.87", source: "Blotz and others (1998), LL 45, standard to modified: -5.1 points; derived to two digits" },
  { relation: as(gainAtEffort), inputs: { liquidLimit: 45, compactiveEffort: 592.5, otherEffort: 2693.3 }, says: "1.85", source: "Blotz and others (1998), LL 45, standard to modified: +1.85 kN/m3" },
  { relation: as(dryDensityByGauge), inputs: { wetDensity: 125.0, gaugeWaterMass: 13.4, gaugeOffset: 0.5 }, says: "111.1", source: "instrument manual: dry is wet less moisture, with the moisture corrected; derived" },
  { relation: as(dryDensityByGaugePercent), inputs: { wetDensity: 2.05, gaugeWaterPercent: 12, gaugeOffset: 0.5 }, says: "1.8222", source: "definition of dry density with the corrected water content; derived" },
  { relation: as(offsetOfGauge), inputs: { wetDensity: 125.0, waterContent: 12.5, gaugeWaterMass: 13.4 }, says: "0.4889", source: "ASTM D6938: mass of water by oven, 125 x 12.5 / 112.5 = 13.889, less that of the gauge; derived" },
  { relation: as(offsetOfGaugePercent), inputs: { waterContent: 12.5, gaugeWaterPercent: 11.2 }, says: "1.3", source: "difference of the two; derived" },
  { relation: as(densityOfSand), inputs: { containerAndSand: 11.3, containerMass: 8.0, containerVolume: 1 / 30 }, says: "99.0", source: "published sand-cone problem: a mould of 1/30 ft3 holds 3.30 lb" },
  { relation: as(sandInConeFromWeighing), inputs: { bottleBefore: 7.53, bottleAfter: 7.0 }, says: "0.53", source: "the same: 0.53 lb in the cone" },
  { relation: as(sprayLitres), inputs: { thickness: 200, dryDensity: 1.8, waterContent: 10, targetWater: 12 }, says: "7.20", source: "2 points in a 200 mm lift at 1.80 are 7.2 L/m2: common practice, no published source" },
  { relation: as(sprayGallons), inputs: { thickness: 36, dryDensity: 110, waterContent: 10, targetWater: 11 }, says: "3.559", source: "one yard deep it is the 3.56 gal/yd3 of 27 ft3 and 8.345 lb a US gallon: derived" },
  { relation: as(dryingDaysSi), inputs: { thickness: 200, dryDensity: 1.8, waterContent: 12, targetWater: 10, evaporation: 4 }, says: "1.80", source: "7.2 mm of water at 4 mm a day: derived" },
  { relation: as(dryingDaysUs), inputs: { thickness: 8, dryDensity: 112.32, waterContent: 12, targetWater: 10, evaporation: 0.16 }, says: "1.800", source: "the same in US units: 8 in at 1.8 times 62.4 lb/ft3, 0.288 in of water at 0.16 in a day: derived" },
  { relation: as(waterOfBlend), inputs: { firstMass: 100, firstWater: 10, secondMass: 50, secondWater: 25 }, says: "14.583", source: "90.909 and 40 of dry soil, 19.091 of water: derived" },
  { relation: as(dryShareOfBlend), inputs: { firstWater: 10, secondWater: 25, targetWater: 14.58333 }, says: "30.556", source: "the same: 40 of 130.909 dry" },
  { relation: as(moistShareOfBlend), inputs: { firstWater: 10, secondWater: 25, targetWater: 14.58333 }, says: "33.333", source: "the same: 50 of 150 moist" },
  { relation: as(finesThatFill), inputs: { coarseDryDensity: 1.6, coarseGravity: 2.65, finesDryDensity: 1.3, waterDensity: 1 }, says: "24.353", source: "voids of 39.623 % filled at 1.3 beside 1.6 of coarse soil: derived" },
  { relation: as(packedDensity), inputs: { coarseDryDensity: 1.6, coarseGravity: 2.65, finesDryDensity: 1.3, waterDensity: 1 }, says: "2.1151", source: "the same" },
  { relation: as(uniformityCoefficient), inputs: { sixtyPercentSize: 2.4, tenPercentSize: 0.15 }, says: "16.0", source: "ASTM D2487, definition; derived" },
  { relation: as(curvatureCoefficient), inputs: { thirtyPercentSize: 0.9, sixtyPercentSize: 2.4, tenPercentSize: 0.15 }, says: "2.250", source: "ASTM D2487, definition: 0.81 / 0.36; derived" },
  { relation: as(rollRateUs), inputs: { drumWidth: 8, rollerSpeed: 3, thickness: 6, efficiency: 250 / 3, rollerPasses: 4 }, says: "489", source: "FM 5-434 example: 8 ft, 3 mph, 6 in, 50-minute hour, 4 passes give 489 yd3 an hour" },
  { relation: as(rollRateSi), inputs: { drumWidth: 2, rollerSpeed: 4, thickness: 200, efficiency: 75, rollerPasses: 6 }, says: "200.0", source: "the same relation in metres: 1000 x 2 x 4 x 0.2 x 0.75 / 6; derived" },
  { relation: as(waterGap), inputs: { waterContent: 13.7, optimumWater: 12.5 }, says: "1.2", source: `${text9}, problems 6.4 and 6.5: field water against the water content of the highest point` },
  { relation: as(waterNeedLitres), inputs: { volume: 1, dryDensity: 1.8, waterContent: 10, targetWater: 11 }, says: "18", source: "18 L per m3 for 1.8 t/m3 and one point: common practice, no published source" },
  { relation: as(waterNeedLitres), inputs: { volume: 960000, dryDensity: 1.85, waterContent: 8, targetWater: 11.6 }, says: "63936000", source: "published problem: 960 000 m3, 3.6 points at 1.85 t/m3 give 63 936 m3 of water" },
  { relation: as(waterNeedGallons), inputs: { volume: 1, dryDensity: 110, waterContent: 10, targetWater: 11 }, says: "3.56", source: "27 ft3 a yd3 and 8.345 lb a US gallon: derived" },
  { relation: as(waterToSpray), inputs: { waterNeed: 90, loss: 10 }, says: "100.00", source: "loss as share of what is sprayed: derived from its definition" },
  { relation: as(bankVolumeForFill), inputs: { fillVolume: 100, fillDryDensity: 18, bankDryDensity: 17, loss: 0 }, says: "105.88", source: "highway engineering text: 17 to 18 kN/m3, 100 m3 of fill" },
  { relation: as(bankVolumeForFill), inputs: { fillVolume: 75000, fillDryDensity: 1790, bankDryDensity: 1540, loss: 0 }, says: "87175", source: "published problem: 75 000 m3 of fill, had 1540 kg/m3 been dry", within: 1 },
  { relation: as(bankVolumeForFill), inputs: { fillVolume: 90, fillDryDensity: 18, bankDryDensity: 18, loss: 10 }, says: "100.00", source: "loss as share of the bank volume: derived from its definition" },
];

/** Half a unit of the last digit printed, or the tolerance that the figure states. */
export const tolerance = ({ says, within }: Figure): number => within ?? 0.5 * 10 ** -(says.split(".")[1]?.length ?? 0) * (1 + 1e-9);
