import { cellName } from "../address";
import { SIGNATURE } from "../port";
import type { Package } from "./package";
import { addContentType, addDefaultType, addLink, linksOf, removeContentType, removeDefaultType, removeLinks } from "./relations";
import { escapeXml } from "./xml";

/**
 * Notes as every spreadsheet of the last decades stores them: a comments part, and a drawing of their boxes (VML).
 * Source: ECMA-376, 18.7, and part 4 for VML.
 */
export interface OurNote { readonly row: number; readonly column: number; readonly text: string }

const COMMENTS_TYPE = "application/vnd.openxmlformats-officedocument.spreadsheetml.comments+xml";
const VML_TYPE = "application/vnd.openxmlformats-officedocument.vmlDrawing";
const RELATION = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
const COMMENTS_ID = "rIdTampsheetComments", DRAWING_ID = "rIdTampsheetDrawing";
const OUR_COMMENT = new RegExp(`<comment ref="[A-Z]+\\d+" authorId="\\d+"><text><r><t xml:space="preserve">${SIGNATURE}[^<]*</t></r></text></comment>`, "g");
const OUR_SHAPE = new RegExp(`<v:shape id="${SIGNATURE}_\\d+_\\d+"[\\s\\S]*?</v:shape>`, "g");
const LEGACY = `<legacyDrawing xmlns:r="${RELATION}" r:id="${DRAWING_ID}"/>`;
/** what comes after the legacy drawing in a worksheet */
const AFTER = /<(?:legacyDrawingHF|drawingHF|picture|oleObjects|controls|webPublishItems|tableParts|extLst)[\s>/]|<\/worksheet>/;

const EMPTY_COMMENTS = `<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n<comments xmlns="${MAIN}"><authors></authors><commentList></commentList></comments>`;
const EMPTY_DRAWING = '<xml xmlns:v="urn:schemas-microsoft-com:vml" xmlns:o="urn:schemas-microsoft-com:office:office" xmlns:x="urn:schemas-microsoft-com:office:excel"><o:shapelayout v:ext="edit"><o:idmap v:ext="edit" data="1"/></o:shapelayout>'
  + '<v:shapetype id="_x0000_t202" coordsize="21600,21600" o:spt="202" path="m,l,21600r21600,l21600,xe"><v:stroke joinstyle="miter"/><v:path gradientshapeok="t" o:connecttype="rect"/></v:shapetype></xml>';
const AUTHOR = `<author>${SIGNATURE}</author>`;

const shape = ({ row, column }: OurNote): string =>
  `<v:shape id="${SIGNATURE}_${row}_${column}" type="#_x0000_t202" style="position:absolute;margin-left:60pt;margin-top:2pt;width:200pt;height:90pt;z-index:1;visibility:hidden" fillcolor="#fdf3e4" o:insetmode="auto">`
  + `<v:fill color2="#fdf3e4"/><v:shadow on="t" color="black" obscured="t"/><v:path o:connecttype="none"/><v:textbox style="mso-direction-alt:auto"><div style="text-align:left"></div></v:textbox>`
  + `<x:ClientData ObjectType="Note"><x:MoveWithCells/><x:SizeWithCells/><x:Anchor>${column + 1}, 15, ${row}, 2, ${column + 4}, 15, ${row + 6}, 4</x:Anchor><x:AutoFill>False</x:AutoFill><x:Row>${row}</x:Row><x:Column>${column}</x:Column></x:ClientData></v:shape>`;

/** Makes our notes on a sheet exactly these, beside the user's own; returns the sheet's XML. */
export function patchNotes(pack: Package, sheetPart: string, xml: string, notes: readonly OurNote[]): string {
  const links = linksOf(pack, sheetPart);
  let comments = links.find(({ type, target }) => type === "comments" && pack.has(target))?.target;
  let drawing = links.find(({ type, target }) => type === "vmlDrawing" && pack.has(target))?.target;
  if (!comments && notes.length === 0) return xml;
  let sheet = xml;
  if (!comments) {
    comments = freeName(pack, (n) => `xl/comments${n}.xml`);
    pack.put(comments, EMPTY_COMMENTS);
    addContentType(pack, comments, COMMENTS_TYPE);
    addLink(pack, sheetPart, COMMENTS_ID, `${RELATION}/comments`, relative(sheetPart, comments));
  }
  if (!drawing && notes.length > 0) {
    drawing = freeName(pack, (n) => `xl/drawings/vmlDrawing${n}.vml`);
    pack.put(drawing, EMPTY_DRAWING);
    addDefaultType(pack, "vml", VML_TYPE);
    addLink(pack, sheetPart, DRAWING_ID, `${RELATION}/vmlDrawing`, relative(sheetPart, drawing));
    sheet = sheet.replace(AFTER, (next) => LEGACY + next);
  }

  let list = pack.text(comments).replace(OUR_COMMENT, "");
  if (notes.length > 0) {
    if (!list.includes(AUTHOR)) list = list.replace(/<authors\s*\/>/, "<authors></authors>").replace("</authors>", `${AUTHOR}</authors>`);
    const author = [...list.matchAll(/<author>[^<]*<\/author>|<author\s*\/>/g)].findIndex(([one]) => one === AUTHOR);
    const own = notes.map(({ row, column, text }) => `<comment ref="${cellName(row, column)}" authorId="${author}"><text><r><t xml:space="preserve">${escapeXml(text)}</t></r></text></comment>`).join("");
    list = list.replace(/<commentList\s*\/>/, "<commentList></commentList>").replace("</commentList>", () => `${own}</commentList>`);
  } else {
    // ours was the last author, so taking it away moves no one else's number
    list = list.replace(`${AUTHOR}</authors>`, "</authors>");
  }
  if (drawing) {
    const shapes = pack.text(drawing).replace(OUR_SHAPE, "");
    pack.put(drawing, shapes.replace("</xml>", () => `${notes.map(shape).join("")}</xml>`));
  }
  pack.put(comments, list);

  if (notes.length === 0) {
    if (list === EMPTY_COMMENTS) {
      pack.remove(comments);
      removeContentType(pack, comments);
      removeLinks(pack, sheetPart, (link) => link.includes(`Id="${COMMENTS_ID}"`));
    }
    if (drawing && pack.text(drawing) === EMPTY_DRAWING && sheet.includes(LEGACY)) {
      pack.remove(drawing);
      removeLinks(pack, sheetPart, (link) => link.includes(`Id="${DRAWING_ID}"`));
      if (!pack.names().some((name) => name.endsWith(".vml"))) removeDefaultType(pack, "vml", VML_TYPE);
      sheet = sheet.replace(LEGACY, "");
    }
  }
  return sheet;
}

function freeName(pack: Package, name: (n: number) => string): string {
  let n = 1;
  while (pack.has(name(n))) n++;
  return name(n);
}

/** A part's name as seen from another: xl/worksheets/sheet1.xml to xl/comments1.xml is ../comments1.xml. */
function relative(from: string, to: string): string {
  const a = from.split("/").slice(0, -1), b = to.split("/");
  while (a.length > 0 && a[0] === b[0]) {
    a.shift();
    b.shift();
  }
  return [...a.map(() => ".."), ...b].join("/");
}
