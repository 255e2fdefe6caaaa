import type { Package } from "./package";
import { fromPieces, inPieces, pieceName } from "../pieces";
import { addContentType, addLink, linksOf, removeContentType, removeLinks } from "./relations";
import { escapeXml, readXml } from "./xml";

/**
 * Our settings travel as custom document properties, which every host of .xlsx files keeps: `Tampsheet.gs`, `Tampsheet.columns`.
 */
const PREFIX = "Tampsheet.";
const PART = "docProps/custom.xml";
const TYPE = "application/vnd.openxmlformats-officedocument.custom-properties+xml";
const RELATION = "http://schemas.openxmlformats.org/officeDocument/2006/relationships/custom-properties";
const FORMAT_ID = "{D5CDD505-2E9C-101B-9397-08002B2CF9AE}";
const HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n<Properties xmlns="http://schemas.openxmlformats.org/officeDocument/2006/custom-properties" xmlns:vt="http://schemas.openxmlformats.org/officeDocument/2006/docPropsVTypes">';
const OURS = /<property\s[^>]*name="Tampsheet\.[^"]*"[^>]*>[\s\S]*?<\/property>/g;

const partOf = (pack: Package): string | undefined => linksOf(pack, "").find(({ type }) => type === "custom-properties")?.target;

export function readSettings(pack: Package): Record<string, string> {
  const part = partOf(pack), settings = new Map<string, string>();
  if (!part || !pack.has(part)) return {};
  let name = "", text = "";
  readXml(part, pack.text(part), pack.depth, {
    open(tag, at) { if (tag === "property") { name = at.name ?? ""; text = ""; } },
    text(more) { text += more; },
    close(tag) { if (tag === "property" && name.startsWith(PREFIX)) settings.set(name.slice(PREFIX.length), text); },
  });
  return Object.fromEntries(fromPieces(settings));
}

/** Makes our settings exactly these; other properties stay. A part that only we needed goes when ours are gone. */
export function writeSettings(pack: Package, settings: Readonly<Record<string, string>>): void {
  const part = partOf(pack), properties = Object.entries(settings).flatMap(([name, text]) => inPieces(text).map((piece, i) => [pieceName(name, i + 1), piece] as const));
  if (!part && properties.length === 0) return;
  const before = part && pack.has(part) ? pack.text(part).replace(/<Properties([^>]*)\/>/, "<Properties$1></Properties>") : `${HEAD}</Properties>`;
  const others = before.replace(OURS, "");
  if (properties.length === 0 && others === `${HEAD}</Properties>` && part === PART) {
    pack.remove(PART);
    removeContentType(pack, PART);
    removeLinks(pack, "", (link) => link.includes(RELATION));
    return;
  }
  const pids = [...others.matchAll(/\spid="(\d+)"/g)].map((match) => Number(match[1]));
  let pid = Math.max(1, ...pids);
  const own = properties.map(([name, text]) => `<property fmtid="${FORMAT_ID}" pid="${++pid}" name="${escapeXml(PREFIX + name)}"><vt:lpwstr>${escapeXml(text)}</vt:lpwstr></property>`).join("");
  pack.put(part ?? PART, others.replace("</Properties>", `${own}</Properties>`));
  if (!part) {
    addContentType(pack, PART, TYPE);
    addLink(pack, "", "rIdTampsheetSettings", RELATION, PART);
  }
}
