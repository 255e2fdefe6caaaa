import type { Area } from "../../src/workbook/port";
import { cellName } from "../../src/workbook/address";
import { drawPlot } from "../plot/plot";
import { h, refill } from "../parts/dom";
import { densityShown, waterShown } from "../parts/figures";
import { plotWords, pointWords, type Look } from "./model";

const NARROWEST = 250, WIDEST = 640;

/** The plot with what makes it usable without a mouse or without sight: a button on every point, words, and a table. */
export class PlotFigure {
  readonly element: HTMLElement;
  private readonly stage = h("div", { class: "stage" });
  private readonly told = h("figcaption", { class: "told", id: "told" });
  private readonly data = h("div", { class: "data" });
  private look: Look | null = null;
  private width = 0;
  private chosen = 0;

  constructor(private readonly goTo: (area: Area) => void) {
    this.element = h("figure", { class: "plot", id: "plot" }, this.stage, this.told, this.data);
    new ResizeObserver(() => { if (Math.abs(this.stage.clientWidth - this.width) > 1) this.draw(); }).observe(this.stage);
  }

  show(look: Look | null): void {
    this.look = look;
    this.element.hidden = !look?.plot;
    if (this.chosen >= (look?.table.points.length ?? 0)) this.chosen = 0;
    this.draw();
    refill(this.data, look?.plot ? dataTable(look) : null);
  }

  private draw(): void {
    const { look } = this;
    if (!look?.plot) return this.stage.replaceChildren();
    this.width = this.stage.clientWidth;
    const width = Math.min(WIDEST, Math.max(NARROWEST, this.width)), height = Math.round(Math.min(360, Math.max(235, width * 0.78)));
    const drawing = drawPlot(look.plot, { width, height }, plotWords(look));
    const focused = this.stage.contains(document.activeElement);
    const canvas = h("div", { class: "canvas" });
    canvas.innerHTML = drawing.svg;
    const buttons = drawing.spots.map((spot, i) => this.spotButton(look, i, spot));
    this.stage.replaceChildren(canvas, h("div", { class: "spots", role: "group", "aria-label": "Points; arrow keys move between them" }, ...buttons));
    this.told.textContent = legend(look);
    if (focused) buttons[this.chosen]?.focus({ preventScroll: true });
  }

  private spotButton(look: Look, index: number, { x, y }: { x: number; y: number }): HTMLButtonElement {
    const words = pointWords(look, index);
    const cell = look.table.points[index]!.dryCells[0]!;
    const tell = (): void => { this.told.textContent = words; };
    const hush = (): void => { this.told.textContent = legend(look); };
    const button = h("button", {
      type: "button", class: "spot", title: words, "aria-label": words, tabindex: index === this.chosen ? 0 : -1, "data-point": index,
      onclick: () => this.goTo({ sheet: look.table.area.sheet, ...cell, rows: 1, columns: 1 }),
      onfocus: () => { this.chosen = index; tell(); }, onblur: hush, onmouseenter: tell, onmouseleave: hush,
      onkeydown: (event) => this.move(event as KeyboardEvent, index),
    });
    button.style.left = `${x * 100}%`;
    button.style.top = `${y * 100}%`;
    return button;
  }

  /** One stop for the tab key; arrows go along the water contents. */
  private move(event: KeyboardEvent, index: number): void {
    const order = this.look!.table.points.map(({ water }, i) => ({ water, i })).sort((a, b) => a.water - b.water).map(({ i }) => i);
    const at = order.indexOf(index);
    const to = { ArrowRight: at + 1, ArrowUp: at + 1, ArrowLeft: at - 1, ArrowDown: at - 1, Home: 0, End: order.length - 1 }[event.key];
    const next = to === undefined ? undefined : order[to];
    if (to === undefined) return;
    event.preventDefault();
    if (next === undefined) return;
    const buttons = this.stage.querySelectorAll<HTMLButtonElement>(".spot");
    buttons.forEach((button, i) => { button.tabIndex = i === next ? 0 : -1; });
    buttons[next]?.focus();
  }
}

/** With its sign, and no sign on what rounds to nothing. */
function signed(value: number, unit: string): string {
  const shown = densityShown(Math.abs(value), unit);
  return Number(shown) === 0 ? shown : `${value > 0 ? "+" : "\u2212"}${shown}`;
}

function legend(look: Look): string {
  const past = look.marks.includes("past-line");
  return [
    look.fit ? "Line: fitted curve; shade: its 95 % band; cross: peak with its intervals." : "No curve is fitted.",
    past ? "Diamond: past the zero-air-voids line." : "",
    look.plot!.lines.length === 0 ? "" : `Air-voids lines for a specific gravity of ${look.specificGravity.value}.`,
  ].filter((part) => part !== "").join(" ");
}

function dataTable(look: Look): HTMLElement {
  const unit = look.unit!;
  const least = look.leastSpecificGravities.some((value) => value !== null);
  const head = (text: string): HTMLElement => h("th", { scope: "col" }, text);
  return h("details", { id: "plot-data" }, h("summary", {}, "The plot as a table"),
    h("table", {},
      h("thead", {}, h("tr", {}, head("Cell"), head("Water, %"), head(`Dry density, ${unit.printed}`), look.fit ? head("Off the curve") : null, least ? head("Least specific gravity") : null)),
      h("tbody", {}, ...look.table.points.map((point, i) => {
        const { row, column } = point.dryCells[0]!;
        const off = look.fit?.residuals[i];
        const gs = look.leastSpecificGravities[i];
        return h("tr", {}, h("th", { scope: "row" }, cellName(row, column)), h("td", {}, waterShown(point.water)), h("td", {}, densityShown(point.dry, unit.id)),
          look.fit ? h("td", {}, off === undefined ? "" : signed(off, unit.id)) : null,
          least ? h("td", {}, gs === null || gs === undefined ? "" : gs > 0 ? gs.toFixed(2) : "none") : null);
      }))));
}
