/** How much readings and points scatter where they cannot tell it themselves. */
export interface Scatter {
  /** of a point about its curve, as a share of dry density: what `auto` weighs curves by */
  readonly curve: number;
  /** standard deviation of wet density, as a share of it */
  readonly wetDensity: number;
  /** standard deviation of water content, in points */
  readonly water: number;
}

/**
 * The wet density of a careful test scatters by 0.3 to 0.5 %, its water content by 0.15 to 0.3 points
 * (0.5 in fat clays). Common practice, no published source.
 */
export const USUAL_SCATTER: Scatter = { curve: 0.005, wetDensity: 0.004, water: 0.3 };

/** Standard deviation of a point about its curve, for the criterion of `auto` and the limits of findings. */
export const curveScatter = (dries: readonly number[], { curve }: Scatter): number => curve * Math.max(...dries);

/**
 * Standard deviation of a point's distance from its curve, from where errors arise: in wet density and in water content.
 * An error in water content moves the point along the axis and its dry density the other way, ρd/(100 + w) a point, so the
 * steep dry leg is in more doubt than the wet one. Derived by the law of propagation (GUM, JCGM 100:2008, clause 5.1.2).
 *
 * @param slope of the curve there, dry density a point of water content
 */
export const readingDoubt = (water: number, dry: number, slope: number, scatter: Scatter): number =>
  Math.hypot(scatter.wetDensity * dry, (slope + dry / (100 + water)) * scatter.water);
