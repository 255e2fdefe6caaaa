/** Units of density and of unit weight, which the trade uses for each other. Conversions are exact definitions. */
const STANDARD_GRAVITY = 9.80665;
const POUND_KG = 0.45359237;
const FOOT_M = 0.3048;

export interface DensityUnit {
  /** the spelling that the functions take and the messages print */
  readonly id: string;
  readonly printed: string;
  /** how many kg/m3 one of the unit is, unit weights at standard gravity */
  readonly kgM3: number;
  readonly spellings: readonly string[];
}

const poundPerCubicFoot = POUND_KG / FOOT_M ** 3;

export const densityUnits: readonly DensityUnit[] = [
  { id: "Mg/m3", printed: "Mg/m³", kgM3: 1000, spellings: ["mg/m3", "t/m3", "g/cm3", "g/cc", "g/ml", "kg/l", "kg/dm3", "tonne/m3", "gm/cc", "gm/cm3"] },
  { id: "kg/m3", printed: "kg/m³", kgM3: 1, spellings: ["kg/m3", "g/l", "kg/cum"] },
  { id: "kN/m3", printed: "kN/m³", kgM3: 1000 / STANDARD_GRAVITY, spellings: ["kn/m3", "kn/cum"] },
  { id: "lb/ft3", printed: "lb/ft³", kgM3: poundPerCubicFoot, spellings: ["lb/ft3", "lbf/ft3", "pcf", "lbs/ft3", "lb/cuft", "lb/cf", "lbs/cuft", "lbm/ft3"] },
  { id: "lb/yd3", printed: "lb/yd³", kgM3: poundPerCubicFoot / 27, spellings: ["lb/yd3", "lbs/yd3", "pcy", "lb/cuyd", "lb/cy"] },
];

const plain = (text: string): string => text.toLowerCase().replace(/³/g, "3").replace(/[\s.^()*]/g, "").replace(/per/g, "/");

/** The unit a person has spelled (`"kN/m³"`, `"PCF"`, `"g/cm^3"`), or undefined. */
export const densityUnit = (text: string): DensityUnit | undefined => {
  const wanted = plain(text);
  return densityUnits.find((unit) => unit.spellings.includes(wanted));
};

/** The unit in which a density of water is a given number (1, 9.81, 62.4, 1000 and their like), or undefined. */
export const unitOfWater = (density: number, waterKgM3: number): DensityUnit | undefined =>
  densityUnits.find((unit) => Math.abs(density * unit.kgM3 / waterKgM3 - 1) < 0.035);

/** A soil's dry density lies between these multiples of the density of water; a number outside is in another unit. */
export const SOIL_OVER_WATER = { low: 0.4, high: 3.5 } as const;

export function couldBeSoil(density: number, { kgM3 }: DensityUnit, waterKgM3: number): boolean {
  const ratio = density * kgM3 / waterKgM3;
  return ratio >= SOIL_OVER_WATER.low && ratio <= SOIL_OVER_WATER.high;
}

/** The unit in which a number would be a soil's density. Where several would do, the first of the list: 1.8, 18, 115, 1800 tell themselves apart. */
export const unitItLooksLike = (density: number, waterKgM3: number): DensityUnit | undefined =>
  densityUnits.find((unit) => couldBeSoil(density, unit, waterKgM3));
