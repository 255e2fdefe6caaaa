import { relation } from "../relations/relation";

const balance = { title: "mass balance on dry soil", clause: "FM 5-434, soil volume changes" };

/** Swell from bank to loose, percent of the bank volume. */
export const swellOfBank = relation("swell", "100 * (bankDryDensity / looseDryDensity - 1)", balance);
/** The same change as percent of the loose volume. */
export const swellOfLoose = relation("swell", "100 * (1 - looseDryDensity / bankDryDensity)", balance);
/** Shrink from bank to fill, percent of the bank volume; negative where the fill is looser than the bank. */
export const shrinkOfBank = relation("shrink", "100 * (1 - bankDryDensity / fillDryDensity)", balance);
/** The same change as percent of the fill volume. */
export const shrinkOfFill = relation("shrink", "100 * (fillDryDensity / bankDryDensity - 1)", balance);
/** Loose thickness to spread for a compacted lift. */
export const looseLift = relation("looseThickness", "thickness * fillDryDensity / looseDryDensity", balance);
/** Bulking of moist sand over the volume it has dry or flooded. */
export const bulkingOfSand = relation("bulking", "100 * (looseDryDensity / moistDryDensity - 1)", { title: "definition of bulking", clause: "IS 2386-3: volume of moist sand over that of the same sand flooded" });
