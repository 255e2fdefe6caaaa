import { couldBeSoil, densityUnit, unitItLooksLike } from "../units/density-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import { refusal, type CellError } from "./cell";
import { wordOf } from "./readers";

/** Systems of units of the site functions, whose lengths and volumes have no unit of their own in the call. */
const systems = ["SI", "US"] as const;
export type System = (typeof systems)[number];

export const systemWord = wordOf("system", systems, "SI");

const UNIT: Readonly<Record<System, string>> = { SI: "Mg/m3", US: "lb/ft3" };

/** Refuses a dry density that is no soil's in the unit of the system, and names the unit that it looks like. */
export function systemGuard(dry: number, system: System): CellError | undefined {
  const expected = densityUnit(UNIT[system])!;
  if (couldBeSoil(dry, expected, WATER_KG_M3_AT_20)) return undefined;
  const really = unitItLooksLike(dry, WATER_KG_M3_AT_20), other = system === "SI" ? "US" : "SI";
  return refusal(`dry density ${dry} cannot be a soil's in ${expected.printed}, the unit of "${system}".${really && really !== expected ? ` It looks like ${really.printed}${really.id === UNIT[other] ? `: choose "${other}"` : ""}.` : ""}`);
}
