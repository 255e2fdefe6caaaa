import { densityUnit, densityUnits, unitItLooksLike } from "../../src/units/density-units";
import { WATER_KG_M3_AT_20 } from "../../src/units/water-density";

// exact definitions: 1 lb = 0.45359237 kg, 1 ft = 0.3048 m, standard gravity 9.80665 m/s2 (NIST SP 811, appendix B)
test.each([["lb/ft3", 16.01846], ["kN/m3", 101.9716], ["Mg/m3", 1000], ["kg/m3", 1], ["lb/yd3", 0.593276]] as const)("1 %s is %d kg/m3", (id, kgM3) => expect(densityUnit(id)!.kgM3).toBeCloseTo(kgM3, 4));
test("1 kN/m3 is 6.36588 lbf/ft3 (NIST SP 811)", () => expect(densityUnit("kN/m3")!.kgM3 / densityUnit("pcf")!.kgM3).toBeCloseTo(6.36588, 5));
test.each([["g/cc", "Mg/m3"], ["Kn / M^3", "kN/m3"], ["kN/m³", "kN/m3"], ["PCF", "lb/ft3"], ["lbs per cu.ft", "lb/ft3"], ["t/m³", "Mg/m3"], ["kg/m**3", "kg/m3"]])("%s is %s", (spelt, id) => expect(densityUnit(spelt)?.id).toBe(id));
test("what is no unit of density is none", () => { for (const text of ["", "kPa", "m3", "lb", "%"]) expect(densityUnit(text)).toBeUndefined(); });
test("no spelling stands for two units", () => {
  const all = densityUnits.flatMap((unit) => unit.spellings);
  expect(new Set(all).size).toBe(all.length);
});
test.each([[1.8, "Mg/m3"], [18, "kN/m3"], [115, "lb/ft3"], [1800, "kg/m3"]])("%d looks like %s", (density, id) => expect(unitItLooksLike(density, WATER_KG_M3_AT_20)?.id).toBe(id));
