import fc from "fast-check";
import { areaName, cellName, columnName, columnNumber, overlap, parseRange, rangeName, sheetName } from "../../src/workbook/address";

test.each([[0, "A"], [25, "Z"], [26, "AA"], [701, "ZZ"], [702, "AAA"], [16383, "XFD"]])("column %d is %s", (column, name) => {
  expect(columnName(column)).toBe(name);
  expect(columnNumber(name.toLowerCase())).toBe(column);
});

test("a range is written and read alike", () => {
  fc.assert(fc.property(fc.nat(1_000_000), fc.nat(16_000), fc.integer({ min: 1, max: 300 }), fc.integer({ min: 1, max: 300 }), (row, column, rows, columns) => {
    expect(parseRange(rangeName({ row, column, rows, columns }))).toEqual({ row, column, rows, columns });
  }), { numRuns: 500, seed: 2 });
  expect(parseRange("$C$4:A2")).toEqual({ row: 1, column: 0, rows: 3, columns: 3 });
  for (const text of ["", "A", "1", "A1:B", "A1:B2:C3", "A0x", "Sheet1!A1"]) expect(parseRange(text)).toBeUndefined();
});

test.each([["Lab", "Lab"], ["Lab A", "'Lab A'"], ["it's", "'it''s'"], ["A1", "'A1'"], ["RC", "'RC'"], ["R1C1", "'R1C1'"], ["2026", "'2026'"], ["Daten_ü", "'Daten_ü'"]])("sheet %s is written %s", (name, written) => expect(sheetName(name)).toBe(written));

test("areas", () => {
  expect(areaName({ sheet: "Lab A", row: 1, column: 1, rows: 2, columns: 1 })).toBe("'Lab A'!B2:B3");
  expect(cellName(0, 0)).toBe("A1");
  const a = { sheet: "S", row: 1, column: 1, rows: 2, columns: 2 };
  expect(overlap(a, { ...a, row: 2 })).toBe(true);
  expect(overlap(a, { ...a, row: 3 })).toBe(false);
  expect(overlap(a, { ...a, sheet: "T" })).toBe(false);
});
