import { relation } from "../relations/relation";

const definitions = { title: "ASTM D698", clause: "use of the maximum dry density: relative compaction" };

export const relativeCompaction = relation("relativeCompaction", "100 * dryDensity / maxDryDensity", definitions);
/** Distance from optimum in percentage points; positive is wet of optimum. */
export const waterGap = relation("waterGap", "waterContent - optimumWater", definitions);
