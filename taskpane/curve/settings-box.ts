import { curveWords, soilGrains, standardIds, type CurveWord, type SoilGrain, type StandardId } from "../../src/compaction/fit";
import { USUAL_SCATTER } from "../../src/compaction/scatter";
import { WATER_KG_M3_AT_20 } from "../../src/units/water-density";
import { cellName } from "../../src/workbook/address";
import { h } from "../parts/dom";
import type { Choices } from "./choices";
import { CURVE_NAMES, typedNumber, USUAL_STONE_WATER, type Look } from "./model";

/** The round figure for the density of water that sheets use, by unit. Common practice, no published source. */
const CONVENTION: Readonly<Record<string, string>> = { "Mg/m3": "1", "kg/m3": "1000", "kN/m3": "9.81", "lb/ft3": "62.4", "lb/yd3": "1685" };
const TYPING_MS = 350;

let typing: ReturnType<typeof setTimeout> | undefined;
/** Waits for a pause in the typing; leaving the field counts at once. */
function whenTyped(field: HTMLInputElement, take: (text: string) => void): void {
  const now = (): void => { clearTimeout(typing); take(field.value); };
  field.addEventListener("input", () => { clearTimeout(typing); typing = setTimeout(now, TYPING_MS); });
  field.addEventListener("change", now);
}

/** Curve, specific gravity and density of water. */
export function settingsBox(look: Look, choose: (change: Partial<Choices>) => void): HTMLElement[] {
  const { choices, specificGravity, unit, water, table } = look;
  const curve = h("select", { id: "curve", onchange: () => choose({ curve: curve.value as CurveWord }) },
    ...curveWords.map((word) => h("option", { value: word, selected: word === choices.curve }, CURVE_NAMES[word])));

  const gs = h("input", { type: "text", id: "gs", inputmode: "decimal", size: 6, autocomplete: "off", placeholder: "not given", value: specificGravity.text, "aria-describedby": "gs-note", "aria-invalid": specificGravity.trouble ? "true" : null });
  whenTyped(gs, (text) => { if (text !== specificGravity.text) choose({ specificGravity: text, ...(choices.assumed === null && specificGravity.from === "sheet" ? { assumed: false } : {}) }); });
  const assumed = h("input", { type: "checkbox", id: "gs-assumed", checked: specificGravity.assumed, disabled: specificGravity.value === null, onchange: () => choose({ assumed: assumed.checked }) });
  const note = specificGravity.trouble
    ?? (specificGravity.value === null ? "Without it there is no zero-air-voids line."
      : specificGravity.from === "sheet" && table.specificGravity ? `From ${cellName(table.specificGravity.cell.row, table.specificGravity.cell.column)}${specificGravity.assumed ? ", assumed" : ""}.`
        : specificGravity.assumed ? "Only assumed: a point past the line is a question first about this figure." : "");

  const at20 = unit ? Number((WATER_KG_M3_AT_20 / unit.kgM3).toPrecision(4)) : null;
  const convention = unit ? CONVENTION[unit.id]! : "";
  const typed = choices.waterDensity.trim();
  const kind = typed === "" ? "20" : typed === convention ? "convention" : "typed";
  const waterKind = h("select", { id: "water", onchange: () => choose({ waterDensity: waterKind.value === "20" ? "" : waterKind.value === "convention" ? convention : `${at20}` }) },
    h("option", { value: "20", selected: kind === "20" }, at20 === null ? "20 °C" : `20 °C: ${at20}`),
    unit ? h("option", { value: "convention", selected: kind === "convention" }, convention) : null,
    h("option", { value: "typed", selected: kind === "typed" }, "other…"));
  const waterTyped = kind === "typed" ? h("input", { type: "text", id: "water-typed", inputmode: "decimal", size: 7, autocomplete: "off", value: typed, "aria-label": "Density of water, typed", "aria-invalid": water.trouble ? "true" : null }) : null;
  if (waterTyped) whenTyped(waterTyped, (text) => { if (text.trim() !== typed) choose({ waterDensity: typedNumber(text) === undefined && text.trim() === "" ? "" : text }); });

  return [
    h("div", { class: "field" }, h("label", { for: "curve" }, "Curve"), curve),
    h("div", { class: "field" }, h("label", { for: "gs" }, "Specific gravity"), h("span", { class: "with-check" }, gs, h("label", { class: "check" }, assumed, " assumed"))),
    h("p", { class: specificGravity.trouble ? "trouble" : "quiet", id: "gs-note" }, note),
    h("div", { class: "field" }, h("label", { for: "water" }, `Density of water${unit ? `, ${unit.printed}` : ""}`), h("span", { class: "with-check" }, waterKind, waterTyped)),
    ...(water.trouble ? [h("p", { class: "trouble" }, water.trouble)] : []),
    moreBox(look, choose),
  ];
}

