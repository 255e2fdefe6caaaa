import { SaxesParser } from "saxes";
import { BookRefusal } from "./book";

export type Attributes = Readonly<Record<string, string>>;

export interface Handler {
  open?(name: string, attributes: Attributes): void;
  close?(name: string): void;
  text?(text: string): void;
}

const local = (name: string): string => name.slice(name.indexOf(":") + 1);

/** Reads XML as a stream of local names. Document types, which could smuggle in entities, are refused. */
export function readXml(part: string, xml: string, depth: number, { open, close, text }: Handler): void {
  const parser = new SaxesParser({ xmlns: false, position: false });
  let level = 0;
  parser.on("error", (error) => { throw new BookRefusal("damaged", `the part ${part} is damaged (${error.message.split("\n")[0]}).`); });
  parser.on("doctype", () => { throw new BookRefusal("damaged", `the part ${part} declares a document type, which a workbook has no use for.`); });
  parser.on("opentag", (tag) => {
    if (++level > depth) throw new BookRefusal("damaged", `the part ${part} is nested too deeply.`);
    open?.(local(tag.name), tag.attributes as Attributes);
  });
  parser.on("closetag", (tag) => {
    level--;
    close?.(local(tag.name));
  });
  if (text) {
    parser.on("text", text);
    parser.on("cdata", text);
  }
  parser.write(xml).close();
}

export const escapeXml = (text: string): string => text.replace(/[&<>"]/g, (sign) => ({ "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" })[sign]!)
  // signs that XML cannot hold are written as spreadsheets do
  .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, (sign) => `_x${sign.charCodeAt(0).toString(16).toUpperCase().padStart(4, "0")}_`);

const ENTITIES: Readonly<Record<string, string>> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };
export const unescapeXml = (text: string): string => text.replace(/&(#x[0-9a-f]+|#\d+|\w+);/gi, (whole, name: string) =>
  name[0] === "#" ? String.fromCodePoint(name[1] === "x" || name[1] === "X" ? parseInt(name.slice(2), 16) : Number(name.slice(1))) : ENTITIES[name] ?? whole);

/** `_x000D_` in a stored text is one sign. */
export const decodeText = (text: string): string => text.includes("_x") ? text.replace(/_x([0-9A-Fa-f]{4})_/g, (_, code: string) => String.fromCharCode(parseInt(code, 16))) : text;
