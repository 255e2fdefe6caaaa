import type { Fit } from "../../src/compaction/fit";
import { cellName } from "../../src/workbook/address";
import { h } from "../parts/dom";
import { densityShown, waterShown } from "../parts/figures";
import type { Look } from "./model";

/** The peak without each point in turn: what the answer owes to single readings. */
export function leaveOneOutBox(look: Look, fit: Fit): HTMLElement | null {
  if (fit.curve === "top three" || look.table.points.length < 4) return null;
  const unit = look.unit!, { maxDryDensity, optimumWater } = fit;
  const outside = (value: number, { low, high }: { readonly low: number | null; readonly high: number | null }): boolean => (low !== null && value < low) || (high !== null && value > high);
  const head = (text: string): HTMLElement => h("th", { scope: "col" }, text);
  const figure = (text: string, out: boolean): HTMLElement => h("td", { class: out ? "outside-interval" : null }, out ? h("b", {}, text, h("span", { class: "off-screen" }, " outside the interval")) : text);
  return h("details", { id: "leave-one-out" }, h("summary", {}, "The peak without each point"),
    h("table", {},
      h("thead", {}, h("tr", {}, head("Without"), head(`Peak, ${unit.printed}`), head("Optimum, %"))),
      h("tbody", {}, ...fit.leaveOneOut().map((peak, i) => {
        const { row, column } = look.table.points[i]!.dryCells[0]!;
        return h("tr", {}, h("th", { scope: "row" }, cellName(row, column)), ...(peak
          ? [figure(densityShown(peak.dry, unit.id), outside(peak.dry, maxDryDensity)), figure(waterShown(peak.water), outside(peak.water, optimumWater))]
          : [h("td", { colspan: 2 }, "no peak without it")]));
      }))),
    h("p", { class: "quiet" }, "Bold: outside the 95 % interval; the peak hangs on that reading."));
}
