import { seeded, type Random } from "./random";

/** An end is null where too many draws lie nowhere on that side to say. */
export interface DrawnInterval { readonly low: number | null; readonly high: number | null }

export interface BootstrapOptions { readonly draws: number; readonly seed: number; readonly level: number }

/**
 * Percentile intervals of several statistics by a seeded parametric bootstrap.
 * A draw that has no value (no peak inside the data) counts on its side: −Infinity below, Infinity above.
 * Source: Efron and Tibshirani, An Introduction to the Bootstrap (1993), chapters 6.5 and 13.3.
 */
export function bootstrap(statistics: number, draw: (random: Random, into: Float64Array) => void, { draws, seed, level }: BootstrapOptions): DrawnInterval[] {
  const random = seeded(seed), drawn = Array.from({ length: statistics }, () => new Float64Array(draws)), into = new Float64Array(statistics);
  for (let i = 0; i < draws; i++) {
    draw(random, into);
    for (let j = 0; j < statistics; j++) drawn[j]![i] = into[j]!;
  }
  const tail = (1 - level) / 2;
  return drawn.map((values) => {
    values.sort();
    return { low: quantileOf(values, tail), high: quantileOf(values, 1 - tail) };
  });
}

/** Linear between order statistics; null where it would rest on an infinite one. Source: Hyndman and Fan, American Statistician 50 (1996), definition 7. */
function quantileOf(sorted: Float64Array, share: number): number | null {
  const place = share * (sorted.length - 1), below = Math.floor(place);
  const a = sorted[below]!, b = sorted[Math.min(below + 1, sorted.length - 1)]!;
  const value = a + (place - below) * (b - a);
  return Number.isFinite(value) ? value : null;
}
