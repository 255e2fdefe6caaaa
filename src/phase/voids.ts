import { relation } from "../relations/relation";

const definitions = { title: "definitions of void ratio and porosity", clause: "any text of soil mechanics" };

export const voidRatioFromDensity = relation("voidRatio", "specificGravity * waterDensity / dryDensity - 1", definitions);
export const porosityFromDensity = relation("porosity", "100 * (1 - dryDensity / (specificGravity * waterDensity))", definitions);
