import { seeded } from "../numerics/random";

export interface Spot { readonly along: number; readonly across: number }

/**
 * Stratified random positions: the lot is cut into equal lengths, and one place is drawn in each. The same seed gives the same places.
 * Source: ASTM D3665, random sampling of construction materials (from memory).
 */
export function stratifiedSpots(length: number, width: number, count: number, seed: number): Spot[] {
  const random = seeded(seed), stretch = length / count;
  return Array.from({ length: count }, (_, i) => ({ along: stretch * (i + random.uniform()), across: width * random.uniform() }));
}
