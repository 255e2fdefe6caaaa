import { areaName, rangeName } from "../../src/workbook/address";
import { h, refill } from "../parts/dom";
import { copyText } from "../parts/copy";
import { tied } from "../parts/figures";
import { icon } from "../parts/icons";
import { cautions } from "./cautions";
import { columnsBox } from "./columns-box";
import { compareBox, type OnePoint } from "./compare-box";
import type { CurveController, Shown, View } from "./controller";
import { findingsBox } from "./findings-box";
import { leaveOneOutBox } from "./leave-one-out-box";
import { CURVE_NAMES, type Look } from "./model";
import { peakBox, valuesText } from "./peak-box";
import { PlotFigure } from "./plot-figure";
import { settingsBox } from "./settings-box";
import { PEAK_BLOCK } from "./peak-block";

/** The Curve view. It draws what the controller shows it and hands the user's wishes back. */
export class CurveView implements View {
  private readonly table = h("section", { class: "card", "aria-label": "What is selected", id: "table" });
  private readonly settings = h("section", { class: "card settings", "aria-label": "How it is fitted", id: "settings" });
  private readonly plot: PlotFigure;
  private readonly result = h("section", { class: "result", "aria-label": "Peak of the curve", id: "result" });
  private readonly findings = h("section", { class: "card", "aria-label": "What to look at", id: "findings" });
  private readonly compare = h("section", { class: "card compare", "aria-label": "Several tests", id: "compare" });
  private readonly onePoint: OnePoint = { water: "", dry: "", rule: "between" };
  private readonly actions = h("section", { class: "card actions", "aria-label": "In the sheet", id: "actions" });
  private readonly status = h("p", { class: "status", role: "status", "aria-live": "polite", id: "status" });
  private writeAt = "";
  private tableShown = "";

  constructor(pane: HTMLElement, private readonly controller: () => CurveController) {
    this.plot = new PlotFigure((area) => void this.controller().goTo(area));
    pane.replaceChildren(
      h("header", { class: "head" }, h("h1", {}, "Compaction curve"), h("span", { class: "maker" }, "Tampsheet")),
      h("main", {}, this.table, this.plot.element, this.result, this.settings, this.findings, this.compare, this.actions),
      this.status,
      h("footer", {}, h("details", { class: "cautions" }, h("summary", {}, cautions.line), h("ul", {}, ...cautions.full.map((text) => h("li", {}, text))))),
    );
  }

  announce(text: string): void {
    // the same words twice are still news
    this.status.textContent = "";
    this.status.textContent = text;
  }

  show({ look, instead, consent, canMark, comparison }: Shown): void {
    const readable = look !== null && look.kind !== "nothing";
    this.showTable(look, instead);
    refill(this.settings, ...(readable ? settingsBox(look, (change) => void this.controller().choose(change)) : []));
    this.plot.show(look);
    refill(this.result, ...(look?.fit ? [...peakBox(look, look.fit), leaveOneOutBox(look, look.fit)] : look?.noFit ? [noFitBox(look)] : []));
    refill(this.findings, ...(look && (look.fit || look.findings.length > 0) ? findingsBox(look, (area) => void this.controller().goTo(area)) : []));
    refill(this.compare, ...(look && comparison ? compareBox(comparison, this.onePoint, {
      keep: () => void this.controller().keepTest(), drop: (name) => void this.controller().dropTest(name),
      effort: (name, text) => void this.controller().setEffort(name, text), show: (test) => void this.controller().choose({ test }),
    }) : []));
    const asked = document.getElementById("consent") !== null;
    this.showActions(look, consent, canMark);
    // the question is answered where it is put; Keep is the safe answer
    if (consent && !asked) document.getElementById("keep")?.focus();
    if (!consent && asked) document.getElementById("write")?.focus({ preventScroll: true });
    for (const section of [this.settings, this.result, this.findings, this.compare, this.actions]) section.hidden = section.childElementCount === 0;
  }

