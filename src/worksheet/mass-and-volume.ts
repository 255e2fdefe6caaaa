import { LINE_ALLOWANCE, zeroAirVoids } from "../phase/lines";
import { densityOfWater } from "../units/water-density";
import { refusal, type Block, type Cell, type CellError } from "./cell";
import { argument, column } from "./column";
import { numberOf, unitOf, waterDensity } from "./readers";
import { unitGuard } from "./unit-guard";

type Cells = Block | null;

const line = zeroAirVoids.by("waterContent", "specificGravity", "waterDensity");

/** Whether a point lies past the zero-air-voids line by more than an allowance. */
export const pastZeroAirVoids = (dry: Cells, water: Cells, gs: Cells, density: Cells, allowance: Cells): Cell[][] | CellError =>
  column([
    argument(numberOf("dryDensity"), dry), argument(numberOf("waterContent"), water), argument(numberOf("specificGravity"), gs),
    argument(waterDensity, density), argument({ ...numberOf("allowance"), leftOut: -1 }, allowance),
  ], (dryDensity, waterContent, specificGravity, ofWater, given) => {
    const onLine = line(waterContent, specificGravity, ofWater);
    return unitGuard(dryDensity, ofWater) ?? dryDensity > onLine + (given < 0 ? LINE_ALLOWANCE * onLine : given);
  });

const waterAt = densityOfWater.by("temperature");

export const waterDensityAt = (temperature: Cells, unit: Cells): Cell[][] | CellError =>
  column([argument(numberOf("temperature"), temperature), argument(unitOf("unit", "Mg/m3"), unit)], (t, { kgM3 }) => waterAt(t) / kgM3);

export const densityAs = (value: Cells, from: Cells, to: Cells): Cell[][] | CellError =>
  column([argument({ ...numberOf("dryDensity"), name: "value" }, value), argument(unitOf("unit to convert from"), from), argument(unitOf("unit to convert to"), to)],
    (density, a, b) => density * a.kgM3 / b.kgM3);

/** Guards the one slip of weighing that still gives a plausible figure: a tin heavier than the dry soil in it. */
export const dryMassGuard = ({ dryMass, tare }: Readonly<Record<string, number>>): CellError | undefined =>
  dryMass! <= tare! ? refusal(`mass of dry soil and tin ${dryMass} must be above the mass of the tin ${tare}.`) : undefined;
