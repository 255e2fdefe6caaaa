import { h } from "./parts/dom";

/** The pane opened on its own, as a page: what it is and how to start it. */
export function showOutside(pane: HTMLElement): void {
  pane.replaceChildren(h("main", { class: "outside" },
    h("h1", {}, "Tampsheet"),
    h("p", {}, "This is the side pane of a spreadsheet add-in. It reads the table selected in a workbook, and no workbook is open beside it here."),
    h("h2", {}, "How to start it"),
    h("ul", {},
      h("li", {}, "In the browser: run ", h("code", {}, "npm start"), " in the project's folder. It opens the bench, a spreadsheet with this pane beside it."),
      h("li", {}, "In your spreadsheet program: load the add-in's manifest, then choose the pane on the ribbon.")),
    h("p", { class: "quiet" }, "Nothing leaves your machine: every number is computed here."),
  ));
}
