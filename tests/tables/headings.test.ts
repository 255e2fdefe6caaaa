import { meanings, readUnit, splitHeading } from "../../src/tables/headings";
import type { Role } from "../../src/tables/table";

/**
 * Headings seen on real laboratory sheets. Common practice, no published source. A heading in the second list
 * means more than one thing on real sheets: its meaning must be among those offered, and must not be taken alone.
 */
const SEEN: readonly [role: Role, plain: string, doubtful?: string][] = [
  ["waterContent", "w | w% | ω | WC | M/C | moist % | % moist | % moisture | % water | moisture content | water content | FMC | field MC | NMC | natural moisture | in-situ MC | as-rec'd MC | oven MC | wn | wf | wi | W (%) | teneur en eau | Wassergehalt | humedad | % | average w | mean MC | avg % | w̄", "MC | mc | W | M | moisture"],
  ["trialWater", "assumed w | approx. MC | target MC | trial MC | est. % | nominal MC | water added | added (ml) | ml added | % added"],
  ["tinNumber", "tin no | can # | can no | container no | tare no | pan ID | lid/tin | mould no", "container | dish | cup | tray"],
  ["tare", "tare | tare mass | wt of can | tin wt | mass of container | mass of tin", "W1 | M1 | m1 | mc"],
  ["wetAndTin", "wet + tare | can + wet | tare + wet soil | tin & wet | gross wet | wet wt (g)", "W2 | M2 | m2"],
  ["dryAndTin", "dry + tare | can + dry | tin & dry | gross dry | dry wt (g)", "W3 | M3 | m3"],
  ["pointName", "trial no | test no | determination | point | specimen | run"],
  ["mouldMass", "mould + base | wt of mould | mass of mould | Mould (g)", "mould | mold | cylinder | Wm | m1"],
  ["mouldAndSoil", "mould + soil | wt soil + mold | gross | cyl + wet soil", "m2"],
  ["wetSoil", "wt wet soil | m2-m1 | m2−m1 | net wet | compacted soil | B−A"],
  ["mouldVolume", "V | Vm | vol | volume of mould"],
  ["wetDensity", "wet density | WD | bulk density | BD | γ | γt | γm | γb | γwet | ρ | ρb | total unit wt | moist density | FWD | in-situ density | IPD | wet unit wt | unit wt (wet)", "ρw | γw | density | unit weight"],
  ["dryDensity", "DD | dry dens | γd | γdry | ρd | ρdry | DUW | dry unit wt | FDD | field dry density | in-place dry | dry bulk | Dry density", "density"],
  ["other", "maximum dry density | MDD | optimum water content | OMC | zero air voids density | saturation (%) | air voids, % | void ratio | mass of water | RC | Max. dry unit weight (pcf)"],
];
const list = (text: string | undefined): string[] => (text ?? "").split(" | ").filter((one) => one !== "");

describe.each(SEEN)("%s", (role, plain, doubtful) => {
  test.each(list(plain))("%s", (heading) => expect(meanings(heading).roles).toEqual([role]));
  if (doubtful) test.each(list(doubtful))("%s is not taken alone", (heading) => {
    const { roles } = meanings(heading);
    expect(roles).toContain(role);
    expect(roles.length).toBeGreaterThan(1);
  });
});

test.each(["", "Remarks by the client", "Colour", "1", "Sieve 4.75 mm"])("%p says nothing known", (heading) => expect(meanings(heading).roles.filter((role) => role !== "other")).toEqual([]));

describe("units", () => {
  test.each([
    ["Dry density (Mg/m³)", "dry density", "Mg/m3"], ["Dry density [g/cm^3]", "dry density", "Mg/m3"], ["Dry unit weight, lb/ft3", "dry unit weight", "lb/ft3"], ["DD pcf", "dd", "lb/ft3"], ["γd kN/m3", "γd", "kN/m3"],
    ["Dry Density in kg/m3", "dry density", "kg/m3"], ["Volume of mould (cc)", "volume of mould", "cm3"], ["Vol. (cu ft)", "vol", "ft3"], ["Wet + tin (gm)", "wet + tin", "g"], ["Mass of mould, kg", "mass of mould", "kg"], ["Water content (%)", "water content", "%"],
    ["Dry density", "dry density", undefined], ["Wet + tin (b)", "wet + tin b", undefined],
  ])("%s", (heading, words, unit) => {
    const split = splitHeading(heading);
    expect(split.words).toBe(words);
    expect(split.unit?.id).toBe(unit);
  });
  test.each([["Mg", "mass", "Mg"], ["mg/m3", "density", "Mg/m3"], ["t/m³", "density", "Mg/m3"], ["(ml)", "volume", "cm3"], ["ft³", "volume", "ft3"], ["percent", "percent", "%"]])("%s is a unit of %s", (text, kind, id) => expect(readUnit(text)).toEqual({ kind, id }));
  test.each(["", "-", "no", "point", "m"])("%p is none", (text) => expect(readUnit(text)).toBeUndefined());
});
