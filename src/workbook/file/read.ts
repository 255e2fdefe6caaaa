import { parseRange } from "../address";
import { BookRefusal, type Book, type BookTable, type DefinedName } from "./book";
import { fromStored } from "./formula-text";
import { LIMITS, type Limits } from "./limits";
import { Package } from "./package";
import { linksOf, type Link } from "./relations";
import { readSettings } from "./settings";
import { readSharedStrings } from "./shared-strings";
import { readSheet } from "./sheet";
import { readStyles } from "./styles";
import { readXml } from "./xml";

/** Where the workbook part stands, and its links. */
export function workbookPart(pack: Package): { readonly part: string; readonly links: readonly Link[] } {
  const part = linksOf(pack, "").find(({ type }) => type === "officeDocument")?.target;
  if (!part || !pack.has(part)) throw new BookRefusal("not-xlsx", "it holds no workbook.");
  return { part, links: linksOf(pack, part) };
}

export interface SheetEntry { readonly name: string; readonly part: string; readonly hidden: boolean }

export interface WorkbookEntries { readonly sheets: readonly SheetEntry[]; readonly names: readonly DefinedName[]; readonly date1904: boolean }

export function readWorkbook(pack: Package): WorkbookEntries {
  const { part, links } = workbookPart(pack);
  const sheets: SheetEntry[] = [], names: DefinedName[] = [], order: string[] = [];
  let date1904 = false, name: { text: string; name: string; scope: number | undefined; hidden: boolean } | undefined;
  readXml(part, pack.text(part), pack.depth, {
    open(tag, at) {
      if (tag === "workbookPr") date1904 = at.date1904 === "1" || at.date1904 === "true";
      if (tag === "sheet") {
        const id = Object.entries(at).find(([key]) => key.endsWith(":id"))?.[1];
        const link = links.find((one) => one.id === id);
        order.push(at.name ?? "");
        // chart sheets and dialog sheets hold no cells; they stay in the file
        if (link?.type === "worksheet") sheets.push({ name: at.name ?? "", part: link.target, hidden: at.state === "hidden" || at.state === "veryHidden" });
      }
      if (tag === "definedName") name = { text: "", name: at.name ?? "", scope: at.localSheetId === undefined ? undefined : Number(at.localSheetId), hidden: at.hidden === "1" };
    },
    text(more) { if (name) name.text += more; },
    close(tag) {
      if (tag !== "definedName" || !name) return;
      const scope = name.scope === undefined ? undefined : order[name.scope];
      if (!name.hidden && !name.name.startsWith("_xlnm.")) names.push({ name: name.name, refersTo: fromStored(name.text), ...(scope === undefined ? {} : { sheet: scope }) });
      name = undefined;
    },
  });
  if (sheets.length === 0) throw new BookRefusal("not-xlsx", "it holds no worksheet.");
  return { sheets, names, date1904 };
}

function readTables(pack: Package, sheet: string, part: string): BookTable[] {
  return linksOf(pack, part).filter(({ type, target }) => type === "table" && pack.has(target)).flatMap(({ target }) => {
    let name = "", ref = "";
    const columns: string[] = [];
    readXml(target, pack.text(target), pack.depth, {
      open(tag, at) {
        if (tag === "table") { name = at.displayName ?? at.name ?? ""; ref = at.ref ?? ""; }
        if (tag === "tableColumn") columns.push(at.name ?? "");
      },
    });
    const range = parseRange(ref);
    return range ? [{ name, sheet, range, columns }] : [];
  });
}

/**
 * Reads an .xlsx file.
 * @throws BookRefusal for files that are damaged, encrypted, of another format, with macros, or beyond the limits; it says what to do.
 */
export function readBook(bytes: Uint8Array, limits: Limits = LIMITS): Book {
  const pack = Package.open(bytes, limits);
  const { links } = workbookPart(pack);
  const { sheets, names, date1904 } = readWorkbook(pack);
  const target = (type: string): string | undefined => links.find((link) => link.type === type)?.target;
  const strings = readSharedStrings(pack, target("sharedStrings"));
  const count = { cells: 0 };
  return {
    sheets: sheets.map((sheet) => readSheet(pack, { ...sheet, strings, count })),
    names,
    tables: sheets.flatMap(({ name, part }) => readTables(pack, name, part)),
    styles: readStyles(pack, target("styles"), target("theme")),
    date1904,
    settings: readSettings(pack),
  };
}
