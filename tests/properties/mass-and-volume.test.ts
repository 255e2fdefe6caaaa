import fc from "fast-check";
import { shippedFunctions } from "../support/host-runtime";

const { call } = shippedFunctions();
const one = (name: string, ...args: unknown[]): number => {
  const [[value]] = call(name, ...args) as [[unknown]];
  if (typeof value !== "number") throw new Error(`${name}(${args.join(", ")}) gave ${String((value as Error)?.message ?? value)}`);
  return value;
};

const water = fc.double({ min: 1, max: 60, noNaN: true });
const gravity = fc.double({ min: 2.3, max: 3.2, noNaN: true });
const density = fc.double({ min: 0.9, max: 2.2, noNaN: true });
const share = fc.double({ min: 1, max: 95, noNaN: true });
const mass = fc.double({ min: 20, max: 500, noNaN: true });

/** Runs a property and holds it to having met enough cases. */
function holds<Args extends [unknown, ...unknown[]]>(arbitraries: { [Place in keyof Args]: fc.Arbitrary<Args[Place]> }, predicate: (...args: Args) => void, runs = 600): void {
  let met = 0;
  fc.assert(fc.property(...(arbitraries as unknown as [fc.Arbitrary<unknown>]), (...args: unknown[]) => { predicate(...args as Args); met++; }), { numRuns: runs, seed: 42 });
  expect(met).toBe(runs);
}
const close = (a: number, b: number, relative = 1e-9): void => expect(Math.abs(a - b)).toBeLessThanOrEqual(relative * Math.max(1, Math.abs(a), Math.abs(b)));

