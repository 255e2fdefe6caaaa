import { addContentType, addLink } from "./relations";
import type { Package } from "./package";
import { workbookPart } from "./read";

/**
 * Formulas that fill by themselves are marked by a cell metadata record (`cm`) that points into xl/metadata.xml.
 * Source: ECMA-376, 18.9, and MS-XLSX, dynamicArrayProperties.
 */
const PART = "xl/metadata.xml";
const TYPE = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheetMetadata+xml";
const RELATION = "http://schemas.openxmlformats.org/officeDocument/2006/relationships/sheetMetadata";
const KIND = '<metadataType name="XLDAPR" minSupportedVersion="120000" copy="1" pasteAll="1" pasteValues="1" merge="1" splitFirst="1" rowColShift="1" clearFormats="1" clearComments="1" assign="1" coerce="1" cellMeta="1"/>';
const FUTURE = '<futureMetadata name="XLDAPR" count="1"><bk><extLst><ext uri="{bdbb8cdc-fa1e-496e-a857-3c3f30c029c3}"><xda:dynamicArrayProperties xmlns:xda="http://schemas.microsoft.com/office/spreadsheetml/2017/dynamicarray" fDynamic="1" fCollapsed="0"/></ext></extLst></bk></futureMetadata>';
const MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";

/** Puts a piece behind the last of the first kind of part that is there: the parts have a fixed order. */
function insertAfter(xml: string, ends: readonly string[], piece: string): string {
  const end = ends.find((one) => xml.includes(one)) ?? ">";
  const at = xml.lastIndexOf(end) + end.length;
  return xml.slice(0, at) + piece + xml.slice(at);
}

/** The `cm` index of a dynamic array in this workbook; what it needs is added, foreign metadata kept. */
export function dynamicArrayIndex(pack: Package): number {
  const { part, links } = workbookPart(pack);
  const existing = links.find(({ type }) => type === "sheetMetadata")?.target;
  if (!existing || !pack.has(existing)) {
    pack.put(PART, `<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n<metadata xmlns="${MAIN}"><metadataTypes count="1">${KIND}</metadataTypes>${FUTURE}<cellMetadata count="1"><bk><rc t="1" v="0"/></bk></cellMetadata></metadata>`);
    addContentType(pack, PART, TYPE);
    addLink(pack, part, "rIdTampsheetMetadata", RELATION, "metadata.xml");
    return 1;
  }
  let xml = pack.text(existing);
  const kinds = [...xml.matchAll(/<metadataType\s[^>]*name="([^"]*)"/g)].map((match) => match[1]);
  let kind = kinds.indexOf("XLDAPR") + 1;
  if (kind === 0) {
    kind = kinds.length + 1;
    xml = xml.includes("<metadataTypes") ? xml.replace(/<metadataTypes[^>]*>/, `<metadataTypes count="${kind}">`).replace("</metadataTypes>", `${KIND}</metadataTypes>`) : xml.replace(/(<metadata\s[^>]*>)/, `$1<metadataTypes count="1">${KIND}</metadataTypes>`);
    xml = insertAfter(xml, ["</futureMetadata>", "</mdxMetadata>", "</metadataStrings>", "</metadataTypes>"], FUTURE);
  }
  const blocks = [...(/<cellMetadata[^>]*>([\s\S]*?)<\/cellMetadata>/.exec(xml)?.[1] ?? "").matchAll(/<bk>([\s\S]*?)<\/bk>/g)].map((match) => match[1]!);
  const found = blocks.findIndex((block) => new RegExp(`<rc\\s[^>]*t="${kind}"`).test(block) && (block.match(/<rc/g) ?? []).length === 1);
  if (found >= 0) {
    pack.put(existing, xml);
    return found + 1;
  }
  const own = `<bk><rc t="${kind}" v="0"/></bk>`;
  xml = xml.includes("</cellMetadata>")
    ? xml.replace(/<cellMetadata[^>]*>/, `<cellMetadata count="${blocks.length + 1}">`).replace("</cellMetadata>", `${own}</cellMetadata>`)
    : insertAfter(xml, ["</futureMetadata>"], `<cellMetadata count="1">${own}</cellMetadata>`);
  pack.put(existing, xml);
  return blocks.length + 1;
}
