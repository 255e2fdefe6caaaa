import { relativeCompaction, relativeDensity, waterGap, waterRatio } from "../field/relative-compaction";
import { wetDensityBySand, wetDensityOfHole } from "../field/sand-replacement";
import { refusal, type Block, type Cell, type CellError } from "./cell";
import { relationColumn } from "./relation-column";
import { sameUnitGuard } from "./unit-guard";

type Cells = Block | null;

/** Relative compaction outside these ratios is two units or two soils; no fill is that loose or that dense. Common practice, no published source. */
const RATIO = { low: 0.5, high: 1.5 } as const;

export const relativeCompactionColumn = (dry: Cells, maxDry: Cells): Cell[][] | CellError =>
  relationColumn(relativeCompaction, { dryDensity: dry, maxDryDensity: maxDry }, {
    guard: ({ dryDensity, maxDryDensity }) => sameUnitGuard(dryDensity!, "dry density", maxDryDensity!, "maximum dry density", RATIO.low, RATIO.high),
  });

export const waterGapColumn = (waterContent: Cells, optimum: Cells): Cell[][] | CellError =>
  relationColumn(waterGap, { waterContent, optimumWater: optimum });

export const waterRatioColumn = (waterContent: Cells, optimum: Cells): Cell[][] | CellError =>
  relationColumn(waterRatio, { waterContent, optimumWater: optimum }, { guard: ({ optimumWater }) => optimumWater! > 0 ? undefined : refusal("optimum water content must be above 0.") });

export const relativeDensityColumn = (dry: Cells, minDry: Cells, maxDry: Cells): Cell[][] | CellError =>
  relationColumn(relativeDensity, { dryDensity: dry, minDryDensity: minDry, maxDryDensity: maxDry }, {
    guard: ({ dryDensity, minDryDensity, maxDryDensity }) => maxDryDensity! <= minDryDensity!
      ? refusal(`maximum dry density ${maxDryDensity} must be above the minimum dry density ${minDryDensity}.`)
      : sameUnitGuard(dryDensity!, "dry density", maxDryDensity!, "maximum dry density", RATIO.low, RATIO.high) ?? sameUnitGuard(minDryDensity!, "minimum dry density", maxDryDensity!, "maximum dry density", RATIO.low, 1),
  });

export const sandConeColumn = (soilMass: Cells, sandUsed: Cells, sandInCone: Cells, sandDensity: Cells): Cell[][] | CellError =>
  relationColumn(wetDensityBySand, { soilMass, sandUsed, sandInCone, sandDensity }, {
    guard: ({ sandUsed: used, sandInCone: cone }) => used! > cone! ? undefined : refusal(`mass of sand used ${used} must be above the mass of sand in the cone ${cone}.`),
  });

export const holeWetColumn = (soilMass: Cells, holeVolume: Cells): Cell[][] | CellError => relationColumn(wetDensityOfHole, { soilMass, holeVolume });
