import { relation } from "../relations/relation";

const correction = { title: "ASTM D4718 and AASHTO T 224", clause: "correction of unit weight and water content for oversize" };

/** Dry density of the whole soil from that of its fine fraction; the oversize by dry mass, its gravity bulk and oven-dry. */
export const wholeDryDensity = relation(
  "wholeDryDensity", "100 / ((100 - stonePercent) / fineDryDensity + stonePercent / (waterDensity * stoneGravity))", correction);
export const fineDryDensity = wholeDryDensity.solvedFor("fineDryDensity");

/** Water content of the whole soil from those of its fractions. */
export const wholeWater = relation("wholeWater", "((100 - stonePercent) * fineWater + stonePercent * stoneWater) / 100", correction);
export const fineWater = wholeWater.solvedFor("fineWater");
