import { COMMON_PRACTICE, rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";

/** Two points equal in both figures are rarely two tests. */
export const repeatedPoints = rule<CurveSubject>()({
  id: "repeated-points",
  source: COMMON_PRACTICE,
  says: "this point repeats an earlier one exactly ({dry} at {water} %): was a row copied?",
  *look({ test: { waters, dries } }) {
    const seen = new Set<string>();
    for (const [index, water] of waters.entries()) {
      const dry = dries[index]!, key = `${water}/${dry}`;
      if (seen.has(key)) yield { place: { at: "point", index }, severity: "ask", evidence: { dry, water } };
      seen.add(key);
    }
  },
});
