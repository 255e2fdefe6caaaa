import { roundedTo } from "../../src/judging/verdict";
import { parseZone } from "../../src/judging/zone";

test.each([
  ["RC >= 95", [{ quantity: "RC", low: 95, high: null, decimals: 0 }], null],
  ["rc≥95.0 %; AIR <= 10", [{ quantity: "RC", low: 95, high: null, decimals: 1 }, { quantity: "air", low: null, high: 10, decimals: 0 }], null],
  ["gap -2..+2; round 0.1", [{ quantity: "gap", low: -2, high: 2, decimals: 0 }], 0.1],
  ["gap −1,5 to 0\nratio 85..115", [{ quantity: "gap", low: -1.5, high: 0, decimals: 1 }, { quantity: "ratio", low: 85, high: 115, decimals: 0 }], null],
  ["RC 92..98; water between 10 to 14", [{ quantity: "RC", low: 92, high: 98, decimals: 0 }, { quantity: "water", low: 10, high: 14, decimals: 0 }], null],
] as const)("%j is understood", (text, clauses, round) => expect(parseZone(text)).toEqual({ clauses, round }));

test.each([
  ["", /empty/], ["round 0.1", /no limit/], ["RC > 95", /clause 1 .* not understood: write a quantity with >= or <=/], ["RC >= 95; strength >= 3", /clause 2 .*"strength" is no quantity of it; they are RC, gap/],
  ["gap 2..-2", /2 lies above -2/], ["RC >= 95; round 0", /step of rounding must be above 0/], ["95", /not understood/], ["RC >= ninety", /not understood/],
])("%j is refused with what to write", (text, pattern) => expect(parseZone(text)).toMatch(pattern));

test("rounding is half up, in any step", () => {
  expect([roundedTo(94.95, 0.1), roundedTo(94.5, 1), roundedTo(94.4999, 1), roundedTo(-0.25, 0.1), roundedTo(0.285, 0.01), roundedTo(97.3, 0.5)]).toEqual([95, 95, 94, -0.2, 0.29, 97.5]);
});
