import { relativeCompaction, waterGap } from "../field/relative-compaction";
import type { Block, Cell, CellError } from "./cell";
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
