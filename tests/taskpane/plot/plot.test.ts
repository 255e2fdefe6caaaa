import { drawPlot, type PlotData } from "../../../taskpane/plot/plot";
import { placeLabel } from "../../../taskpane/plot/labels";
import { scaleOver } from "../../../taskpane/plot/scale";

describe("scale", () => {
  test.each([[8.9, 13.0, 6], [1.948, 2.006, 8], [1447, 2001, 7], [0, 0, 5], [16.6, 16.6, 4]])("round ticks from %f to %f", (low, high, most) => {
    const scale = scaleOver(low, high, [0, 300], most);
    expect(scale.ticks.length).toBeGreaterThanOrEqual(2);
    expect(scale.ticks.length).toBeLessThanOrEqual(most + 1);
    for (const tick of scale.ticks) {
      expect(tick).toBeGreaterThanOrEqual(scale.from - 1e-9);
      expect(tick).toBeLessThanOrEqual(scale.to + 1e-9);
      expect(Number(tick.toFixed(scale.decimals))).toBeCloseTo(tick, 9);
    }
    expect(scale.px(scale.from)).toBeCloseTo(0, 9);
    expect(scale.px(scale.to)).toBeCloseTo(300, 9);
  });
});

describe("labels on lines", () => {
  const frame = { left: 0, top: 0, right: 200, bottom: 200 };
  const line = Array.from({ length: 41 }, (_, i) => ({ x: i * 5, y: 100 }));
  test("keeps clear of what is taken", () => {
    const placed = placeLabel(line, 40, frame, [{ x: 60, y: 100, room: 12 }])!;
    expect(Math.abs(placed.x - 60)).toBeGreaterThan(32);
    expect(placed.covers.every(({ x }) => x >= 6 && x <= 194)).toBe(true);
  });
  test("none where there is no room", () => {
    expect(placeLabel(line, 40, frame, Array.from({ length: 21 }, (_, i) => ({ x: i * 10, y: 100, room: 12 })))).toBeUndefined();
    expect(placeLabel(line.map(({ x }) => ({ x, y: -50 })), 40, frame, [])).toBeUndefined();
  });
});

const data: PlotData = {
  points: [[8.9, 1.948, "plain"], [10.1, 1.996, "plain"], [11.4, 2.006, "ask"], [13, 1.964, "past-line"]].map(([water, dry, mark]) => ({ water, dry, mark, used: true }) as PlotData["points"][number]),
  curve: { at: (w) => 2.0077 - 0.0123 * (w - 11.1) ** 2, bandAt: (w) => ({ low: 2 - 0.0123 * (w - 11.1) ** 2, high: 2.015 - 0.0123 * (w - 11.1) ** 2 }) },
  peak: { water: 11.1, dry: 2.0077, waterInterval: { low: 10.9, high: null }, dryInterval: { low: 1.998, high: 2.017 } },
  lines: [{ labels: ["zero air voids"], at: (w) => 0.9982 / (w / 100 + 1 / 2.7) }],
  unit: "Mg/m³", beside: [],
};

describe("the drawing", () => {
  const { svg, spots } = drawPlot(data, { width: 320, height: 250 }, 'A "test" of <words>');
  test("carries its words, safely", () => expect(svg).toContain('role="img" aria-label="A &quot;test&quot; of &lt;words&gt;"'));
  test("tells points apart by shape, not by colour alone", () => {
    expect(svg.match(/<circle class="plot-point"/g)).toHaveLength(2);
    expect(svg.match(/<rect class="plot-point plot-ask"/g)).toHaveLength(1);
    expect(svg.match(/<path class="plot-point plot-past"/g)).toHaveLength(1);
  });
  test("keeps every point inside the frame", () => {
    for (const { x, y } of spots) {
      expect(x * 320).toBeGreaterThanOrEqual(52);
      expect(x * 320).toBeLessThanOrEqual(310);
      expect(y * 250).toBeGreaterThanOrEqual(10);
      expect(y * 250).toBeLessThanOrEqual(210);
    }
  });
  test("draws an end that is not bounded as an open whisker", () => expect(svg.match(/plot-open/g)).toHaveLength(1));
  test("clips lines and curve to the frame", () => expect(svg).toMatch(/<g clip-path="url\(#plot-inside\)">.*plot-band.*plot-line.*plot-curve.*<\/g>/));
  test("draws no number that is none", () => {
    expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    expect(drawPlot({ ...data, points: [data.points[0]!], curve: null, peak: null, lines: [] }, { width: 250, height: 235 }, "").svg).not.toMatch(/NaN|Infinity|undefined/);
  });
});
