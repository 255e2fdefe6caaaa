/** Units of mass and of volume as laboratory sheets have them. Conversions are exact definitions. */
const POUND_KG = 0.45359237;
const FOOT_M = 0.3048;

export interface MassUnit { readonly id: string; readonly printed: string; readonly kg: number; readonly spellings: readonly string[] }
export interface VolumeUnit { readonly id: string; readonly printed: string; readonly m3: number; readonly spellings: readonly string[] }

export const massUnits: readonly MassUnit[] = [
  { id: "g", printed: "g", kg: 0.001, spellings: ["g", "gm", "gms", "gram", "grams", "gr"] },
  { id: "kg", printed: "kg", kg: 1, spellings: ["kg", "kgs", "kilogram", "kilograms"] },
  { id: "lb", printed: "lb", kg: POUND_KG, spellings: ["lb", "lbs", "lbm", "lbf", "pound", "pounds"] },
  { id: "Mg", printed: "Mg", kg: 1000, spellings: ["t", "tonne", "tonnes"] },
];

export const volumeUnits: readonly VolumeUnit[] = [
  { id: "cm3", printed: "cm³", m3: 1e-6, spellings: ["cm3", "cc", "ml", "cucm", "millilitre", "milliliter"] },
  { id: "L", printed: "L", m3: 1e-3, spellings: ["l", "litre", "liter", "litres", "liters", "dm3"] },
  { id: "m3", printed: "m³", m3: 1, spellings: ["m3", "cum"] },
  { id: "ft3", printed: "ft³", m3: FOOT_M ** 3, spellings: ["ft3", "cuft", "cf", "cubicft", "cubicfeet"] },
  { id: "in3", printed: "in³", m3: (FOOT_M / 12) ** 3, spellings: ["in3", "cuin", "cubicin", "cubicinches"] },
  { id: "mm3", printed: "mm³", m3: 1e-9, spellings: ["mm3", "cumm"] },
];

const plain = (text: string): string => text.toLowerCase().replace(/³/g, "3").replace(/[\s.^()*]/g, "");

/** The unit of mass a person has spelled, or undefined. `Mg` is a megagram where its case says so; `mg` is no unit of a soil's mass. */
export const massUnit = (text: string): MassUnit | undefined => {
  const wanted = plain(text);
  return text.trim() === "Mg" ? massUnits.find(({ id }) => id === "Mg") : massUnits.find((unit) => unit.spellings.includes(wanted));
};

/** The unit of volume a person has spelled (`cm³`, `ft^3`, `cu ft`, `mL`), or undefined. */
export const volumeUnit = (text: string): VolumeUnit | undefined => {
  const wanted = plain(text);
  return volumeUnits.find((unit) => unit.spellings.includes(wanted));
};
