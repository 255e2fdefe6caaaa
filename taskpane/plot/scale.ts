/** A linear scale from values to pixels, with ticks at round numbers. */
export interface Scale {
  readonly from: number;
  readonly to: number;
  readonly ticks: readonly number[];
  /** decimals that the ticks need */
  readonly decimals: number;
  px(value: number): number;
}

/** The round step (1, 2, 2.5 or 5 times a power of ten) that gives at most so many intervals. */
export function roundStep(span: number, most: number): number {
  const rough = span / most;
  const power = 10 ** Math.floor(Math.log10(rough));
  return [1, 2, 2.5, 5, 10].map((factor) => factor * power).find((step) => step >= rough * (1 - 1e-9))!;
}

const decimalsOf = (step: number): number => {
  for (let decimals = 0; decimals < 8; decimals++) if (Math.abs(Number(step.toFixed(decimals)) / step - 1) < 1e-9) return decimals;
  return 8;
};

/** A scale over a span of values (with some air on both sides) onto pixels. */
export function scaleOver(low: number, high: number, pixels: readonly [number, number], mostTicks: number, air = 0.06): Scale {
  const spread = high - low || Math.abs(high) * 0.02 || 1;
  const from = low - air * spread, to = high + air * spread;
  const step = roundStep(to - from, mostTicks);
  const ticks: number[] = [];
  for (let tick = Math.ceil(from / step - 1e-9); tick * step <= to * (1 + 1e-12); tick++) ticks.push(Number((tick * step).toPrecision(12)));
  const [start, end] = pixels;
  return { from, to, ticks, decimals: decimalsOf(step), px: (value) => start + (value - from) / (to - from) * (end - start) };
}
