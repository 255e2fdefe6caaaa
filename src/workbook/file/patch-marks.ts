import { rangeName } from "../address";
import { markFormula, markKindOf, type MarkKind } from "../port";
import type { BookMark } from "./book";
import type { Package } from "./package";
import { escapeXml, unescapeXml } from "./xml";

/** What comes after conditional formats in a worksheet. Source: ECMA-376, 18.3.1.99, the order of its parts. */
const AFTER = /<(?:dataValidations|hyperlinks|printOptions|pageMargins|pageSetup|headerFooter|rowBreaks|colBreaks|customProperties|cellWatches|ignoredErrors|smartTags|drawing|legacyDrawing|legacyDrawingHF|drawingHF|picture|oleObjects|controls|webPublishItems|tableParts|extLst)[\s>/]|<\/worksheet>/;
const RULE = /<cfRule\b(?:[^>/]|\/(?!>))*>(?:(?!<\/cfRule>)[\s\S])*<\/cfRule>/g;
const NO_RULES = /<conditionalFormatting\b[^>]*>\s*<\/conditionalFormatting>/g;

const isOurs = (rule: string): boolean => markKindOf(unescapeXml(rule)) !== undefined;
const carriesOurs = (xml: string): boolean => (xml.match(RULE) ?? []).some(isOurs);
/** The sheet without our rules, also where another program has saved them in its own words or beside a rule of the user's. */
const withoutOurs = (xml: string): string => carriesOurs(xml) ? xml.replace(RULE, (rule) => isOurs(rule) ? "" : rule).replace(NO_RULES, "") : xml;

const look = (ink: string, fill: string): string => `<dxf><font><color rgb="FF${ink}"/></font><fill><patternFill><bgColor rgb="FF${fill}"/></patternFill></fill></dxf>`;
const LOOKS: Readonly<Record<MarkKind, string>> = { "past-line": look("7A1F05", "FFD9CC"), doubtful: look("5E4300", "FFEEC2"), ask: look("123F66", "DCEBFA") };

/** Makes the marks of a sheet exactly these. Without any, the sheet's XML is as it was before the first. */
export function patchMarks(pack: Package, xml: string, marks: readonly BookMark[], stylesPart: string): string {
  const bare = withoutOurs(xml);
  if (marks.length === 0) return bare;
  const priorities = [...bare.matchAll(/<cfRule\s[^>]*priority="(\d+)"/g)].map((match) => Number(match[1]));
  let priority = Math.max(0, ...priorities);
  const own = marks.map(({ kind, ranges }) => `<conditionalFormatting sqref="${ranges.map(rangeName).join(" ")}"><cfRule type="expression" dxfId="${lookIndex(pack, stylesPart, kind)}" priority="${++priority}"><formula>${escapeXml(markFormula(kind))}</formula></cfRule></conditionalFormatting>`);
  return bare.replace(AFTER, (next) => own.join("") + next);
}

function lookIndex(pack: Package, stylesPart: string, kind: MarkKind): number {
  let xml = pack.text(stylesPart);
  const list = /<dxfs[^>]*>([\s\S]*?)<\/dxfs>/.exec(xml);
  const known = list ? [...list[1]!.matchAll(/<dxf\b[^>]*?(?:\/>|>[\s\S]*?<\/dxf>)/g)].map((match) => match[0]) : [];
  const found = known.indexOf(LOOKS[kind]);
  if (found >= 0) return found;
  if (list) xml = xml.replace(/<dxfs[^>]*>/, `<dxfs count="${known.length + 1}">`).replace("</dxfs>", () => `${LOOKS[kind]}</dxfs>`);
  else if (/<dxfs[^>]*\/>/.test(xml)) xml = xml.replace(/<dxfs[^>]*\/>/, () => `<dxfs count="1">${LOOKS[kind]}</dxfs>`);
  else xml = xml.replace(/<(?:tableStyles|colors|extLst)[\s>/]|<\/styleSheet>/, (next) => `<dxfs count="1">${LOOKS[kind]}</dxfs>${next}`);
  pack.put(stylesPart, xml);
  return known.length;
}

/** Takes our looks away from the end of the list once no sheet carries a mark of ours. */
export function dropLooks(pack: Package, stylesPart: string, sheetParts: readonly string[]): void {
  if (!pack.has(stylesPart) || sheetParts.some((part) => carriesOurs(pack.text(part)))) return;
  let xml = pack.text(stylesPart);
  for (;;) {
    const list = /<dxfs[^>]*>([\s\S]*?)<\/dxfs>/.exec(xml);
    const last = list && Object.values(LOOKS).find((one) => list[1]!.endsWith(one));
    if (!list || !last) break;
    const rest = list[1]!.slice(0, -last.length), count = (rest.match(/<dxf[\s>/]/g) ?? []).length;
    xml = xml.replace(list[0], () => count === 0 ? '<dxfs count="0"/>' : `<dxfs count="${count}">${rest}</dxfs>`);
  }
  pack.put(stylesPart, xml);
}
