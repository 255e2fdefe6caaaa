import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";

const MAIN = 'xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main" xmlns:r="http://schemas.openxmlformats.org/officeDocument/2006/relationships"';
const OFFICE = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";

export interface Handmade { readonly sheet: string; readonly styles?: string; readonly more?: Readonly<Record<string, string>>; readonly workbook?: string; readonly sheetLinks?: string; readonly workbookLinks?: string; readonly types?: string }

/** A workbook written by hand, for what other programs write but no library here does. */
export function handmade({ sheet, styles, more = {}, workbook, sheetLinks, workbookLinks = "", types = "" }: Handmade): Uint8Array {
  const parts: Record<string, string> = {
    "[Content_Types].xml": `<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/><Override PartName="/xl/workbook.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sheet.main+xml"/>${types}</Types>`,
    "_rels/.rels": `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="${OFFICE}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
    "xl/workbook.xml": workbook ?? `<workbook ${MAIN}><sheets><sheet name="Sheet1" sheetId="1" r:id="rId1"/></sheets></workbook>`,
    "xl/_rels/workbook.xml.rels": `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="${OFFICE}/worksheet" Target="worksheets/sheet1.xml"/><Relationship Id="rId2" Type="${OFFICE}/styles" Target="styles.xml"/>${workbookLinks}</Relationships>`,
    "xl/styles.xml": styles ?? `<styleSheet ${MAIN}><fonts count="1"><font/></fonts><fills count="1"><fill/></fills><borders count="1"><border/></borders><cellXfs count="2"><xf numFmtId="0"/><xf numFmtId="10"/></cellXfs><dxfs count="0"/></styleSheet>`,
    "xl/worksheets/sheet1.xml": sheet.startsWith("<worksheet") ? sheet : `<worksheet ${MAIN}><dimension ref="A1:C3"/><sheetData>${sheet}</sheetData><pageMargins left="1" right="1" top="1" bottom="1" header="0" footer="0"/></worksheet>`,
    ...(sheetLinks ? { "xl/worksheets/_rels/sheet1.xml.rels": `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${sheetLinks}</Relationships>` } : {}),
    ...more,
  };
  return zipSync(Object.fromEntries(Object.entries(parts).map(([name, text]) => [name, strToU8(text)])));
}

export const parts = (bytes: Uint8Array): Record<string, string> => Object.fromEntries(Object.entries(unzipSync(bytes)).map(([name, content]) => [name, strFromU8(content)]));
export const sheetOf = (bytes: Uint8Array): string => parts(bytes)["xl/worksheets/sheet1.xml"]!;
/** the names of the parts that differ, among them those that came or went */
export const differing = (a: Uint8Array, b: Uint8Array): string[] => {
  const one = parts(a), two = parts(b);
  return [...new Set([...Object.keys(one), ...Object.keys(two)])].filter((name) => one[name] !== two[name]).sort();
};
