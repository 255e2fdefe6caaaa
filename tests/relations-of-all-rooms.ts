import * as borrow from "../src/earthwork/borrow";
import * as conditioning from "../src/earthwork/conditioning";
import * as packing from "../src/earthwork/packing";
import * as rolling from "../src/earthwork/rolling";
import * as gauge from "../src/field/gauge";
import * as states from "../src/earthwork/states";
import * as water from "../src/earthwork/water";
import * as correlations from "../src/compaction/correlations";
import * as effort from "../src/compaction/effort";
import * as mould from "../src/compaction/mould";
import * as oversize from "../src/compaction/oversize";
import * as rapidMethod from "../src/compaction/rapid-method";
import * as relativeCompaction from "../src/field/relative-compaction";
import * as sandReplacement from "../src/field/sand-replacement";
import * as density from "../src/phase/density";
import * as lines from "../src/phase/lines";
import * as voids from "../src/phase/voids";
import * as waterContent from "../src/phase/water-content";
import type { QuantityId } from "../src/relations/quantities";
import type { Relation } from "../src/relations/relation";
import * as waterDensity from "../src/units/water-density";

export type AnyRelation = Relation<QuantityId, QuantityId>;

const isRelation = (value: unknown): value is AnyRelation => typeof value === "object" && value !== null && "formula" in value && "solvedFor" in value;

/** Every relation of the project by its exported name. A room that is added must be listed here; the architecture test looks for strays. */
export const relationRooms = { borrow, conditioning, packing, rolling, gauge, states, water, correlations, rapidMethod, effort, mould, oversize, relativeCompaction, sandReplacement, density, lines, voids, waterContent, waterDensity };

export const allRelations: readonly (readonly [string, AnyRelation])[] = Object.values(relationRooms)
  .flatMap((room) => Object.entries(room as Record<string, unknown>))
  .filter((entry): entry is [string, AnyRelation] => isRelation(entry[1]));

/** Relations that are another one solved for one of its quantities: checked through it, as they share its text. */
export const solved: Readonly<Record<string, string>> = {
  fineDryDensity: "wholeDryDensity",
  fineWater: "wholeWater",
  wetDensityFromDry: "dryDensityFromWet",
  saturationWater: "zeroAirVoids",
  leastSpecificGravity: "zeroAirVoids",
  degreeOfSaturation: "saturationLine",
  airVoidsOfPoint: "airVoidsLine",
};
