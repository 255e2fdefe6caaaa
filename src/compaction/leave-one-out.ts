import type { CompactionTest, PeakPlace } from "./fit";
import type { FitOptions, FittedCurve } from "./curves/curve";
import { refitSaturation, type FittedSaturation } from "./curves/saturation";

/** The test without one of its points. */
export function without(test: CompactionTest, index: number): CompactionTest {
  const rest = <T>(all: readonly T[]): T[] => all.filter((_, i) => i !== index);
  return { ...test, waters: rest(test.waters), dries: rest(test.dries), tins: test.tins && rest(test.tins) };
}

/** The same curve's peak without each point in turn; null where it has none, or cannot be fitted any more. */
export function peaksLeavingOneOut(test: CompactionTest, fitted: FittedCurve, options: FitOptions): (PeakPlace | null)[] {
  return test.waters.map((_, i) => {
    const rest = without(test, i);
    if (fitted.curve.id === "saturation") {
      const { vector, weights } = fitted as FittedSaturation;
      return new Set(rest.waters).size >= fitted.parameters ? refitSaturation(rest, vector, weights.filter((__, k) => k !== i)) : null;
    }
    const again = fitted.curve.fit(rest, options);
    return typeof again === "object" ? again.peak : null;
  });
}
