import { allPoints, distinctWaters, type Curve } from "./curve";
import { fitPolynomialCurve } from "./polynomial-curve";

/** A parabola through all points by least squares, the plainest curve with a peak. Three points fix it. */
export const parabola: Curve = {
  id: "parabola",
  parameters: 3,
  weighed: true,
  needs: "at least three different water contents",
  fit: (test, options) => fitPolynomialCurve(parabola, test, distinctWaters(test) >= 3 ? allPoints(test) : undefined, options),
};
