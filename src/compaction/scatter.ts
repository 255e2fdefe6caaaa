/**
 * Scatter of one point's dry density about its curve, as a share of the density, where the points themselves cannot tell it.
 * Typical scatter of the wet density is 0.3 to 0.5 %. Common practice, no published source.
 */
export const STATED_SCATTER = 0.005;

export const statedScatter = (dries: readonly number[]): number => STATED_SCATTER * Math.max(...dries);
