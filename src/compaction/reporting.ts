import type { StandardId } from "./fit";

export interface Reporting {
  /** step of the maximum dry density, by the unit of the sheet */
  readonly dryDensity: readonly { readonly unit: string; readonly step: number }[];
  /** step of the optimum, which may depend on the figure */
  water(optimum: number): number;
}

const astm: Reporting = { dryDensity: [{ unit: "lb/ft3", step: 0.1 }, { unit: "kN/m3", step: 0.02 }], water: () => 0.1 };
/** two significant figures */
const twoFigures = (optimum: number): number => optimum >= 10 ? 1 : 0.1;

/**
 * How finely the standards report a peak. ASTM D698-00, section on the report, for 0.1 % and 0.1 lbf/ft³; all others from memory:
 * 0.02 kN/m³; BS 1377-4, 0.01 Mg/m³ and two significant figures; AS 1289, 0.01 t/m³ and 0.5 %; IS 2720, 0.01 g/cm³ and 0.1 %.
 */
export const reporting: Readonly<Record<StandardId, Reporting>> = {
  "ASTM D698": astm, "ASTM D1557": astm, "AASHTO T 99": astm, "AASHTO T 180": astm,
  "BS 1377-4": { dryDensity: [{ unit: "Mg/m3", step: 0.01 }], water: twoFigures },
  "AS 1289": { dryDensity: [{ unit: "Mg/m3", step: 0.01 }], water: () => 0.5 },
  "IS 2720": { dryDensity: [{ unit: "Mg/m3", step: 0.01 }], water: () => 0.1 },
};
