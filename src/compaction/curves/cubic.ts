import { allPoints, distinctWaters, type Curve } from "./curve";
import { fitPolynomialCurve } from "./polynomial-curve";

/**
 * A cubic through all points by least squares: it may fall faster on one side than on the other.
 * Recommended for five-point tests by Howell, Shackelford and others, Geotechnical Testing Journal 20 (1997), from memory.
 */
export const cubic: Curve = {
  id: "cubic",
  parameters: 4,
  weighed: true,
  needs: "at least four different water contents",
  fit: (test, options) => fitPolynomialCurve(cubic, test, distinctWaters(test) >= 4 ? allPoints(test) : undefined, options),
};
