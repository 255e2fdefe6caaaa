import { quantity, type QuantityId } from "../relations/quantities";
import { densityUnit, densityUnits, unitOfWater, type DensityUnit } from "../units/density-units";
import { massUnit, massUnits, volumeUnit, volumeUnits, type MassUnit, type VolumeUnit } from "../units/mass-and-volume-units";
import { WATER_KG_M3_AT_20 } from "../units/water-density";
import { CellError, isBlank, quoted, refusal, type Block } from "./cell";

/** How one kind of argument is read from a cell. */
export interface Reader<T> {
  /** as it stands in messages */
  readonly name: string;
  read(value: unknown): T | CellError;
  /** stands in for an argument that is left out; without it a blank is an error */
  readonly leftOut?: T;
  /** looks at a whole argument before any row is read */
  readonly check?: (block: Block) => CellError | undefined;
  /** a reading that needs no coercion; the shared path takes it as it stands */
  readonly plain?: (value: unknown) => boolean;
}

const PERCENT_TEXT = /^\s*(\d+(?:\.\d+)?)\s*%\s*$/;
const COMMA_NUMBER = /^\s*-?\d+,\d+\s*%?\s*$/;

/** Every non-zero number lies between 0 and 1: cells formatted as % hold fractions, and 0.125 for 12.5 % would pass unnoticed. */
export function looksLikeFractions(block: Block): boolean {
  let any = false;
  for (const row of block) for (const value of row) {
    if (typeof value !== "number" || value === 0) continue;
    if (!(value > 0 && value < 1)) return false;
    any = true;
  }
  return any;
}

export const fractionRefusal = (name: string): CellError => refusal(
  `${name}: every value lies below 1. Give percents as numbers (12.5 for 12.5 %); cells formatted as % hold fractions, so multiply them by 100. A true 0.8 % is written as the text "0.8 %".`);

function notANumber(name: string, value: unknown): CellError {
  if (typeof value === "boolean") return refusal(`${name} must be a number, not ${String(value).toUpperCase()}.`);
  if (typeof value === "string" && COMMA_NUMBER.test(value)) return refusal(`${name} is the text ${quoted(value)}, not a number: type it with the decimal sign of this workbook.`);
  if (typeof value === "string" && value.trim() !== "" && Number.isFinite(Number(value))) return refusal(`${name} is the text ${quoted(value)}, not a number: retype it, or convert the text to a number.`);
  return refusal(`${name} must be a number, not ${quoted(value)}.`);
}

/** A number of a known quantity, within what the quantity can mean. */
export function numberOf(id: QuantityId): Reader<number> {
  const { name, kind, from, to, above, leftOut, smallShare } = quantity(id);
  const percent = kind === "percent";
  const inside = (value: number): boolean => value <= to && (above ? value > from : value >= from);
  return {
    name,
    ...(leftOut === undefined ? {} : { leftOut }),
    ...(percent && !smallShare ? { check: (block) => looksLikeFractions(block) ? fractionRefusal(name) : undefined } : {}),
    plain: (value) => typeof value === "number" && inside(value) && Number.isFinite(value),
    read(value) {
      if (value instanceof CellError) return value;
      if (isBlank(value)) return refusal(`${name} is blank.`);
      const typed = percent && typeof value === "string" ? PERCENT_TEXT.exec(value)?.[1] : undefined;
      const number = typed === undefined ? value : Number(typed);
      if (typeof number !== "number" || !Number.isFinite(number)) return notANumber(name, value);
      if (inside(number)) return number;
      if (number < 0 || (number === 0 && above)) return refusal(`${name} must be ${above ? "above" : "at least"} ${from}, not ${number}.`);
      return refusal(`${name} must lie between ${from} and ${to}${percent ? " %" : ""}, not ${number}.`);
    },
  };
}

const unitList = densityUnits.map((unit) => unit.id).join(", ");

/** A unit of density or unit weight, spelled freely. */
export function unitOf(name: string, leftOut?: string): Reader<DensityUnit> {
  return {
    name,
    ...(leftOut === undefined ? {} : { leftOut: densityUnit(leftOut)! }),
    read(value) {
      if (value instanceof CellError) return value;
      if (isBlank(value)) return refusal(`${name} is blank; choose one of ${unitList}.`);
      return (typeof value === "string" ? densityUnit(value) : undefined) ?? refusal(`${name} ${quoted(value)} is not a unit known here; choose one of ${unitList}.`);
    },
  };
}

const oneOf = <Unit extends { readonly id: string }>(name: string, known: readonly Unit[], find: (text: string) => Unit | undefined): Reader<Unit | null> => ({
  name,
  leftOut: null,
  read(value) {
    if (value instanceof CellError) return value;
    return (typeof value === "string" ? find(value) : undefined) ?? refusal(`${name} ${quoted(value ?? "")} is not known; choose one of ${known.map(({ id }) => id).join(", ")}.`);
  },
});

/** A unit of mass or of volume; left out, none is named. */
export const unitOfMass: Reader<MassUnit | null> = oneOf("unit of mass", massUnits, massUnit);
export const unitOfVolume: Reader<VolumeUnit | null> = oneOf("unit of volume", volumeUnits, volumeUnit);

/** The density of water in the sheet's unit: a number as the sheet takes it, or a unit, which stands for water at 20 °C. */
export const waterDensity: Reader<number> = {
  name: "density of water",
  leftOut: WATER_KG_M3_AT_20 / 1000,
  read(value) {
    if (value instanceof CellError) return value;
    if (isBlank(value)) return refusal("density of water is blank.");
    if (typeof value === "number" && value > 0 && unitOfWater(value, WATER_KG_M3_AT_20)) return value;
    if (typeof value === "number") return refusal(`density of water ${value} fits no unit: it is near 1 Mg/m³, 1000 kg/m³, 9.81 kN/m³ or 62.4 lb/ft³. Or give the unit as text, such as "kN/m3".`);
    const unit = typeof value === "string" ? densityUnit(value) : undefined;
    return unit ? WATER_KG_M3_AT_20 / unit.kgM3 : refusal(`density of water ${quoted(value)} is neither a number nor a unit; the units are ${unitList}.`);
  },
};

/** One of a few words, whatever their case. */
export function wordOf<const Word extends string>(name: string, words: readonly Word[], leftOut?: NoInfer<Word>): Reader<Word> {
  return {
    name,
    ...(leftOut === undefined ? {} : { leftOut }),
    read(value) {
      if (value instanceof CellError) return value;
      const wanted = typeof value === "string" ? value.trim().toLowerCase() : "";
      return words.find((word) => word.toLowerCase() === wanted) ?? refusal(`${name} ${quoted(value ?? "")} is not one of ${words.map((word) => `"${word}"`).join(", ")}.`);
    },
  };
}
