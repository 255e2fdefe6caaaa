import ExcelJS from "exceljs";
import { USER_NOTE } from "./contract";

/** The contract's workbook as a file that another program has made. */
export async function contractWorkbook(): Promise<Buffer> {
  const book = new ExcelJS.Workbook(), plain = book.addWorksheet("Plain");
  plain.addRows([["w %", "dry"], [12, 1.8], [14]]);
  plain.getCell("B3").value = { formula: "B2*1.05", result: 0 };
  plain.getCell("A4").value = { formula: "1/0", result: { error: "#DIV/0!" } as unknown as number };
  plain.getCell("D1").value = "merged";
  plain.mergeCells("D1:E2");
  plain.getCell("B2").note = USER_NOTE;
  plain.addConditionalFormatting({ ref: "A1:A10", rules: [{ type: "expression", priority: 1, formulae: ["A1>13"], style: { font: { bold: true } } }] });
  book.addWorksheet("Second sheet");
  const locked = book.addWorksheet("Locked");
  locked.getCell("A1").value = "locked";
  await locked.protect("", {});
  return Buffer.from(await book.xlsx.writeBuffer());
}
