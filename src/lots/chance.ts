import { normalCdf } from "../numerics/noncentral-t";

export interface OneTest {
  readonly dryDensity: number;
  readonly maxDryDensity: number;
  /** limit of relative compaction, percent */
  readonly limit: number;
  /** standard uncertainty of one field test, and of the maximum dry density, in the unit of the densities */
  readonly deviation: number;
  readonly maxDeviation: number;
  /** mean and spread of the true dry density over the lot, where they are known */
  readonly lot?: { readonly mean: number; readonly deviation: number } | undefined;
}

/**
 * Probability that the true relative compaction at the spot meets the limit. Without the lot the reading speaks for itself;
 * with it the reading is drawn towards the lot's mean by its own doubt, as real lots vary less than single readings seem to.
 * Source: GUM (JCGM 100:2008), propagation; JCGM 106:2012, clause 7, conformance probability with a normal prior.
 */
export function chanceOfPassing({ dryDensity, maxDryDensity, limit, deviation, maxDeviation, lot }: OneTest): number {
  let value = dryDensity, spread = deviation;
  if (lot) {
    const own = deviation ** 2, theirs = lot.deviation ** 2;
    value = own + theirs === 0 ? dryDensity : (dryDensity * theirs + lot.mean * own) / (own + theirs);
    spread = own + theirs === 0 ? 0 : Math.sqrt(own * theirs / (own + theirs));
  }
  const share = limit / 100, whole = Math.hypot(spread, share * maxDeviation), distance = value - share * maxDryDensity;
  return whole === 0 ? (distance >= 0 ? 1 : 0) : normalCdf(distance / whole);
}
