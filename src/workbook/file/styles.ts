import type { CellStyle } from "./book";
import type { Package } from "./package";
import { readXml, type Attributes } from "./xml";

/** Number formats that are known by their number alone. Source: ECMA-376, 18.8.30. */
const BUILT_IN: Readonly<Record<number, string>> = {
  1: "0", 2: "0.00", 3: "#,##0", 4: "#,##0.00", 9: "0%", 10: "0.00%", 11: "0.00E+00", 12: "# ?/?", 13: "# ??/??", 14: "m/d/yyyy", 15: "d-mmm-yy", 16: "d-mmm", 17: "mmm-yy", 18: "h:mm AM/PM", 19: "h:mm:ss AM/PM",
  20: "h:mm", 21: "h:mm:ss", 22: "m/d/yyyy h:mm", 37: "#,##0 ;(#,##0)", 38: "#,##0 ;[Red](#,##0)", 39: "#,##0.00;(#,##0.00)", 40: "#,##0.00;[Red](#,##0.00)", 45: "mm:ss", 46: "[h]:mm:ss", 47: "mm:ss.0", 48: "##0.0E+0", 49: "@",
};

/** The first 64 indexed colours. Source: ECMA-376, 18.8.27. */
const INDEXED = ("000000 FFFFFF FF0000 00FF00 0000FF FFFF00 FF00FF 00FFFF 000000 FFFFFF FF0000 00FF00 0000FF FFFF00 FF00FF 00FFFF 800000 008000 000080 808000 800080 008080 C0C0C0 808080 9999FF 993366 FFFFCC CCFFFF 660066 FF8080 0066CC CCCCFF " +
  "000080 FF00FF FFFF00 00FFFF 800080 800000 008080 0000FF 00CCFF CCFFFF CCFFCC FFFF99 99CCFF FF99CC CC99FF FFCC99 3366FF 33CCCC 99CC00 FFCC00 FF9900 FF6600 666699 969696 003366 339966 003300 333300 993300 993366 333399 333333").split(" ");

/** Lightens or darkens a colour as a tint asks (ECMA-376, 18.8.19), close enough for a screen: towards white or black. */
function tinted(hex: string, tint: number): string {
  const channel = (from: number): string => {
    const value = parseInt(hex.slice(from, from + 2), 16), to = tint < 0 ? value * (1 + tint) : value + (255 - value) * tint;
    return Math.round(Math.min(255, Math.max(0, to))).toString(16).padStart(2, "0");
  };
  return channel(0) + channel(2) + channel(4);
}

function themeColours(pack: Package, part: string | undefined): string[] {
  if (!part || !pack.has(part)) return [];
  const colours: string[] = [];
  let inside = false;
  readXml(part, pack.text(part), pack.depth, {
    open(name, { val = "", lastClr = "" }) {
      if (name === "clrScheme") inside = true;
      if (inside && name === "srgbClr") colours.push(val);
      if (inside && name === "sysClr") colours.push(lastClr || "000000");
    },
    close(name) { if (name === "clrScheme") inside = false; },
  });
  // a cell's theme index counts light before dark, the scheme lists dark before light
  const [dark1, light1, dark2, light2, ...rest] = colours;
  return dark1 && light1 && dark2 && light2 ? [light1, dark1, light2, dark2, ...rest] : colours;
}

type Draft = { -readonly [Key in keyof CellStyle]?: CellStyle[Key] };

/** The cell formats of a workbook, by the index that cells carry. */
export function readStyles(pack: Package, part: string | undefined, theme: string | undefined): CellStyle[] {
  if (!part || !pack.has(part)) return [{ format: "General" }];
  const scheme = themeColours(pack, theme);
  const colourOf = ({ rgb, theme: index, indexed, tint }: Attributes): string | undefined => {
    const hex = rgb?.slice(-6) ?? (index !== undefined ? scheme[Number(index)] : indexed !== undefined ? INDEXED[Number(indexed)] : undefined);
    return hex && /^[0-9a-f]{6}$/i.test(hex) ? `#${(tint ? tinted(hex, Number(tint)) : hex).toLowerCase()}` : undefined;
  };
  const formats = new Map(Object.entries(BUILT_IN).map(([id, code]) => [Number(id), code]));
  const fonts: Draft[] = [], fills: (string | undefined)[] = [], borders: NonNullable<CellStyle["borders"]>[] = [], styles: CellStyle[] = [];
  let section = "", side: string | undefined, style = "";
  let border: Record<string, { style: string; colour: string }> = {};
  let draft: Draft = { format: "General" };
  const on = ({ val }: Attributes): boolean => val === undefined || val === "1" || val === "true";

  readXml(part, pack.text(part), pack.depth, {
    open(name, at) {
      if (["fonts", "fills", "borders", "cellXfs", "cellStyleXfs", "dxfs", "numFmts"].includes(name)) section = name;
      if (section === "numFmts" && name === "numFmt") formats.set(Number(at.numFmtId), at.formatCode ?? "General");
      if (section === "fonts") {
        const font = fonts[fonts.length - 1];
        if (name === "font") fonts.push({});
        else if (font && name === "b") font.bold = on(at);
        else if (font && name === "i") font.italic = on(at);
        else if (font && name === "u") font.underline = at.val !== "none";
        else if (font && name === "sz") font.fontSize = Number(at.val);
        else if (font && name === "color") { const colour = colourOf(at); if (colour) font.colour = colour; }
      }
      if (section === "fills") {
        if (name === "fill") fills.push(undefined);
        if (name === "patternFill" && at.patternType !== "solid") style = "none";
        else if (name === "patternFill") style = "solid";
        if (name === "fgColor" && style === "solid") fills[fills.length - 1] = colourOf(at);
      }
      if (section === "borders") {
        if (name === "border") border = {};
        if (["left", "right", "top", "bottom"].includes(name)) { side = at.style && at.style !== "none" ? name : undefined; if (side) border[side] = { style: at.style!, colour: "#000000" }; }
        if (name === "color" && side) border[side] = { style: border[side]!.style, colour: colourOf(at) ?? "#000000" };
      }
      if (section === "cellXfs" && name === "xf") {
        const fill = fills[Number(at.fillId ?? 0)], lines = borders[Number(at.borderId ?? 0)];
        draft = { format: formats.get(Number(at.numFmtId ?? 0)) ?? "General", ...fonts[Number(at.fontId ?? 0)] };
        if (fill) draft.fill = fill;
        if (lines && Object.keys(lines).length > 0) draft.borders = lines;
      }
      if (section === "cellXfs" && name === "alignment") {
        if (at.horizontal === "left" || at.horizontal === "center" || at.horizontal === "right") draft.horizontal = at.horizontal;
        if (at.vertical === "top" || at.vertical === "center" || at.vertical === "bottom") draft.vertical = at.vertical;
        if (at.wrapText === "1" || at.wrapText === "true") draft.wrap = true;
      }
    },
    close(name) {
      if (section === "borders" && name === "border") borders.push(border);
      if (section === "cellXfs" && name === "xf") styles.push(draft as CellStyle);
      if (name === section) section = "";
    },
  });
  return styles.length > 0 ? styles : [{ format: "General" }];
}
