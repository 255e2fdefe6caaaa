import { placeLabel, type Spot } from "./labels";
import { scaleOver } from "./scale";

/** How a point is drawn: shape and colour tell the same. */
export type PointMark = "plain" | "past-line" | "doubtful" | "ask";

export interface PlotPoint { readonly water: number; readonly dry: number; readonly mark: PointMark; /** the curve was fitted to it */ readonly used: boolean }

interface Interval { readonly low: number | null; readonly high: number | null }

export interface PlotData {
  readonly points: readonly PlotPoint[];
  readonly curve: { at(water: number): number; bandAt(water: number): { readonly low: number; readonly high: number } } | null;
  readonly peak: { readonly water: number; readonly dry: number; readonly waterInterval: Interval; readonly dryInterval: Interval } | null;
  /** the zero-air-voids line first, then its sister lines */
  readonly lines: readonly { /** the first that finds room on the line is drawn */ readonly labels: readonly string[]; at(water: number): number }[];
  readonly unit: string;
  /** curves of other tests, drawn faintly with their peaks */
  readonly beside: readonly { readonly name: string; readonly from: number; readonly to: number; readonly peak: { readonly water: number; readonly dry: number }; at(water: number): number }[];
}

export interface Drawing {
  readonly svg: string;
  /** where each point stands, as shares of width and height, for what is laid over the drawing */
  readonly spots: readonly { readonly x: number; readonly y: number }[];
}

const MARGIN = { left: 52, right: 10, top: 10, bottom: 40 } as const;
const SAMPLES = 80;
/** mean width of a letter of a label, in pixels */
const LETTER = 5.6;

