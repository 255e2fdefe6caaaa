import { dryDensityByGauge, dryDensityByGaugePercent, offsetOfGauge, offsetOfGaugePercent } from "../field/gauge";
import { densityOfSand, sandInConeFromWeighing } from "../field/sand-replacement";
import { mean } from "../lots/within-limits";
import { CellError, notEnough, refusal, type Block, type Cell } from "./cell";
import { argument, column } from "./column";
import { numberOf, wordOf } from "./readers";
import { relationColumn } from "./relation-column";
import { single } from "./single";

type Cells = Block | null;

const kinds = wordOf("kind", ["mass", "percent"], "mass");
const byMass = dryDensityByGauge.by("wetDensity", "gaugeWaterMass", "gaugeOffset"), byPercent = dryDensityByGaugePercent.by("wetDensity", "gaugeWaterPercent", "gaugeOffset");

/** A gauge's water as mass a volume, or as percent: both are told apart by their word, and a mass that is no mass is refused. */
export const gaugeDry = (wet: Cells, gaugeWater: Cells, offset: Cells, kind: Cells): Cell[][] | CellError => {
  const word = single(kinds, kind);
  if (word instanceof CellError) return word;
  const water = argument(numberOf(word === "mass" ? "gaugeWaterMass" : "gaugeWaterPercent"), gaugeWater);
  return column([argument(numberOf("wetDensity"), wet), water, argument(numberOf("gaugeOffset"), offset)], (density, reading, off) => {
    if (word === "percent") return reading + off < 0 ? refusal(`the water content ${reading} with its offset ${off} is below zero: check the sign of the offset.`) : byPercent(density, reading, off);
    if (reading + off >= density * MOST_WATER) return refusal(`a water mass of ${reading} (offset ${off}) in a wet density of ${density} is no soil's: give percents with the kind "percent", and check the unit.`);
    return reading + off < 0 ? refusal(`the water mass ${reading} with its offset ${off} is below zero: check the sign of the offset.`) : byMass(density, reading, off);
  });
};

/** No soil is more water than this share of its mass by a gauge. Common practice, no published source. */
const MOST_WATER = 0.7;

/** Mean offset from tests whose water was had both ways. */
export function gaugeOffset(wet: Cells, gaugeWater: Cells, ovenWater: Cells, kind: Cells): Cell[][] | CellError {
  const word = single(kinds, kind);
  if (word instanceof CellError) return word;
  const rows = word === "mass"
    ? relationColumn(offsetOfGauge, { wetDensity: wet, waterContent: ovenWater, gaugeWaterMass: gaugeWater })
    : relationColumn(offsetOfGaugePercent, { waterContent: ovenWater, gaugeWaterPercent: gaugeWater });
  if (rows instanceof CellError) return rows;
  const values: number[] = [];
  for (const [i, row] of rows.entries()) for (const value of row) {
    if (value instanceof CellError) return rows.length > 1 ? refusal(`row ${i + 1} of the ranges: ${value.says}`) : value;
    if (typeof value === "number") values.push(value);
  }
  return values.length === 0 ? notEnough("There is no pair of gauge and oven water.") : [[mean(values)]];
}

export const sandDensityColumn = (full: Cells, empty: Cells, volume: Cells): Cell[][] | CellError =>
  relationColumn(densityOfSand, { containerAndSand: full, containerMass: empty, containerVolume: volume }, {
    guard: ({ containerAndSand, containerMass }) => containerAndSand! > containerMass! ? undefined : refusal(`mass of container and sand ${containerAndSand} must be above the mass of the empty container ${containerMass}.`),
  });

export const sandInConeColumn = (before: Cells, after: Cells): Cell[][] | CellError =>
  relationColumn(sandInConeFromWeighing, { bottleBefore: before, bottleAfter: after }, {
    guard: ({ bottleBefore, bottleAfter }) => bottleBefore! > bottleAfter! ? undefined : refusal(`mass before ${bottleBefore} must be above the mass after ${bottleAfter}: sand ran out of the bottle.`),
  });

