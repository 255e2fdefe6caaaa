import { curveWords, soilGrains, standardIds, type CurveWord, type SoilGrain, type StandardId } from "../../src/compaction/fit";
import { roles, type Corrections, type Role } from "../../src/tables/table";

/** What the user chose for one table. It travels in the workbook, by sheet and range. */
export interface Choices {
  readonly corrections: Corrections;
  readonly curve: CurveWord;
  /** as typed; null takes what stands in the sheet, "" is none */
  readonly specificGravity: string | null;
  /** null takes what the sheet says of it */
  readonly assumed: boolean | null;
  /** density of water as typed; "" is that of water at 20 °C in the table's unit */
  readonly waterDensity: string;
  readonly soil: SoilGrain | null;
  /** stated scatter as typed: of a point in percent of dry density, of wet density in percent, of water content in points; "" is the usual one */
  readonly pointScatter: string;
  readonly wetScatter: string;
  readonly waterScatter: string;
  /** points weighed by the doubt of their readings */
  readonly weigh: boolean;
  /** oversize as typed: percent of dry mass, bulk specific gravity, water content in percent */
  readonly stonePercent: string;
  readonly stoneGravity: string;
  readonly stoneWater: string;
  /** the peak that a report gives, as typed, and its standard */
  readonly reportedDry: string;
  readonly reportedWater: string;
  readonly standard: StandardId | null;
  /** which test is shown, where the selection holds several; null is the first */
  readonly test: string | null;
}

export const noChoices: Choices = { corrections: {}, curve: "auto", specificGravity: null, assumed: null, waterDensity: "", soil: null, pointScatter: "", wetScatter: "", waterScatter: "", weigh: false, stonePercent: "", stoneGravity: "", stoneWater: "", reportedDry: "", reportedWater: "", standard: null, test: null };

/** Only what differs from no choice at all: a workbook's own memory is small. */
export const writeChoices = (choices: Choices): string =>
  JSON.stringify({ version: 1, ...Object.fromEntries(Object.entries(choices).filter(([key, value]) => JSON.stringify(value) !== JSON.stringify(noChoices[key as keyof Choices]))) });

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === "object" && value !== null && !Array.isArray(value);

function record<T>(value: unknown, good: (entry: unknown) => entry is T): Record<number, T> {
  const out: Record<number, T> = {};
  if (isRecord(value)) for (const [key, entry] of Object.entries(value)) if (/^\d{1,4}$/.test(key) && good(entry)) out[Number(key)] = entry;
  return out;
}

const isRole = (value: unknown): value is Role => roles.includes(value as Role);
const isText = (value: unknown): value is string => typeof value === "string" && value.length <= 40;

const texts = <Key extends string>(read: Record<string, unknown>, keys: readonly Key[]): Record<Key, string> =>
  Object.fromEntries(keys.map((key) => [key, isText(read[key]) ? read[key] : ""])) as Record<Key, string>;

/** Reads remembered choices. A workbook may come from anyone: what is not understood is left out. */
export function readChoices(text: string | null): Choices {
  let read: unknown;
  try { read = text === null ? null : JSON.parse(text); } catch { return noChoices; }
  if (!isRecord(read)) return noChoices;
  const corrections = isRecord(read["corrections"]) ? read["corrections"] : {};
  const { orientation } = corrections;
  return {
    corrections: {
      ...(orientation === "down" || orientation === "across" ? { orientation } : {}),
      roles: record(corrections["roles"], isRole), units: record(corrections["units"], isText),
    },
    curve: curveWords.find((word) => word === read["curve"]) ?? "auto",
    specificGravity: isText(read["specificGravity"]) ? read["specificGravity"] : null,
    assumed: typeof read["assumed"] === "boolean" ? read["assumed"] : null,
    ...texts(read, ["waterDensity", "pointScatter", "wetScatter", "waterScatter", "stonePercent", "stoneGravity", "stoneWater", "reportedDry", "reportedWater"]),
    soil: soilGrains.find((one) => one === read["soil"]) ?? null,
    standard: standardIds.find((one) => one === read["standard"]) ?? null,
    weigh: read["weigh"] === true,
    test: isText(read["test"]) ? read["test"] : null,
  };
}
