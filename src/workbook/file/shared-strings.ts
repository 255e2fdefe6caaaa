import type { Package } from "./package";
import { decodeText, readXml } from "./xml";

/** The workbook's shared texts; formatting inside a text is passed over, and so are phonetic hints. */
export function readSharedStrings(pack: Package, part: string | undefined): string[] {
  if (!part || !pack.has(part)) return [];
  const strings: string[] = [];
  let text = "", inText = false, phonetic = 0;
  readXml(part, pack.text(part), pack.depth, {
    open(name) {
      if (name === "si") text = "";
      if (name === "rPh") phonetic++;
      if (name === "t") inText = phonetic === 0;
    },
    close(name) {
      if (name === "t") inText = false;
      if (name === "rPh") phonetic--;
      if (name === "si") strings.push(decodeText(text));
    },
    text(more) { if (inText) text += more; },
  });
  return strings;
}
