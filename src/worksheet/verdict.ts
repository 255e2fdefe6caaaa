import { reasonsAgainst, zoneFigures, type FieldTest, type Reason } from "../judging/verdict";
import { parseZone, type Zone } from "../judging/zone";
import { CellError, isBlank, quoted, refusal, type Block, type Cell } from "./cell";
import { argument, column } from "./column";
import { once } from "./once";
import { numberOf, waterDensity, type Reader } from "./readers";
import { sameUnitGuard, unitGuard } from "./unit-guard";

type Cells = Block | null;

const parsed = once((text: string): Zone | string => parseZone(text));

const zoneReader: Reader<Zone> = {
  name: "zone",
  read(value) {
    if (value instanceof CellError) return value;
    if (isBlank(value)) return refusal("zone is blank.");
    if (typeof value !== "string") return refusal(`zone must be a text such as "RC >= 95; gap -2..+2", not ${quoted(value)}.`);
    const zone = parsed(value);
    return typeof zone === "string" ? refusal(zone) : zone;
  },
};

const UNIT = { RC: " %", gap: " points", ratio: " % of optimum", water: " %", air: " %", saturation: " %", dry: "" } as const;
/** One digit more than the limit has, so that a figure beside it can be told from it. */
const shown = (value: number, decimals: number): string => String(Number(value.toFixed(decimals + 1)));

function words({ clause, value, side, onlyByRounding }: Reason): string {
  const limit = side === "below" ? clause.low! : clause.high!;
  return `${clause.quantity} ${shown(value, Math.max(clause.decimals, 1))}${UNIT[clause.quantity]} is ${side} ${limit}${onlyByRounding ? " (it would pass only by rounding)" : ""}`;
}

/** "pass", or each reason why a field test fails its zone. */
export const fillVerdict = (dry: Cells, water: Cells, maxDry: Cells, optimum: Cells, zone: Cells, gs: Cells, density: Cells): Cell[][] | CellError =>
  column([
    argument(numberOf("dryDensity"), dry), argument(numberOf("waterContent"), water), argument(numberOf("maxDryDensity"), maxDry), argument(numberOf("optimumWater"), optimum),
    argument(zoneReader, zone), argument({ ...numberOf("specificGravity"), leftOut: null } as Reader<number | null>, gs), argument(waterDensity, density),
  ], (dryDensity, waterContent, maxDryDensity, optimumWater, limits, specificGravity, ofWater) => {
    const test: FieldTest = { dryDensity, waterContent, maxDryDensity, optimumWater, specificGravity: specificGravity ?? undefined, waterDensity: ofWater };
    const trouble = sameUnitGuard(dryDensity, "dry density", maxDryDensity, "maximum dry density", 0.5, 1.5) ?? (specificGravity === null ? undefined : unitGuard(dryDensity, ofWater));
    if (trouble) return trouble;
    const open = limits.clauses.find(({ quantity }) => zoneFigures[quantity](test) === undefined);
    if (open) return refusal(`the clause on ${open.quantity} needs the specific gravity of the solids.`);
    if (optimumWater === 0 && limits.clauses.some(({ quantity }) => quantity === "ratio")) return refusal("optimum water content must be above 0.");
    const reasons = reasonsAgainst(test, limits);
    return reasons.length === 0 ? "pass" : reasons.map(words).join("; ");
  });