  private showTable(look: Look | null, instead: string | null): void {
    if (look === null || look.kind === "nothing") return refill(this.table, ...emptyState(instead ?? "The selection holds no laboratory test."));
    const { table } = look;
    const { sheet } = table.area;
    // what was unfolded, and where to write, belong to the table before
    if (areaName(table.area) !== this.tableShown) {
      this.table.replaceChildren();
      this.writeAt = "";
    }
    this.tableShown = areaName(table.area);
    refill(this.table,
      h("p", { class: "recognised", id: "recognised" }, look.recognised || `${rangeName(table.area)}: not read yet`),
      ...(table.notes.length > 0 ? [h("ul", { class: "notes" }, ...table.notes.map((text) => h("li", {}, text)))] : []),
      ...(table.problems.length > 0 ? [h("div", { class: "problems", role: "group", "aria-label": "Readings to mend" },
        h("h2", {}, table.points.length > 0 ? "Mend these first: the curve waits for them" : "This cannot be read yet"),
        h("ul", {}, ...table.problems.map(({ cell, says }) => h("li", {},
          icon("doubtful"),
          cell ? h("button", { type: "button", class: "cell", onclick: () => void this.controller().goTo({ sheet, ...cell, rows: 1, columns: 1 }) }, rangeName({ ...cell, rows: 1, columns: 1 })) : null,
          h("span", {}, says)))))] : []),
      columnsBox(look, (change) => void this.controller().choose(change)),
    );
  }

  private showActions(look: Look | null, consent: Shown["consent"], canMark: boolean): void {
    if (look === null || (!look.fit && !look.noFit)) return refill(this.actions);
    const fit = look.fit;
    const at = h("input", { type: "text", id: "write-at", value: this.writeAt, placeholder: "first free block", size: 14, autocomplete: "off", spellcheck: "false", "aria-describedby": "write-hint", oninput: () => { this.writeAt = at.value; } });
    refill(this.actions,
      canMark ? h("div", { class: "buttons" },
        h("button", { type: "button", id: "mark", onclick: () => void this.controller().mark() }, "Mark points"),
        h("button", { type: "button", id: "unmark", onclick: () => void this.controller().unmark() }, "Unmark")) : null,
      fit ? h("form", { class: "write", onsubmit: (event) => { event.preventDefault(); void this.controller().write(this.writeAt, PEAK_BLOCK); } },
        h("label", { for: "write-at" }, "Write to"), at, h("button", { type: "submit", id: "write", class: "main" }, "Write to sheet"),
        h("p", { class: "quiet", id: "write-hint" }, "Live formulas; they follow the readings. A cell such as H4, or nothing for the first free block beside the table.")) : null,
      consent ? this.consentBox(consent) : null,
      fit ? h("div", { class: "buttons" }, h("button", { type: "button", id: "copy", onclick: () => void this.copy(look) }, "Copy values")) : null,
    );
  }

  private consentBox({ cells, count, at }: NonNullable<Shown["consent"]>): HTMLElement {
    return h("div", { class: "consent", role: "group", "aria-labelledby": "consent-title", id: "consent" },
      h("h2", { id: "consent-title" }, count === 1 ? "Replace this cell?" : `Replace these ${count} cells?`),
      h("p", {}, `Writing at ${at} would overwrite ${cells.map(rangeName).join(", ")}.`),
      h("div", { class: "buttons" },
        h("button", { type: "button", id: "replace", class: "danger", onclick: () => void this.controller().replace() }, "Replace"),
        h("button", { type: "button", id: "keep", onclick: () => this.controller().keep() }, "Keep them")));
  }

  private async copy(look: Look): Promise<void> {
    const done = await copyText(valuesText(look, look.fit!));
    this.announce(done ? "Copied the values." : "The clipboard is not open to the pane here: write them to the sheet instead.");
  }
}

function noFitBox(look: Look): HTMLElement {
  const says = look.noFit!.says;
  return h("div", { class: "no-fit" }, h("h2", {}, look.choices.curve === "auto" ? "No peak is shown" : `No peak by ${CURVE_NAMES[look.choices.curve].toLowerCase()}`), h("p", {}, tied(says.charAt(0).toUpperCase() + says.slice(1))));
}

function emptyState(instead: string): HTMLElement[] {
  return [
    h("p", { class: "recognised" }, instead),
    h("p", { class: "quiet" }, "The pane follows the selection. It reads:"),
    h("ul", { class: "notes" },
      h("li", {}, "two columns (or rows): water content and dry density, with or without headings;"),
      h("li", {}, "a whole table with its headings, units in brackets or in a row below;"),
      h("li", {}, "raw readings: mould with soil, mould, volume, and tins before and after the oven.")),
  ];
}

