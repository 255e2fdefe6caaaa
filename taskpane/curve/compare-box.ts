import { pickFromFamily, pickRules, type Family, type PickRule } from "../../src/compaction/family";
import { unitOfId, densityShown, tied, waterShown } from "../parts/figures";
import { h } from "../parts/dom";
import type { Comparison, ComparedTest } from "./compare";
import { typedNumber } from "./model";

export interface CompareWishes {
  keep(): void;
  drop(name: string): void;
  effort(name: string, text: string): void;
  show(test: string): void;
}

/** What is typed of the one-point method; it belongs to the moment, not to the workbook. */
export interface OnePoint { water: string; dry: string; rule: PickRule }

/** Several tests beside one another: their peaks, what their efforts say, and the family they form. */
export function compareBox(comparison: Comparison, point: OnePoint, wishes: CompareWishes): HTMLElement[] {
  const { tests, ownKept } = comparison, several = tests.length > 1;
  return [
    h("h2", {}, several ? `${tests.length} tests beside one another` : "Compare with other tests"),
    several ? testsTable(tests, wishes) : h("p", { class: "quiet" }, "Keep this test, then select another: their curves stand in one plot. Two efforts on one soil, or a family of curves, are read together."),
    ownKept ? null : h("div", { class: "buttons" }, h("button", { type: "button", id: "keep-test", onclick: () => wishes.keep() }, "Keep this test")),
    ...comparison.otherUnit.map((name) => h("p", { class: "trouble" }, `${name} is in another unit of density and is compared with nothing.`)),
    ...effortsWords(comparison).map((text) => h("p", { class: "compare-says" }, tied(text))),
    ...comparison.effortTroubles.map((text) => h("p", { class: "trouble" }, text)),
    ...(comparison.efforts?.contradictions ?? []).map((text) => h("p", { class: "trouble" }, text)),
    comparison.family ? familyBox(comparison.family, tests.find(({ fit }) => fit)!.unit!, point) : null,
  ].filter((one): one is HTMLElement => one !== null);
}

function testsTable(tests: readonly ComparedTest[], wishes: CompareWishes): HTMLElement {
  const unit = tests.find(({ fit }) => fit)?.unit ?? null, printed = unit ? unitOfId(unit)!.printed : "";
  const head = (text: string): HTMLElement => h("th", { scope: "col" }, text);
  return h("div", { class: "wide", role: "region", "aria-label": "Tests beside one another", tabindex: 0 }, h("table", { id: "compare-table" },
    h("thead", {}, h("tr", {}, head("Test"), head(`Peak${printed ? `, ${printed}` : ""}`), head("Optimum, %"), head("Effort, kJ/m³"), h("td", {}))),
    h("tbody", {}, ...tests.map((one, i) => {
      const effort = h("input", { type: "text", inputmode: "decimal", size: 5, id: `effort-${i}`, value: one.effort, autocomplete: "off", "aria-label": `Compactive effort of ${one.name}`, onchange: () => wishes.effort(one.name, effort.value) });
      return h("tr", { class: one.is === "own" ? "own" : null },
        h("th", { scope: "row" }, one.name),
        ...(one.fit ? [h("td", {}, densityShown(one.fit.maxDryDensity.value, one.unit!)), h("td", {}, waterShown(one.fit.optimumWater.value))] : [h("td", { colspan: 2, title: one.says }, "no peak")]),
        h("td", {}, effort),
        h("td", {}, one.is === "own" ? "shown" : h("button", { type: "button", class: "cell", "aria-label": `${one.is === "kept" ? "Drop" : "Show"} ${one.name}`, onclick: () => { if (one.is === "kept") wishes.drop(one.name); else wishes.show(one.name); } }, one.is === "kept" ? "Drop" : "Show")));
    }))));
}

const figure = (value: number, unit: string): string => `${value < 0 ? "\u2212" : "+"}${densityShown(Math.abs(value), unit)}`;

function effortsWords({ efforts, tests }: Comparison): string[] {
  if (!efforts) return [];
  const unit = tests.find(({ fit }) => fit)!.unit!, printed = unitOfId(unit)!.printed;
  return [
    ...efforts.steps.map(({ from, to, gainPerDecade, waterPerDecade }) => `From ${from} to ${to}: ${figure(gainPerDecade, unit)} ${printed} and ${waterPerDecade < 0 ? "\u2212" : "+"}${waterShown(Math.abs(waterPerDecade))} points for ten times the effort.`),
    efforts.gainShrinks === null ? "" : efforts.gainShrinks ? "Every further effort gains less, as it should." : "A further effort gains more than the one before: look at the peaks.",
    efforts.optimums ? `The optimums lie at ${efforts.optimums.from.toFixed(0)} to ${efforts.optimums.to.toFixed(0)} % saturation; the line of optimums is drawn at ${efforts.optimums.saturation.toFixed(0)} %.` : "",
  ].filter((text) => text !== "");
}

function familyBox(family: Family, unit: string, point: OnePoint): HTMLElement {
  const printed = unitOfId(unit)!.printed;
  const answer = h("p", { class: "compare-says", id: "one-point-answer", "aria-live": "polite" });
  const tell = (): void => {
    const water = typedNumber(point.water), dry = typedNumber(point.dry);
    if (point.water.trim() === "" && point.dry.trim() === "") { answer.textContent = ""; return; }
    if (water === undefined || dry === undefined) { answer.textContent = "Type the water content and the dry density of the compacted point."; return; }
    const picked = pickFromFamily(family, { water, dry }, point.rule);
    answer.textContent = tied(picked.ok ? `Peak ${densityShown(picked.peak.dry, unit)} ${printed} at ${waterShown(picked.peak.water)} %, from ${picked.curves.join(" and ")}.` : picked.says.charAt(0).toUpperCase() + picked.says.slice(1));
  };
  const field = (id: string, key: "water" | "dry", label: string): HTMLElement => {
    const input = h("input", { type: "text", inputmode: "decimal", size: 6, id, value: point[key], autocomplete: "off", oninput: () => { point[key] = input.value; tell(); } });
    return h("span", {}, h("label", { for: id }, label), " ", input);
  };
  const rule = h("select", { id: "one-point-rule", "aria-label": "How the peak is picked", onchange: () => { point.rule = rule.value as PickRule; tell(); } }, ...pickRules.map((word) => h("option", { value: word, selected: word === point.rule }, word === "between" ? "between curves" : "nearest curve")));
  tell();
  return h("details", { id: "family" }, h("summary", {}, "As a family: one-point method"),
    ...family.doubts.map((text) => h("p", { class: "trouble" }, text.charAt(0).toUpperCase() + text.slice(1))),
    h("div", { class: "one-point" }, field("one-point-water", "water", "Water, %"), field("one-point-dry", "dry", `Dry density, ${printed}`), rule), answer);
}
