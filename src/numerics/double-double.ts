/**
 * Numbers of twice the digits, as an unevaluated sum of two: for residuals that ordinary arithmetic would cancel away.
 * Source: Dekker, Numerische Mathematik 18 (1971) 224; Knuth, The Art of Computer Programming 2, 4.2.2.
 */
export interface Double2 { readonly high: number; readonly low: number }

export const exactly = (high: number): Double2 => ({ high, low: 0 });

const SPLIT = 134217729;

function sum(a: number, b: number): Double2 {
  const high = a + b, part = high - a;
  return { high, low: (a - (high - part)) + (b - part) };
}

function product(a: number, b: number): Double2 {
  const high = a * b, ca = SPLIT * a, cb = SPLIT * b;
  const a1 = ca - (ca - a), a2 = a - a1, b1 = cb - (cb - b), b2 = b - b1;
  return { high, low: ((a1 * b1 - high) + a1 * b2 + a2 * b1) + a2 * b2 };
}

const tidy = (high: number, low: number): Double2 => {
  const total = high + low;
  return { high: total, low: low - (total - high) };
};

export function add(a: Double2, b: Double2): Double2 {
  const s = sum(a.high, b.high), t = sum(a.low, b.low), first = tidy(s.high, s.low + t.high);
  return tidy(first.high, first.low + t.low);
}

export function multiply(a: Double2, b: Double2): Double2 {
  const p = product(a.high, b.high);
  return tidy(p.high, p.low + (a.high * b.low + a.low * b.high));
}

export const negative = ({ high, low }: Double2): Double2 => ({ high: -high, low: -low });
export const plain = ({ high, low }: Double2): number => high + low;
