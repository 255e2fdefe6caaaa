import { relation } from "../relations/relation";

const definitions = { title: "definitions of dry density and water content", clause: "any text of soil mechanics; as in ASTM D698, calculation" };

export const dryDensityFromWet = relation("dryDensity", "wetDensity / (1 + waterContent / 100)", definitions);
export const wetDensityFromDry = dryDensityFromWet.solvedFor("wetDensity");
