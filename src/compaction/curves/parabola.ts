import { allPoints, distinctWaters, type Curve } from "./curve";

/** A parabola through all points by least squares, the plainest curve with a peak. Three points fix it. */
export const parabola: Curve = {
  id: "parabola",
  degree: 2,
  weighed: true,
  needs: "at least three different water contents",
  pointsOf: (test) => distinctWaters(test) >= 3 ? allPoints(test) : undefined,
};
