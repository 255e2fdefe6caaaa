import type { Formula } from "./parse";
import { evaluate, slopes, type World } from "./world";

/** A closed interval. A figure typed as 1.87 stands for 1.865 to 1.875. */
export interface Interval { readonly low: number; readonly high: number }

const hull = (values: readonly number[]): Interval => ({ low: Math.min(...values), high: Math.max(...values) });

export const intervals: World<Interval> = {
  number: (value) => ({ low: value, high: value }),
  operate(op, a, b) {
    switch (op) {
      case "+": return { low: a.low + b.low, high: a.high + b.high };
      case "-": return { low: a.low - b.high, high: a.high - b.low };
      case "*": return hull([a.low * b.low, a.low * b.high, a.high * b.low, a.high * b.high]);
      case "/": return b.low <= 0 && b.high >= 0
        ? { low: -Infinity, high: Infinity }
        : hull([a.low / b.low, a.low / b.high, a.high / b.low, a.high / b.high]);
      case "^": {
        const ends = [a.low ** b.low, a.high ** b.low, a.low ** b.high, a.high ** b.high];
        return a.low < 0 && a.high > 0 ? hull([...ends, 0]) : hull(ends);
      }
    }
  },
  // both only rise
  call: (name, { low, high }) => name === "exp" ? { low: Math.exp(low), high: Math.exp(high) } : { low: Math.log10(low), high: Math.log10(high) },
};

export type Box = Readonly<Record<string, Interval>>;

/**
 * The exact range of a formula over a box. An input along which the formula only rises (or only falls)
 * everywhere in the box is pinned to its end, so that a name that stands twice does not widen the answer.
 */
export function rangeOver(formula: Formula, box: Box): Interval {
  const world = slopes(intervals);
  const none = intervals.number(0), one = intervals.number(1);
  const direction = new Map<string, -1 | 0 | 1>();
  for (const input of Object.keys(box)) {
    const { slope } = evaluate(formula, world, (name) => ({ value: box[name]!, slope: name === input ? one : none }));
    direction.set(input, slope.low >= 0 ? 1 : slope.high <= 0 ? -1 : 0);
  }
  const end = (side: -1 | 1): Interval => evaluate(formula, intervals, (name) => {
    const whole = box[name]!, way = direction.get(name)! * side;
    return way === 0 ? whole : intervals.number(way > 0 ? whole.high : whole.low);
  });
  return { low: end(-1).low, high: end(1).high };
}
