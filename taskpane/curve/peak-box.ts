import { curveName, type Fit } from "../../src/compaction/fit";
import { decimalsOfDensity, decimalsOfWater, intervalWords, tied } from "../parts/figures";
import { h } from "../parts/dom";
import { CURVE_NAMES, type Look } from "./model";

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}${/[.!?]$/.test(text) ? "" : "."}`;

/** The peak with its intervals, the curve it rests on, and what the soil is like there. */
export function peakBox(look: Look, fit: Fit): HTMLElement[] {
  const unit = look.unit!;
  const density = decimalsOfDensity(fit.maxDryDensity, unit.id), water = decimalsOfWater();
  const figure = (name: string, id: string, value: string, printed: string, interval: string, joined: string | null): HTMLElement =>
    h("div", { class: "figure" }, h("dt", {}, name), h("dd", { id }, h("strong", {}, value), ` ${printed}`), h("dd", { class: "interval" }, tied(interval)), joined === null ? null : h("dd", { class: "interval whichever", id: `${id}-whichever` }, tied(joined)));
  const whichever = fit.otherCurves.length > 0 ? fit.joined() : null;
  const boxes: (HTMLElement | null)[] = [
    h("dl", { class: "peak" },
      figure("Maximum dry density", "max-dry-density", fit.maxDryDensity.value.toFixed(density), unit.printed, intervalWords(fit.maxDryDensity, density), whichever && `any curve: ${span(whichever.maxDryDensity, density)}`),
      figure("Optimum water content", "optimum-water", fit.optimumWater.value.toFixed(water), "%", intervalWords(fit.optimumWater, water), whichever && `any curve: ${span(whichever.optimumWater, water)}`)),
    h("p", { class: "at-optimum", id: "at-optimum" }, fit.saturationAtOptimum === null || fit.airVoidsAtOptimum === null
      ? "Give a specific gravity to see saturation and air voids at the optimum."
      : tied(`At the optimum: saturation ${fit.saturationAtOptimum.toFixed(0)} %, air voids ${fit.airVoidsAtOptimum.toFixed(1)} %.`)),
    look.whole === null ? null : h("p", { class: "joined", id: "whole-soil" }, tied(`Whole soil with ${look.whole.oversize.percent} % oversize of ${look.whole.oversize.gravity} at ${look.whole.oversize.water} % water: ${look.whole.peak.dry.toFixed(density)} ${unit.printed} at ${look.whole.peak.water.toFixed(water)} %.`)),
    look.shownTest === null ? null : h("p", { class: "quiet" }, `Shown: ${look.shownTest}.`),
    fit.otherCurves.length > 0 ? h("p", { class: "joined", id: "joined" }, tied(joinedWords(look, fit))) : null,
    h("p", { class: "quiet", id: "why-curve" }, h("b", {}, CURVE_NAMES[fit.curve]), tied(`: ${sentence(fit.reason)} ${sentence(fit.intervalNote)}`)),
  ];
  return boxes.filter((one) => one !== null);
}

const span = ({ low, high }: { readonly low: number | null; readonly high: number | null }, decimals: number): string =>
  low === null && high === null ? "not located" : low === null ? `up to ${high!.toFixed(decimals)}` : high === null ? `from ${low.toFixed(decimals)}` : `${low.toFixed(decimals)} to ${high.toFixed(decimals)}`;

/** The other curves that follow the points as well, in one line. */
function joinedWords(look: Look, fit: Fit): string {
  const density = decimalsOfDensity(fit.maxDryDensity, look.unit!.id), water = decimalsOfWater();
  return `These follow the points as well: ${fit.otherCurves.map(({ curve, dry, water: at }) => `${curveName(curve)}, ${dry.toFixed(density)} at ${at.toFixed(water)} %`).join("; ")}.`;
}

/** The figures as lines of name, value, low and high, parted by tabs, as a sheet takes them. */
export function valuesText(look: Look, fit: Fit): string {
  const unit = look.unit!;
  const end = (value: number | null, decimals: number): string => value === null ? "not bounded" : value.toFixed(decimals);
  const density = decimalsOfDensity(fit.maxDryDensity, unit.id), water = decimalsOfWater();
  const { maxDryDensity, optimumWater } = fit;
  return [
    ["", "value", "low (95 %)", "high (95 %)"],
    [`Maximum dry density, ${unit.printed}`, maxDryDensity.value.toFixed(density), end(maxDryDensity.low, density), end(maxDryDensity.high, density)],
    ["Optimum water content, %", optimumWater.value.toFixed(water), end(optimumWater.low, water), end(optimumWater.high, water)],
    ["Curve", CURVE_NAMES[fit.curve].toLowerCase(), "", ""],
  ].map((line) => line.join("\t")).join("\n");
}
