import type { CompactionTest, Fit } from "../fit";
import type { Scatter } from "../scatter";

/** What the findings of a compaction test look at. */
export interface CurveSubject {
  readonly test: CompactionTest;
  readonly scatter: Scatter;
  /** null where no curve was fitted: what can be said of the points alone is still said */
  readonly fit: Fit | null;
  /** the fitted optimum, else the water content of the highest point; null where there is no point */
  readonly optimum: number | null;
  /** peak of the parabola through the highest point and its neighbours, where there is one */
  readonly topThreePeak: number | null;
}
