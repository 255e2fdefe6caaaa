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