const n = (value: number): string => String(Math.round(value * 10) / 10);
const escape = (text: string): string => text.replace(/[&<>"]/g, (sign) => ({ "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" })[sign]!);

/** Draws one compaction test as SVG: lines of air voids, the curve with its band, the peak with its intervals, the points. */
export function drawPlot(data: PlotData, size: { readonly width: number; readonly height: number }, description: string): Drawing {
  const { width, height } = size;
  const frame = { left: MARGIN.left, right: width - MARGIN.right, top: MARGIN.top, bottom: height - MARGIN.bottom };
  const faint = data.beside.map(({ name, from, to, peak, at }) => ({ name, peak, path: Array.from({ length: SAMPLES + 1 }, (_, i): [number, number] => { const water = from + (to - from) * i / SAMPLES; return [water, at(water)]; }) }));
  const waters = [...data.points.map(({ water }) => water), ...faint.flatMap(({ path: all }) => [all[0]![0], all[SAMPLES]![0]])], dries = [...data.points.map(({ dry }) => dry), ...faint.flatMap(({ path: all }) => all.map(([, dry]) => dry))];
  const first = Math.min(...waters), last = Math.max(...waters);
  const lowest = Math.min(...dries), highest = Math.max(...dries);
  const spread = highest - lowest || highest * 0.02;

  const own = data.points.map(({ water }) => water), driest = Math.min(...own), wettest = Math.max(...own);
  const along = Array.from({ length: SAMPLES + 1 }, (_, i) => driest + (wettest - driest) * i / SAMPLES);
  const curve = data.curve;
  const onCurve = curve ? along.map((water) => curve.at(water)) : [];
  const band = curve ? along.map((water) => curve.bandAt(water)) : [];
  // a wide band must not squeeze the points into a corner
  const reach = (value: number): number => Math.min(highest + 0.6 * spread, Math.max(lowest - 0.6 * spread, value));
  const tall = [...dries, ...onCurve, ...band.flatMap(({ low, high }) => [reach(low), reach(high)]), ...[data.peak?.dryInterval.low, data.peak?.dryInterval.high].filter((end) => typeof end === "number").map(reach)];
  const x = scaleOver(first, last, [frame.left, frame.right], Math.max(3, Math.floor((frame.right - frame.left) / 48)), 0.09);
  const y = scaleOver(Math.min(...tall), Math.max(...tall), [frame.bottom, frame.top], Math.max(3, Math.floor((frame.bottom - frame.top) / 34)), 0.1);

  const path = (values: readonly (readonly [number, number])[]): string => values.map(([water, dry], i) => `${i ? "L" : "M"}${n(x.px(water))} ${n(y.px(dry))}`).join("");
  const across = Array.from({ length: SAMPLES + 1 }, (_, i) => x.from + (x.to - x.from) * i / SAMPLES);
  const spots = data.points.map(({ water, dry }) => ({ x: x.px(water), y: y.px(dry) }));

  const parts: string[] = [];
  for (const tick of x.ticks) parts.push(`<line class="plot-grid" x1="${n(x.px(tick))}" x2="${n(x.px(tick))}" y1="${frame.top}" y2="${frame.bottom}"/>`, `<text class="plot-tick" x="${n(x.px(tick))}" y="${frame.bottom + 15}" text-anchor="middle">${tick.toFixed(x.decimals)}</text>`);
  for (const tick of y.ticks) parts.push(`<line class="plot-grid" x1="${frame.left}" x2="${frame.right}" y1="${n(y.px(tick))}" y2="${n(y.px(tick))}"/>`, `<text class="plot-tick" x="${frame.left - 6}" y="${n(y.px(tick) + 3.5)}" text-anchor="end">${tick.toFixed(y.decimals)}</text>`);

  const clipped: string[] = [];
  if (curve) clipped.push(`<path class="plot-band" d="${path(along.map((water, i) => [water, band[i]!.high]))}${path(along.map((water, i): [number, number] => [water, band[i]!.low]).reverse()).replace("M", "L")}Z"/>`);
  for (const { path: all } of faint) clipped.push(`<path class="plot-beside" d="${path(all)}"/>`);
  data.lines.forEach(({ at }, i) => clipped.push(`<path class="plot-line${i === 0 ? " plot-line-full" : ""}" d="${path(across.map((water) => [water, at(water)]))}"/>`));
  if (curve) clipped.push(`<path class="plot-curve" d="${path(along.map((water, i) => [water, onCurve[i]!]))}"/>`);

  // labels stand on their lines, where they are clear of points, curve and each other
  const taken: Spot[] = [...spots.map((spot) => ({ ...spot, room: 12 })), ...along.filter((_, i) => i % 4 === 0).map((water) => ({ x: x.px(water), y: curve ? y.px(curve.at(water)) : -100, room: 2 }))];
  const labels: string[] = [];
  for (const { labels: texts, at } of data.lines) {
    const line = across.map((water) => ({ x: x.px(water), y: y.px(at(water)) }));
    const found = texts.map((label) => ({ label, placed: placeLabel(line, label.length * LETTER, frame, taken) })).find(({ placed }) => placed !== undefined);
    if (!found?.placed) continue;
    const { label, placed } = found;
    taken.push(...placed.covers.map((spot) => ({ ...spot, room: 8 })));
    labels.push(`<text class="plot-label" text-anchor="middle" dy="3.5" transform="translate(${n(placed.x)} ${n(placed.y)}) rotate(${n(placed.angle)})">${escape(label)}</text>`);
  }

  for (const { name, peak } of faint) {
    const at = { x: x.px(peak.water), y: y.px(peak.dry) - 9 }, half = name.length * LETTER / 2;
    labels.push(`<circle class="plot-beside-peak" cx="${n(at.x)}" cy="${n(at.y + 9)}" r="3"/>`, `<text class="plot-label plot-beside-name" text-anchor="middle" x="${n(Math.min(frame.right - half - 2, Math.max(frame.left + half + 2, at.x)))}" y="${n(at.y)}">${escape(name)}</text>`);
  }
  if (data.peak) clipped.push(whiskers(data.peak, x.px, y.px, frame));
  const dots = data.points.map((point, i) => shape(point, spots[i]!));

  const svg = `<svg viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" aria-label="${escape(description)}">`
    + `<defs><clipPath id="plot-inside"><rect x="${frame.left}" y="${frame.top}" width="${frame.right - frame.left}" height="${frame.bottom - frame.top}"/></clipPath></defs>`
    + parts.join("")
    + `<g clip-path="url(#plot-inside)">${clipped.join("")}${labels.join("")}</g>`
    + `<path class="plot-axis" d="M${frame.left} ${frame.top}V${frame.bottom}H${frame.right}"/>`
    + `<text class="plot-title" x="${n((frame.left + frame.right) / 2)}" y="${height - 6}" text-anchor="middle">Water content, %</text>`
    + `<text class="plot-title" text-anchor="middle" transform="translate(11 ${n((frame.top + frame.bottom) / 2)}) rotate(-90)">Dry density, ${escape(data.unit)}</text>`
    + dots.join("") + "</svg>";
  return { svg, spots: spots.map((spot) => ({ x: spot.x / width, y: spot.y / height })) };
}

/** The peak as a cross with whiskers; an end that the data do not bound runs to the frame, dashed. */
function whiskers(peak: NonNullable<PlotData["peak"]>, px: (water: number) => number, py: (dry: number) => number, frame: { left: number; right: number; top: number; bottom: number }): string {
  const cx = px(peak.water), cy = py(peak.dry);
  const parts: string[] = [];
  function arm(end: number | null, to: (value: number) => number, edge: number, level: boolean): void {
    const stop = end === null ? edge : to(end);
    parts.push(level
      ? `<path class="plot-whisker${end === null ? " plot-open" : ""}" d="M${n(cx)} ${n(cy)}H${n(stop)}${end === null ? "" : `M${n(stop)} ${n(cy - 5)}v10`}"/>`
      : `<path class="plot-whisker${end === null ? " plot-open" : ""}" d="M${n(cx)} ${n(cy)}V${n(stop)}${end === null ? "" : `M${n(cx - 5)} ${n(stop)}h10`}"/>`);
  }
  arm(peak.waterInterval.low, px, frame.left, true);
  arm(peak.waterInterval.high, px, frame.right, true);
  arm(peak.dryInterval.low, py, frame.bottom, false);
  arm(peak.dryInterval.high, py, frame.top, false);
  parts.push(`<path class="plot-peak" d="M${n(cx - 6)} ${n(cy)}h12M${n(cx)} ${n(cy - 6)}v12"/>`);
  return parts.join("");
}

function shape({ mark, used }: PlotPoint, { x, y }: { x: number; y: number }): string {
  const left = used ? "" : " plot-unused";
  switch (mark) {
    case "past-line": return `<path class="plot-point plot-past${left}" d="M${n(x)} ${n(y - 7.5)}l7.5 7.5l-7.5 7.5l-7.5 -7.5z"/>`;
    case "doubtful": return `<path class="plot-point plot-doubtful${left}" d="M${n(x)} ${n(y - 6.5)}l6.5 11.5h-13z"/>`;
    case "ask": return `<rect class="plot-point plot-ask${left}" x="${n(x - 5)}" y="${n(y - 5)}" width="10" height="10"/>`;
    case "plain": return `<circle class="plot-point${left}" cx="${n(x)}" cy="${n(y)}" r="5"/>`;
  }
}
