/**
 * Compaction tests from published sources, taken from their raw readings through our own relations.
 * Sources by letter: A exercise of a UK soil-mechanics text (BS 2.5 kg); C and E Principles of Geotechnical Engineering, 9th
 * edition, problems 6.4 and 5.10; G published BS 1377 laboratory sheet; H student report after D698, metric; L worked IS light
 * compaction test; N worked test in five different moulds; O municipal D1557 record; P worked example of AS 1289.5.1.1;
 * R published exercise of 44 points with two planted outliers; S Fundamentals of Geotechnical Engineering, 5th edition, example.
 */
import { wetDensityInMould } from "../../src/compaction/mould";
import type { CompactionTest } from "../../src/compaction/fit";
import { dryDensityFromWet } from "../../src/phase/density";
import { waterContentFromMasses } from "../../src/phase/water-content";
import data from "./data/compaction-tests.json";

export type SetName = "A" | "C" | "E" | "E_SI" | "G" | "H" | "L" | "N" | "O" | "P" | "R" | "S";

const dryFrom = (wet: readonly number[], waters: readonly number[]): number[] => wet.map((wetDensity, i) => dryDensityFromWet.value({ wetDensity, waterContent: waters[i]! }));
const moulds = (gross: readonly number[], mould: readonly number[] | number, volume: readonly number[] | number, scale = 1): number[] =>
  gross.map((mouldAndSoil, i) => scale * wetDensityInMould.value({ mouldAndSoil, mouldMass: typeof mould === "number" ? mould : mould[i]!, mouldVolume: typeof volume === "number" ? volume : volume[i]! }));
const tins = (wet: readonly number[], dry: readonly number[], tare: readonly number[]): number[] => wet.map((wetMass, i) => waterContentFromMasses.value({ wetMass, dryMass: dry[i]!, tare: tare[i]! }));
const pairMeans = (values: readonly number[]): number[] => Array.from({ length: values.length / 2 }, (_, i) => (values[2 * i]! + values[2 * i + 1]!) / 2);

const POUND_G = 453.59237;

function waters(name: SetName): number[] {
  switch (name) {
    case "G": return pairMeans(tins(data.G.cans_wet, data.G.cans_dry, data.G.tare));
    case "N": return tins(data.N.pan_wet, data.N.pan_dry, data.N.pan);
    case "O": return tins(data.O.can_wet, data.O.can_dry, data.O.tare);
    case "E": return data.E_lb.w;
    case "E_SI": return data.E_si_inferred.w;
    default: return data[name].w;
  }
}

export function publishedTest(name: SetName): CompactionTest {
  const w = waters(name);
  const test = (dries: readonly number[], waterDensity: number, specificGravity?: number): CompactionTest => ({ waters: w, dries, waterDensity, specificGravity });
  switch (name) {
    case "A": return test(dryFrom(moulds(data.A.gross_g, data.A.mould_g, data.A.V_cm3), w), 1, data.A.Gs);
    case "C": return test(dryFrom(moulds(data.C.wet_lb, 0, data.C.V_ft3), w), 62.4, data.C.Gs);
    case "E": return test(dryFrom(moulds(data.E_lb.wet_lb, 0, data.E_lb.V_ft3), w), 62.4, data.E_lb.Gs);
    case "E_SI": return test(dryFrom(moulds(data.E_si_inferred.wet_kg, 0, data.E_si_inferred.V_cm3, 1e6), w), 1000);
    case "G": return test(dryFrom(moulds(data.G.gross_g, data.G.mould_g, data.G.V_cm3), w), 1, 2.65);
    case "H": return test(data.H.published_gd_kN, 9.81, 2.7);
    case "L": return test(dryFrom(moulds(data.L.gross_g, data.L.mould_g, data.L.V_cm3), w), 1, data.L.Gs);
    case "N": return test(dryFrom(moulds(data.N.gross_g, data.N.mould_g, data.N.V_ml, 1000), w), 1000, 2.7);
    case "O": return test(dryFrom(moulds(data.O.gross_g, data.O.mould_g, data.O.V_ft3, 1 / POUND_G), w), 62.4, 2.7);
    case "P": return test(data.P.rd, 1);
    case "R": return test(data.R.rd, 1);
    case "S": return test(data.S.gd_kN, 9.81, data.S.Gs);
  }
}
