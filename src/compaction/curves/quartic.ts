import { allPoints, distinctWaters, type Curve } from "./curve";
import { fitPolynomialCurve } from "./polynomial-curve";

/**
 * A quartic through all points by least squares. It bends freely, and therefore follows scatter as well as soil.
 * Named beside the cubic by Howell, Shackelford and others, Geotechnical Testing Journal 20 (1997), from memory.
 */
export const quartic: Curve = {
  id: "quartic",
  parameters: 5,
  weighed: true,
  needs: "at least five different water contents",
  fit: (test, options) => fitPolynomialCurve(quartic, test, distinctWaters(test) >= 5 ? allPoints(test) : undefined, options),
};
