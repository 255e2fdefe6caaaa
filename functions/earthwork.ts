import { bankVolumeColumn, waterToAdd } from "../src/worksheet/earthwork";
import { cells, reply } from "./reply";

/**
 * Water to spray on a volume of soil to bring it to a target water content; negative is water to dry out.
 * @customfunction WATERADD
 * @param volume Volume of soil: m³, or yd³ with "US". A cell or a column.
 * @param dry Dry density of the soil in the same state as the volume: Mg/m³, or lb/ft³ with "US".
 * @param now Water content now, percent of dry mass.
 * @param target Water content wanted, percent of dry mass.
 * @param [lossPct] Share of the sprayed water that never reaches the soil, percent. Ignored when drying. Left out: none.
 * @param [system] Units of the sheet: "SI" for m³, Mg/m³ and litres, "US" for yd³, lb/ft³ and US gallons. Left out: "SI".
 * @returns Litres or US gallons, at 1 kg a litre or 8.345 lb a gallon.
 */
export function waterAdd(volume: any[][], dry: any[][], now: any[][], target: any[][], lossPct?: any[][], system?: any[][]): any[][] {
  return reply(() => waterToAdd(cells(volume), cells(dry), cells(now), cells(target), cells(lossPct), cells(system)));
}

/**
 * Volume to dig in the bank (in place, before digging) for a fill, by balance of the dry soil.
 * @customfunction BANKVOL
 * @param fillVolume Volume of the compacted fill, any unit. A cell or a column.
 * @param fillDry Dry density of the fill, any unit.
 * @param bankDry Dry density in the bank, in the same unit.
 * @param [lossPct] Share of the bank volume that is lost (waste, stripping, haul), percent. Left out: none.
 * @returns Volume in the bank, in the unit of the fill volume.
 */
export function bankVol(fillVolume: any[][], fillDry: any[][], bankDry: any[][], lossPct?: any[][]): any[][] {
  return reply(() => bankVolumeColumn(cells(fillVolume), cells(fillDry), cells(bankDry), cells(lossPct)));
}