type TextChoice = "stonePercent" | "stoneGravity" | "stoneWater" | "pointScatter" | "wetScatter" | "waterScatter" | "reportedDry" | "reportedWater";

/** What most tests do not need: the grain of the soil, stated scatter, and a reported peak to hold against the curve. */
function moreBox(look: Look, choose: (change: Partial<Choices>) => void): HTMLElement {
  const { choices, unit } = look;
  const field = (key: TextChoice, label: string, usual: string): HTMLElement => {
    const id = `set-${key}`, input = h("input", { type: "text", id, inputmode: "decimal", size: 6, autocomplete: "off", placeholder: usual, value: choices[key] });
    whenTyped(input, (text) => { if (text !== choices[key]) choose({ [key]: text }); });
    return h("div", { class: "field" }, h("label", { for: id }, label), input);
  };
  const soil = h("select", { id: "soil", onchange: () => choose({ soil: (soil.value || null) as SoilGrain | null }) },
    h("option", { value: "", selected: choices.soil === null }, "not told"), ...soilGrains.map((grain) => h("option", { value: grain, selected: choices.soil === grain }, grain)));
  const standard = h("select", { id: "standard", onchange: () => choose({ standard: (standard.value || null) as StandardId | null }) },
    h("option", { value: "", selected: choices.standard === null }, "not told"), ...standardIds.map((id) => h("option", { value: id, selected: choices.standard === id }, id)));
  const weigh = h("input", { type: "checkbox", id: "weigh", checked: choices.weigh, onchange: () => choose({ weigh: weigh.checked }) });
  const { curve, wetDensity, water } = USUAL_SCATTER;
  return h("details", { id: "more" }, h("summary", {}, "Soil, oversize, scatter, reported peak"),
    h("div", { class: "settings" },
      h("div", { class: "field" }, h("label", { for: "soil" }, "Grain of the soil"), soil),
      field("stonePercent", "Oversize, % of dry mass", "none"),
      field("stoneGravity", "Bulk gravity of the oversize", "none"),
      field("stoneWater", "Water in the oversize, %", String(USUAL_STONE_WATER)),
      field("wetScatter", "Scatter of wet density, %", String(100 * wetDensity)),
      field("waterScatter", "Scatter of water content, points", String(water)),
      field("pointScatter", "Scatter about the curve, %", String(100 * curve)),
      h("label", { class: "check" }, weigh, " weigh points by the doubt of their readings"),
      field("reportedDry", `Reported peak${unit ? `, ${unit.printed}` : ""}`, "none"),
      field("reportedWater", "Reported optimum, %", "none"),
      h("div", { class: "field" }, h("label", { for: "standard" }, "Standard"), standard),
      ...look.settingTroubles.map((text) => h("p", { class: "trouble" }, text)),
      look.ownScatter ? h("p", { class: "quiet", id: "own-scatter" }, "Functions in the sheet use the usual scatter and equal weights: what is written there may differ from the figures here.") : null));
}
