import { relation } from "../relations/relation";

const definitions = { title: "ASTM D698", clause: "use of the maximum dry density: relative compaction" };

export const relativeCompaction = relation("relativeCompaction", "100 * dryDensity / maxDryDensity", definitions);
/** Relative density (density index) of clean sand or gravel; below 0 or above 100 is a finding, not an error. */
export const relativeDensity = relation(
  "relativeDensity", "100 * (dryDensity - minDryDensity) * maxDryDensity / ((maxDryDensity - minDryDensity) * dryDensity)",
  { title: "ASTM D4254", clause: "density index in terms of dry unit weights" });
export const waterRatio = relation("waterRatio", "100 * waterContent / optimumWater", definitions);
/** Distance from optimum in percentage points; positive is wet of optimum. */
export const waterGap = relation("waterGap", "waterContent - optimumWater", definitions);
