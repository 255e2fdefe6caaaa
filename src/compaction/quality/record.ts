import { curveRules } from "./index";
import { oversizeLimits } from "./oversize-limits";
import { highestPointReported, reportedElsewhere, reportingPrecision } from "./reported-peak";
import { tinsDiffer } from "./tins-differ";

/** Everything that is looked at where more than the points is known: tins, oversize, a reported peak. The worksheet functions know points alone. */
export const recordRules = [...curveRules, tinsDiffer, reportedElsewhere, highestPointReported, reportingPrecision, oversizeLimits] as const;
