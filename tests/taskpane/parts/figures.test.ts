import { decimalsOfDensity, intervalWords, tied } from "../../../taskpane/parts/figures";

test.each([
  ["Mg/m3", 1.97, 1.95, 1.99, 2], ["Mg/m3", 2.008, 2.0, 2.016, 3], ["Mg/m3", 1.8, 1.3, 2.3, 2], ["kg/m3", 1960, 1950, 1970, 0], ["lb/ft3", 122.4, 121.9, 122.9, 1], ["kN/m3", 17.1, 16.0, 18.2, 1], ["kN/m3", 17.11, 17.06, 17.16, 2],
])("in %s, %f between %f and %f has %i decimals", (unit, value, low, high, decimals) => expect(decimalsOfDensity({ value, low, high }, unit)).toBe(decimals));

test.each([
  [1.95, 1.99, "95 % interval 1.95 to 1.99"], [null, 1.99, "95 % interval up to 1.99; not bounded below by these data"], [1.95, null, "95 % interval from 1.95; not bounded above by these data"], [null, null, "not located within these data"],
])("interval from %p to %p", (low, high, words) => expect(intervalWords({ value: 1.97, low, high }, 2)).toBe(words));

test("a number keeps its unit beside it", () => expect(tied("air voids 6.5 %, 5 points")).toBe("air voids 6.5\u00a0%, 5 points"));