test("SOILWET undoes SOILDRY", () => holds<[number, number]>([density, water], (wet, w) => close(one("SOILWET", one("SOILDRY", wet, w), w), wet)));
test("FULLWATER undoes VOIDFREE", () => holds<[number, number]>([water, gravity], (w, gs) => close(one("FULLWATER", one("VOIDFREE", w, gs), gs), w)));
test("LEASTGS of a point on the line is the line's own specific gravity", () => holds<[number, number]>([water, gravity], (w, gs) => close(one("LEASTGS", one("VOIDFREE", w, gs), w), gs)));
test("SATPCT undoes SATLINE", () => holds<[number, number, number]>([fc.double({ min: 1, max: 40, noNaN: true }), gravity, fc.double({ min: 40, max: 100, noNaN: true })], (w, gs, s) => close(one("SATPCT", one("SATLINE", w, gs, s), w, gs), s)));
test("AIRPCT undoes AIRLINE", () => holds<[number, number, number]>([water, gravity, fc.double({ min: 1, max: 40, noNaN: true })], (w, gs, a) => close(one("AIRPCT", one("AIRLINE", w, gs, a), w, gs), a, 1e-8)));
test("the line of no air and the line of full saturation are the zero-air-voids line", () => holds<[number, number]>([water, gravity], (w, gs) => {
  close(one("AIRLINE", w, gs, 0), one("VOIDFREE", w, gs));
  close(one("SATLINE", w, gs, 100), one("VOIDFREE", w, gs));
}));
test("porosity is e/(1+e), and air voids are its unsaturated share", () => holds<[number, number, number]>([density, water, gravity], (dry, w, gs) => {
  const e = one("VOIDRATIO", dry, gs), n = one("POREPCT", dry, gs);
  close(n, 100 * e / (1 + e));
  close(one("AIRPCT", dry, w, gs), n * (1 - one("SATPCT", dry, w, gs) / 100), 1e-8);
}));
test("VOIDFREE falls with water and rises with specific gravity", () => holds<[number, number]>([water, gravity], (w, gs) => {
  expect(one("VOIDFREE", w + 1, gs)).toBeLessThan(one("VOIDFREE", w, gs));
  expect(one("VOIDFREE", w, gs + 0.05)).toBeGreaterThan(one("VOIDFREE", w, gs));
}));
test("PASTZAV agrees with saturation past its allowance", () => {
  let past = 0, within = 0;
  holds<[number, number, number]>([density, water, gravity], (dry, w, gs) => {
    const [[flag]] = call("PASTZAV", dry, w, gs) as [[boolean]];
    if (flag) { past++; expect(one("SATPCT", dry, w, gs)).toBeGreaterThan(100); } else { within++; expect(dry / one("VOIDFREE", w, gs)).toBeLessThanOrEqual(1.002 + 1e-12); }
  });
  expect(past).toBeGreaterThan(50);
  expect(within).toBeGreaterThan(50);
});
test("the same soil in any unit gives the same percents", () => holds<[number, number, number]>([fc.double({ min: 0.6, max: 0.999, noNaN: true }), water, gravity], (ofLine, w, gs) => {
  const dry = ofLine * one("VOIDFREE", w, gs);
  for (const unit of ["kg/m3", "kN/m3", "lb/ft3"]) {
    const there = one("DENSITYAS", dry, "Mg/m3", unit);
    close(one("SATPCT", there, w, gs, unit), one("SATPCT", dry, w, gs), 1e-8);
    close(one("AIRPCT", there, w, gs, unit), one("AIRPCT", dry, w, gs), 1e-8);
    close(one("VOIDRATIO", there, gs, unit), one("VOIDRATIO", dry, gs), 1e-8);
    close(one("LEASTGS", there, w, unit), one("LEASTGS", dry, w), 1e-8);
    close(one("DENSITYAS", one("VOIDFREE", w, gs, unit), unit, "Mg/m3"), one("VOIDFREE", w, gs), 1e-8);
  }
}, 300));
test("DENSITYAS there and back is where it began", () => holds<[number]>([density], (dry) => { for (const unit of ["kg/m3", "kN/m3", "pcf", "lb/yd3"]) close(one("DENSITYAS", one("DENSITYAS", dry, "Mg/m3", unit), unit, "g/cm3"), dry); }));
test("water is densest near 4 °C and lighter as it warms", () => holds<[number]>([fc.double({ min: 4, max: 39, noNaN: true })], (t) => expect(one("WATERDENS", t + 1)).toBeLessThan(one("WATERDENS", t))));
test("WATERPCT takes no notice of a mass added to all three weighings", () => holds<[number, number, number]>([mass, share, mass], (dry, w, tin) => {
  close(one("WATERPCT", tin + dry * (1 + w / 100), tin + dry, tin), w, 1e-8);
  close(one("WATERPCT", dry * (1 + w / 100), dry), w, 1e-8);
}));
test("DRYBASIS is above its wet-mass reading and undone by a/(1+a)", () => holds<[number]>([fc.double({ min: 1, max: 60, noNaN: true })], (a) => {
  const w = one("DRYBASIS", a);
  expect(w).toBeGreaterThan(a);
  close(100 * w / (100 + w), a);
}));
test("RELCOMP of the maximum is 100 and follows the density", () => holds<[number, number]>([density, fc.double({ min: 0.8, max: 1.1, noNaN: true })], (dry, k) => {
  close(one("RELCOMP", dry * k, dry), 100 * k);
}));
test("WATERGAP changes sign when its arguments change places", () => holds<[number, number]>([water, water], (a, b) => close(one("WATERGAP", a, b), -one("WATERGAP", b, a))));
test("WATERADD: litres and gallons agree, drying is the negative of wetting without loss, loss raises the need", () => holds<[number, number, number]>([density, fc.double({ min: 2, max: 20, noNaN: true }), fc.double({ min: 1, max: 20, noNaN: true })], (dry, now, more) => {
  const litres = one("WATERADD", 1000, dry, now, now + more);
  close(litres, 10000 * dry * more, 1e-9);
  // 1 yd3 = 0.764554857984 m3, 1 US gallon = 3.785411784 L; the trade's 8.345 lb a gallon is 0.99995 kg a litre
  const gallons = one("WATERADD", 1000 / 0.764554857984, one("DENSITYAS", dry, "Mg/m3", "lb/ft3"), now, now + more, null, "US");
  close(gallons * 3.785411784, litres, 2e-4);
  close(one("WATERADD", 1000, dry, now + more, now), -litres);
  close(one("WATERADD", 1000, dry, now, now + more, 20), litres / 0.8);
  close(one("WATERADD", 1000, dry, now + more, now, 20), -litres);
}));
test("BANKVOL holds the dry soil of the fill and what is lost", () => holds<[number, number, number]>([density, fc.double({ min: 0.7, max: 1.3, noNaN: true }), fc.double({ min: 1, max: 40, noNaN: true })], (bank, k, loss) => close(one("BANKVOL", 500, bank * k, bank, loss) * (1 - loss / 100) * bank, 500 * bank * k)));
test("MOULDWET is the mass of soil over the volume, in any units", () => holds<[number, number]>([density, fc.double({ min: 900, max: 2400, noNaN: true })], (wet, volume) => {
  const grams = 4000 + wet * volume;
  close(one("MOULDWET", grams, 4000, volume), wet);
  close(one("MOULDWET", grams / 453.59237, 4000 / 453.59237, volume / 28316.846592), one("DENSITYAS", wet, "g/cm3", "lb/ft3"));
  close(one("MOULDWET", grams, 4000, volume / 28316.846592, "g", "ft3"), one("DENSITYAS", wet, "g/cm3", "lb/ft3"));
}));
test("BLOWWORK grows in proportion to every one of mass, drop, blows and layers, and against the volume", () => holds<[number, number]>([fc.double({ min: 1, max: 6, noNaN: true }), fc.double({ min: 200, max: 500, noNaN: true })], (m, drop) => {
  const effort = one("BLOWWORK", m, drop, 25, 3, 944);
  for (const doubled of [[2 * m, drop, 25, 3, 944], [m, 2 * drop, 25, 3, 944], [m, drop, 50, 3, 944], [m, drop, 25, 6, 944], [m, drop, 25, 3, 472]]) close(one("BLOWWORK", ...doubled), 2 * effort);
}));
test("FINEDRY undoes WHOLEDRY, FINEWATER undoes WHOLEWATER, in any unit", () => holds<[number, number, number]>([density, fc.double({ min: 5, max: 40, noNaN: true }), fc.double({ min: 2.4, max: 2.9, noNaN: true })], (fine, stones, gs) => {
  const whole = one("WHOLEDRY", fine, stones, gs);
  close(one("FINEDRY", whole, stones, gs), fine);
  // the whole lies between its two fractions
  expect((whole - fine) * (gs * 0.9982 - whole)).toBeGreaterThanOrEqual(-1e-9);
  const pcf = one("DENSITYAS", 1, "Mg/m3", "lb/ft3");
  close(one("WHOLEDRY", fine * pcf, stones, gs, "lb/ft3") / pcf, whole, 1e-8);
  close(one("FINEWATER", one("WHOLEWATER", 12, stones, 0.7), stones, 0.7), 12);
}));
test("RELDENSITY runs from 0 at the loosest to 100 at the densest, and rises between", () => holds<[number, number]>([density, fc.double({ min: 0.02, max: 0.98, noNaN: true })], (most, share) => {
  const least = 0.8 * most, dry = least + share * (most - least);
  close(one("RELDENSITY", least, least, most), 0);
  close(one("RELDENSITY", most, least, most), 100);
  const here = one("RELDENSITY", dry, least, most);
  expect(here > 0 && here < 100 && one("RELDENSITY", dry * 1.001, least, most) > here).toBe(true);
}));
test("SANDCONE is HOLEWET of the hole that the sand filled", () => holds<[number, number, number]>([mass, density, fc.double({ min: 1, max: 300, noNaN: true })], (soil, sand, volume) => {
  close(one("SANDCONE", soil, 40 + sand * volume, 40, sand), one("HOLEWET", soil, volume), 1e-8);
}));
test("MIXWATER brings a batch to its target", () => holds<[number, number, number]>([mass, water, water], (batch, now, target) => {
  const dry = batch / (1 + now / 100);
  close(100 * (batch + one("MIXWATER", batch, now, target) - dry) / dry, target, 1e-8);
}));
test("MOULDVOL grows with the square of the diameter and with the height", () => holds<[number, number]>([share, share], (d, h) => { close(one("MOULDVOL", 2 * d, h), 4 * one("MOULDVOL", d, h)); close(one("MOULDVOL", d, 3 * h), 3 * one("MOULDVOL", d, h)); }));
test("swell, shrink, loose lift and bulking tell of the same volumes", () => holds<[number, number]>([density, fc.double({ min: 0.6, max: 0.95, noNaN: true })], (bank, k) => {
  const swell = one("SWELLPCT", bank, k * bank), ofLoose = one("SWELLPCT", bank, k * bank, "loose");
  close((1 + swell / 100) * (1 - ofLoose / 100), 1);
  close(one("LOOSELIFT", 150, bank, k * bank), 150 * (1 + swell / 100));
  close(one("SANDBULK", k * bank, bank), swell);
  close((1 - one("SHRINKPCT", k * bank, bank) / 100) * (1 + one("SHRINKPCT", k * bank, bank, "fill") / 100), 1);
}));
test("WATERRATIO of the optimum is 100, and agrees with WATERGAP", () => holds<[number, number]>([water, water], (w, optimum) => {
  close(one("WATERRATIO", w, optimum), 100 + 100 * one("WATERGAP", w, optimum) / optimum, 1e-8);
}));
