import { relativeCompaction, waterGap, waterRatio } from "../field/relative-compaction";
import { airVoidsOfPoint, degreeOfSaturation } from "../phase/lines";
import type { Clause, Zone, ZoneQuantity } from "./zone";

/** One field test beside its reference. */
export interface FieldTest {
  readonly dryDensity: number;
  readonly waterContent: number;
  readonly maxDryDensity: number;
  readonly optimumWater: number;
  readonly specificGravity?: number | undefined;
  readonly waterDensity: number;
}

/** Every quantity of a zone from one test; undefined where the specific gravity is needed and not known. */
export const zoneFigures: Readonly<Record<ZoneQuantity, (test: FieldTest) => number | undefined>> = {
  RC: (test) => relativeCompaction.value(test),
  gap: (test) => waterGap.value(test),
  ratio: (test) => waterRatio.value(test),
  water: ({ waterContent }) => waterContent,
  air: ({ specificGravity, ...test }) => specificGravity === undefined ? undefined : airVoidsOfPoint.value({ ...test, specificGravity }),
  saturation: ({ specificGravity, ...test }) => specificGravity === undefined ? undefined : degreeOfSaturation.value({ ...test, specificGravity }),
  dry: ({ dryDensity }) => dryDensity,
};

export interface Reason {
  readonly clause: Clause;
  /** the figure as it was judged */
  readonly value: number;
  readonly side: "below" | "above";
  /** it would pass rounded to the digits of its limit, which the specification does not say to do */
  readonly onlyByRounding: boolean;
}

/** Half up, as specifications round; a hair above binary fractions counts as the half it stands for. */
export const roundedTo = (value: number, step: number): number => Number((Math.floor(value / step + 0.5 + 1e-9) * step).toPrecision(12));

/** The reasons why a test fails its zone; none where it passes. Every clause must be answerable: the caller sees to the specific gravity. */
export function reasonsAgainst(test: FieldTest, { clauses, round }: Zone): Reason[] {
  return clauses.flatMap((clause): Reason[] => {
    const exact = zoneFigures[clause.quantity](test)!, value = round === null ? exact : roundedTo(exact, round);
    const side = (figure: number): Reason["side"] | null => clause.low !== null && figure < clause.low ? "below" : clause.high !== null && figure > clause.high ? "above" : null;
    const failed = side(value);
    return failed ? [{ clause, value, side: failed, onlyByRounding: round === null && side(roundedTo(value, 10 ** -clause.decimals)) === null }] : [];
  });
}
