import { BookRefusal, type BookPatch } from "./book";
import { dynamicArrayIndex } from "./dynamic-arrays";
import { Package } from "./package";
import { patchCells } from "./patch-cells";
import { dropLooks, patchMarks } from "./patch-marks";
import { patchNotes } from "./patch-notes";
import { readWorkbook, workbookPart } from "./read";
import { linksOf, removeContentType, removeLinks } from "./relations";
import { writeSettings } from "./settings";

/**
 * Writes changes into an .xlsx file. Cells, marks, notes and settings that are named change; every other part of the file
 * keeps its content byte for byte, and within a changed sheet every other character stays as it was.
 * @throws BookRefusal where a change cannot be made without harm
 */
export function patchBook(bytes: Uint8Array, patch: BookPatch): Uint8Array {
  const pack = Package.open(bytes);
  const { part: workbook, links } = workbookPart(pack);
  const { sheets } = readWorkbook(pack);
  const styles = links.find(({ type }) => type === "styles")?.target ?? "xl/styles.xml";
  let formulas = false, marks = false;
  for (const change of patch.sheets) {
    const entry = sheets.find(({ name }) => name === change.sheet);
    if (!entry) throw new BookRefusal("cannot-change", `there is no sheet "${change.sheet}" in the file.`);
    let xml = patchCells(entry.part, pack.text(entry.part), change.cells, () => dynamicArrayIndex(pack));
    if (change.marks) {
      marks = true;
      if (change.marks.length > 0 && !pack.has(styles)) throw new BookRefusal("cannot-change", "the file has no styles to mark cells with.");
      xml = patchMarks(pack, xml, change.marks, styles);
    }
    if (change.notes) xml = patchNotes(pack, entry.part, xml, change.notes);
    pack.put(entry.part, xml);
    formulas ||= change.cells.some(({ kind }) => kind !== "result");
  }
  if (marks) dropLooks(pack, styles, sheets.map(({ part }) => part));
  // the order of calculation names cells with formulas; a host makes it anew
  if (formulas) dropCalculationChain(pack, workbook);
  if (patch.settings) writeSettings(pack, patch.settings);
  return pack.zip();
}

function dropCalculationChain(pack: Package, workbook: string): void {
  const chain = linksOf(pack, workbook).find(({ type }) => type === "calcChain")?.target;
  if (!chain) return;
  pack.remove(chain);
  removeContentType(pack, chain);
  removeLinks(pack, workbook, (link) => /relationships\/calcChain"/.test(link));
}
