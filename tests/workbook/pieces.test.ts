import { fromPieces, inPieces, LONGEST_PIECE, pieceName } from "../../src/workbook/pieces";

const through = (settings: Record<string, string>): Record<string, string> => Object.fromEntries(fromPieces(new Map(Object.entries(settings).flatMap(([name, text]) => inPieces(text).map((piece, i) => [pieceName(name, i + 1), piece] as const)))));

test("texts of any length come back whole, in pieces that a host keeps", () => {
  for (const length of [0, 1, 254, 255, 256, 510, 511, 3000]) {
    const text = Array.from({ length }, (_, i) => [..."ab€🧱"][i % 4]).join("");
    for (const piece of inPieces(text)) expect([piece.length <= LONGEST_PIECE, !/[\uD800-\uDBFF]$/.test(piece)]).toEqual([true, true]);
    expect(through({ "curve:'Lab A'!A1:B6": text, gs: "2.70" })).toEqual({ "curve:'Lab A'!A1:B6": text, gs: "2.70" });
  }
});
test("a name that only looks like a piece is its own", () => expect(through({ "x~2": "alone" })).toEqual({ "x~2": "alone" }));
