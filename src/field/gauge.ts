import { relation } from "../relations/relation";

/** Dry density from a nuclear gauge that reads water as mass a volume: the offset belongs to the soil and the gauge. */
export const dryDensityByGauge = relation(
  "dryDensity", "wetDensity - gaugeWaterMass - gaugeOffset",
  { title: "ASTM D6938", clause: "dry density from wet density and water mass, corrected for the soil" });

/** The same where the gauge shows water in percent: points are added before the dry density is had. */
export const dryDensityByGaugePercent = relation(
  "dryDensity", "wetDensity / (1 + (gaugeWaterPercent + gaugeOffset) / 100)",
  { title: "ASTM D6938", clause: "dry density from wet density and water content, corrected for the soil" });

/** What a gauge's water reading lacks, from an oven-dried sample of the same spot. */
export const offsetOfGauge = relation(
  "gaugeOffset", "wetDensity * waterContent / (100 + waterContent) - gaugeWaterMass",
  { title: "ASTM D6938", clause: "moisture correction by oven-dried samples" });
export const offsetOfGaugePercent = relation("gaugeOffset", "waterContent - gaugeWaterPercent", { title: "ASTM D6938", clause: "moisture correction by oven-dried samples" });
