import { SOIL_OVER_WATER, unitItLooksLike, unitOfWater } from "../units/density-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import { refusal, type CellError } from "./cell";

/** Refuses a dry density that no soil has beside this density of water, and names the unit that it looks like. */
export function unitGuard(dryDensity: number, water: number, where = ""): CellError | undefined {
  const ratio = dryDensity / water;
  if (ratio >= SOIL_OVER_WATER.low && ratio <= SOIL_OVER_WATER.high) return undefined;
  const taken = unitOfWater(water, WATER_KG_M3_AT_20);
  const looks = unitItLooksLike(dryDensity, WATER_KG_M3_AT_20);
  const advice = looks && looks !== taken
    ? `It looks like ${looks.printed}: give "${looks.id}" as the density of water.`
    : "Check the figure and its unit.";
  return refusal(`${where}dry density ${dryDensity} cannot be a soil's in ${taken?.printed ?? "this unit"}. ${advice}`);
}

/** Refuses a pair of densities that cannot be in one unit. */
export function sameUnitGuard(a: number, aName: string, b: number, bName: string, low: number, high: number): CellError | undefined {
  const ratio = a / b;
  if (ratio >= low && ratio <= high) return undefined;
  return refusal(`${aName} ${a} and ${bName} ${b} differ too much to be in one unit; give both in the same unit.`);
}
