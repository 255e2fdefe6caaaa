/**
 * Where a continuous function crosses zero between two ends of opposite sign, by the method of Ridders with bisection's guarantee.
 * Source: Ridders, IEEE Transactions on Circuits and Systems 26 (1979) 979.
 * @param tolerance of the place
 */
export function rootBetween(f: (x: number) => number, low: number, high: number, tolerance: number, atLow = f(low), atHigh = f(high)): number {
  if (atLow === 0) return low;
  if (atHigh === 0) return high;
  for (let round = 0; round < 100 && Math.abs(high - low) > tolerance; round++) {
    const middle = (low + high) / 2, atMiddle = f(middle);
    if (atMiddle === 0) return middle;
    const root = Math.sqrt(atMiddle * atMiddle - atLow * atHigh);
    const x = middle + (middle - low) * Math.sign(atLow - atHigh) * atMiddle / root, at = f(x);
    if (at === 0) return x;
    if (Math.sign(atMiddle) !== Math.sign(at)) [low, atLow, high, atHigh] = middle < x ? [middle, atMiddle, x, at] : [x, at, middle, atMiddle];
    else if (Math.sign(atLow) !== Math.sign(at)) [high, atHigh] = [x, at];
    else [low, atLow] = [x, at];
  }
  return (low + high) / 2;
}
