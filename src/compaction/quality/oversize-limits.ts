import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { OVERSIZE } from "./thresholds";

/** The correction for oversize treats stones as set into the fine soil; that holds between limits. */
export const oversizeLimits = rule<CurveSubject>()({
  id: "oversize-limits",
  source: { title: "ASTM D4718 and AASHTO T 224", clause: "limits of the correction, by a state's copy of the method" },
  says: "{percent} % oversize {what}",
  *look({ test: { oversize } }) {
    if (!oversize || oversize.percent === 0) return;
    const { percent } = oversize;
    if (percent < OVERSIZE.least) yield { place: { at: "whole" }, severity: "ask", evidence: { percent, what: `is below ${OVERSIZE.least} %, where the correction is left out unless the specification says otherwise.` } };
    else if (percent > OVERSIZE.mostFine) yield { place: { at: "whole" }, severity: "doubtful", evidence: { percent, what: `is beyond the correction: it holds up to ${OVERSIZE.mostFine} % on the 4.75 mm sieve and ${OVERSIZE.mostCoarse} % on the 19 mm sieve. The stones touch; test in a larger mould, or compact to a method.` } };
    else if (percent > OVERSIZE.mostCoarse) yield { place: { at: "whole" }, severity: "ask", evidence: { percent, what: `is beyond the correction where it was retained on the 19 mm sieve (${OVERSIZE.mostCoarse} %); on the 4.75 mm sieve it holds up to ${OVERSIZE.mostFine} %.` } };
  },
});
