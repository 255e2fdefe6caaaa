/** Thresholds of the findings on a compaction test, each with where it comes from. */

/** Standard error over the stated scatter beyond which a curve does not follow its points. Common practice, no published source. */
export const FOLLOWS = 3;

/** Fewest points of a test, and how many it should have: ASTM D698 asks for at least four, preferably five; BS 1377-4 for five (from memory). */
export const LEAST_POINTS = 4, GOOD_POINTS = 5;

/** Points on each side of the optimum: ASTM D698 and AASHTO T 99 want two (from memory). */
export const EACH_SIDE = 2;

/** Steps of water content: about 2 points and not above 4 (ASTM D698, from memory); soils with a high optimum take wider ones in practice. */
export const WIDE_GAP = { ask: 2.5, askShareOfOptimum: 0.2, doubtful: 4 } as const;

/** A curve standing this share of density above the top-three peak is not what the points near the peak say. Half a usual reporting step; common practice, no published source. */
export const ABOVE = 0.003;

/** Two-sided chance, over all points of a test, of calling a good point an outlier. Common practice: Bonferroni on 1 %. */
export const OUTLIER_CHANCE = 0.01;

/** Specific gravities of most inorganic soils lie well inside: 2.60 to 2.80, lateritic to 3.0; organic from 2.4 (handbook of geotechnical design tables). */
export const PLAUSIBLE_GRAVITY = { low: 2.4, high: 3.0 } as const;

/**
 * Degree of saturation at the optimum, percent: textbooks give 80 to 90; tropical soils 81.2 to 96.5 (JETS 55(3), 2023).
 * The bands by grain are common practice, no published source; where the grain is not told, both together.
 */
export const SATURATION_AT_OPTIMUM = { fine: { low: 78, high: 96 }, granular: { low: 65, high: 92 }, untold: { low: 65, high: 96 } } as const;

/** Air voids along the wet leg, percent: it runs near parallel to the zero-air-voids line. Common practice, no published source. */
export const WET_LEG = { mostAir: 5, change: 2.5 } as const;

/** Peaks of curves that do as well may differ by this before it is told: one step of the coarser reporting habits (practice of BS 1377-4: 0.01 Mg/m³ and half a point). */
export const CURVES_APART = { dryDensityShare: 0.005, water: 0.5 } as const;

/** Two tins of one point may differ by the greater of half a point and this share of the water content. Common practice, no published source. */
export const TINS_APART = { points: 0.5, share: 0.05 } as const;

/** Distance in its own doubts beyond which a point of a small test is stray: the chance of a good one is 1 in 1000. Common practice. */
export const STRAY = 3.29;

/** Oversize, percent of dry mass: below the least no correction; up to 40 % on the 4.75 mm sieve, 30 % on the 19 mm sieve (AASHTO T 99 and T 224, a state's copy of the method). */
export const OVERSIZE = { least: 5, mostFine: 40, mostCoarse: 30 } as const;
