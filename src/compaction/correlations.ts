import { relation } from "../relations/relation";

/**
 * What published correlations would expect of a fine-grained soil. They are for plausibility alone: single soils
 * stray from them by several points and by 5 % of density.
 */
const blotz = { title: "Blotz, Benson and Boutwell, Journal of Geotechnical and Geoenvironmental Engineering 124 (1998) 907", clause: "from memory" };
const gurtug = { title: "Gurtug and Sridharan, Soils and Foundations 44(5) (2004) 105", clause: "the factor from memory" };
const nagaraj = { title: "Sridharan and Nagaraj, Ground Improvement 9(1) (2005) 17", clause: "from memory" };

/** Optimum under another effort, from the liquid limit. Efforts kJ/m³. */
export const optimumAtEffort = relation("otherOptimum", "optimumWater + (12.39 - 12.21 * log10(liquidLimit)) * log10(otherEffort / compactiveEffort)", blotz);
/** Gain in maximum dry unit weight under another effort, kN/m³. */
export const gainAtEffort = relation("unitWeightGain", "(2.27 * log10(liquidLimit) - 0.94) * log10(otherEffort / compactiveEffort)", blotz);

/** Optimum from the plastic limit and the effort. */
export const optimumFromPlasticLimit = relation("optimumWater", "(1.95 - 0.38 * log10(compactiveEffort)) * plasticLimit", gurtug);
/** Maximum dry unit weight from the optimum, kN/m³. */
export const unitWeightFromOptimum = relation("maxDryUnitWeight", "22.68 * exp(0 - 0.0183 * optimumWater)", gurtug);

/** The same for standard compaction alone. */
export const standardOptimumFromPlasticLimit = relation("optimumWater", "0.92 * plasticLimit", nagaraj);
export const standardUnitWeightFromPlasticLimit = relation("maxDryUnitWeight", "0.23 * (93.3 - plasticLimit)", nagaraj);
