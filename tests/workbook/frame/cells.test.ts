import { pack, unpack } from "../../../src/workbook/frame/cells";
import { isMethod, methods } from "../../../src/workbook/frame/messages";
import { CellError } from "../../../src/worksheet/cell";

test("errors in cells survive the crossing with their class, everything else as it is", () => {
  const snapshot = { values: [[1, "a", null, true, new CellError("#N/A", "not enough")]], deep: [{ one: new CellError("#VALUE!", "") }] };
  const crossed = structuredClone(pack(snapshot));
  expect(JSON.stringify(crossed)).not.toContain('"code"');
  const back = unpack(crossed) as typeof snapshot;
  expect(back).toEqual(snapshot);
  expect(back.values[0]![4]).toBeInstanceOf(CellError);
  expect(back.deep[0]!.one).toBeInstanceOf(CellError);
});

test("only the port's own methods can be called across the frame", () => {
  for (const name of methods) expect(isMethod(name)).toBe(true);
  for (const name of ["on", "tell", "cell", "constructor", "__proto__", "toString", 3, null]) expect(isMethod(name)).toBe(false);
});
