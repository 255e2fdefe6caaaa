import { rangeName } from "../../src/workbook/address";
import type { Area } from "../../src/workbook/port";
import { h } from "../parts/dom";
import { tied } from "../parts/figures";
import { icon } from "../parts/icons";
import { SEVERITY_WORDS, type Look } from "./model";

/** What a reviewer should look at, the weightiest first. Each point's cell is a button that goes there. */
export function findingsBox(look: Look, goTo: (area: Area) => void): HTMLElement[] {
  const { findings } = look;
  if (findings.length === 0) return [h("p", { class: "all-good" }, icon("good"), h("span", {}, look.specificGravity.value === null ? "Nothing to look at among these points. Without a specific gravity the zero-air-voids line was not looked at." : "Nothing to look at among these points."))];
  return [
    h("h2", {}, "What to look at"),
    h("ul", { class: "findings" }, ...findings.map(({ severity, says, area, id }) => h("li", { class: `finding finding-${severity}`, "data-finding": id },
      icon(severity),
      h("div", {},
        h("b", {}, SEVERITY_WORDS[severity]), " ",
        area ? h("button", { type: "button", class: "cell", "aria-label": `Go to ${rangeName(area)}`, onclick: () => goTo(area) }, rangeName(area)) : h("span", { class: "quiet" }, "whole test"),
        h("p", {}, tied(`${says.charAt(0).toUpperCase()}${says.slice(1)}`)))))),
  ];
}
