import { callsOurs, fromStored, moved, toStored } from "../../../src/workbook/file/formula-text";

test.each([
  ["_xldudf_TAMP_SOILDRY(A1:A5,B1:B5)", "TAMP.SOILDRY(A1:A5,B1:B5)"],
  ["_xlfn.STDEV.S(A1:A5)", "STDEV.S(A1:A5)"],
  ["_xlfn._xlws.FILTER(A1:A5,B1:B5>1)", "FILTER(A1:A5,B1:B5>1)"],
  ["SUM(_xlfn.ANCHORARRAY(A5))", "SUM(A5#)"],
  ['IF(A1="_xldudf_TAMP_X(",1,0)', 'IF(A1="_xldudf_TAMP_X(",1,0)'],
  ["'TAMP.X('!A1+1", "'TAMP.X('!A1+1"],
  ["1+1", "1+1"],
])("%s is %s, and back", (stored, ours) => {
  expect(fromStored(stored)).toBe(ours);
  expect(toStored(ours)).toBe(stored);
});

test("ours is told from a text that names it", () => {
  expect(callsOurs("1+TAMP.SOILDRY(1,2)")).toBe(true);
  expect(callsOurs("SUM(A1)")).toBe(false);
});

test.each([
  ["A1+$B$2*C$3-$D4", 2, 1, "B3+$B$2*D$3-$D6"], ["SUM(A1:B3)", 1, 0, "SUM(A2:B4)"], ["SUM(A:A,2:3)", 2, 1, "SUM(B:B,4:5)"], ["'Lab A1'!A1&\"A1\"", 1, 0, "'Lab A1'!A2&\"A1\""],
  ["LOG10(A1)+ATAN2(B1,C1)", 1, 0, "LOG10(A2)+ATAN2(B2,C2)"], ["Table1[A1]+A1", 1, 0, "Table1[A1]+A2"], ["Q1_total+Q1", 0, 1, "Q1_total+R1"], ["Sheet2!A1", 3, 2, "Sheet2!C4"], ["A1", 0, 0, "A1"],
])("%s moved by %d, %d is %s", (formula, rows, columns, expected) => expect(moved(formula, rows, columns)).toBe(expected));
