import type { Package } from "./package";
import { escapeXml, readXml } from "./xml";

export interface Link { readonly id: string; readonly type: string; readonly target: string; readonly external: boolean }

const partOf = (name: string): string => {
  const slash = name.lastIndexOf("/");
  return `${name.slice(0, slash + 1)}_rels/${name.slice(slash + 1)}.rels`;
};

/** A target as a part's name: relative to the part it stands in, or from the root. */
function resolve(from: string, target: string): string {
  if (target.startsWith("/")) return target.slice(1);
  const steps = from.split("/").slice(0, -1);
  for (const step of target.split("/")) {
    if (step === "..") steps.pop();
    else if (step !== ".") steps.push(step);
  }
  return steps.join("/");
}

/** What a part refers to. */
export function linksOf(pack: Package, part: string): Link[] {
  const name = partOf(part);
  if (!pack.has(name)) return [];
  const links: Link[] = [];
  readXml(name, pack.text(name), pack.depth, {
    open(tag, { Id = "", Type = "", Target = "", TargetMode = "" }) {
      if (tag === "Relationship") links.push({ id: Id, type: Type.slice(Type.lastIndexOf("/") + 1), target: TargetMode === "External" ? Target : resolve(part, Target), external: TargetMode === "External" });
    },
  });
  return links;
}

const EMPTY = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"></Relationships>';

/** Adds a link from a part; `target` as it is to be written. */
export function addLink(pack: Package, part: string, id: string, type: string, target: string): void {
  const name = partOf(part), xml = (pack.has(name) ? pack.text(name) : EMPTY).replace(/<Relationships([^>]*)\/>/, "<Relationships$1></Relationships>");
  pack.put(name, xml.replace("</Relationships>", `<Relationship Id="${id}" Type="${escapeXml(type)}" Target="${escapeXml(target)}"/></Relationships>`));
}

/** Takes links away; a relations part that only held them goes too. */
export function removeLinks(pack: Package, part: string, which: (link: string) => boolean): void {
  const name = partOf(part);
  if (!pack.has(name)) return;
  const xml = pack.text(name).replace(/<Relationship\s[^>]*?\/>/g, (link) => which(link) ? "" : link);
  if (xml === EMPTY) pack.remove(name); else pack.put(name, xml);
}

export const TYPES = "[Content_Types].xml";

export function addContentType(pack: Package, part: string, type: string): void {
  const xml = pack.text(TYPES), own = `<Override PartName="/${part}" ContentType="${type}"/>`;
  if (!xml.includes(`PartName="/${part}"`)) pack.put(TYPES, xml.replace("</Types>", `${own}</Types>`));
}

export function removeContentType(pack: Package, part: string): void {
  pack.put(TYPES, pack.text(TYPES).replace(/<Override\s[^>]*?\/>/g, (own) => own.includes(`PartName="/${part}"`) ? "" : own));
}

/** A default type by file ending. Says whether it had to be added. */
export function addDefaultType(pack: Package, ending: string, type: string): void {
  const xml = pack.text(TYPES);
  if (!new RegExp(`<Default\\s[^>]*Extension="${ending}"`, "i").test(xml)) pack.put(TYPES, xml.replace(/(<Types[^>]*>)/, `$1<Default Extension="${ending}" ContentType="${type}"/>`));
}

export function removeDefaultType(pack: Package, ending: string, type: string): void {
  pack.put(TYPES, pack.text(TYPES).replace(`<Default Extension="${ending}" ContentType="${type}"/>`, ""));
}
