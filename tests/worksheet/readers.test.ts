import { CellError } from "../../src/worksheet/cell";
import { unitOf, waterDensity, wordOf } from "../../src/worksheet/readers";
import { sameUnitGuard, unitGuard } from "../../src/worksheet/unit-guard";

describe("density of water", () => {
  test.each([[1, 1], [9.81, 9.81], [10, 10], [62.4, 62.4], [62.3, 62.3], [1000, 1000], [0.998, 0.998]])("the number %d is taken as it stands", (given, expected) => expect(waterDensity.read(given)).toBe(expected));
  // CIPM 2001 at 20 °C: 998.2067 kg/m3, 9.7891 kN/m3, 62.316 lb/ft3 (reference table)
  test.each([["Mg/m3", 0.9982067, 7], ["t/m³", 0.9982067, 7], ["g/cm^3", 0.9982067, 7], ["KG/M3", 998.2067, 4], ["kN/m³", 9.7891, 4], ["lb/ft3", 62.316, 3], [" pcf ", 62.316, 3]] as const)("the unit %s stands for water at 20 °C", (unit, expected, digits) =>
    expect(waterDensity.read(unit)).toBeCloseTo(expected, digits - 1));
  test("left out, it is Mg/m3", () => expect(waterDensity.leftOut).toBeCloseTo(0.9982067, 7));
  test.each([20, 0, -1, 2.7, 100, NaN, "furlong", true])("%p is refused", (given) => expect(waterDensity.read(given)).toBeInstanceOf(CellError));
  test("the refusal of a number names what fits", () => expect((waterDensity.read(20) as CellError).says).toMatch(/62\.4 lb\/ft³/));
});

describe("words and units", () => {
  test("words are case-free, and a wrong one lists the choices", () => {
    const system = wordOf("system", ["SI", "US"], "SI");
    expect(system.read(" us ")).toBe("US");
    expect(system.read("metric")).toEqual(expect.objectContaining({ says: 'system "metric" is not one of "SI", "US".' }));
    expect(system.read(3)).toBeInstanceOf(CellError);
  });
  test("an unknown unit lists the choices", () => expect((unitOf("unit").read("stone/bushel") as CellError).says).toMatch(/Mg\/m3, kg\/m3, kN\/m3, lb\/ft3/));
  test("an error passes through", () => {
    const error = new CellError("#REF!", "");
    expect(unitOf("unit").read(error)).toBe(error);
    expect(waterDensity.read(error)).toBe(error);
    expect(wordOf("system", ["SI"]).read(error)).toBe(error);
  });
});

describe("unit guard", () => {
  test.each([[1.8, 1], [18, 9.81], [115, 62.4], [1800, 1000], [0.41, 1], [3.4, 1]])("%d beside water %d is a soil", (dry, water) => expect(unitGuard(dry, water)).toBeUndefined());
  test.each([[115, 1, /lb\/ft³/], [18, 1, /kN\/m³/], [1800, 1, /kg\/m³/], [1.8, 62.4, /Mg\/m³/], [0.3, 1, /Check the figure/], [0.02, 1, /Check the figure/]] as const)("%d beside water %d is refused, and the likely unit named", (dry, water, says) =>
    expect(unitGuard(dry, water)!.says).toMatch(says));
  test("two densities of one unit", () => {
    expect(sameUnitGuard(1.8, "a", 1.9, "b", 0.5, 1.5)).toBeUndefined();
    expect(sameUnitGuard(115, "a", 1.9, "b", 0.5, 1.5)!.says).toMatch(/one unit/);
  });
});
