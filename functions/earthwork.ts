import { bankVolumeColumn, bulkingColumn, looseLiftColumn, shrinkColumn, swellColumn, waterToAdd } from "../src/worksheet/earthwork";
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

/**
 * Swell from bank to loose: how much more room the soil takes once it is dug.
 * @customfunction SWELLPCT
 * @param bankDry Dry density in the bank. A cell or a column.
 * @param looseDry Loose dry density, same unit.
 * @param [basis] Volume that the percent is of: "bank" or "loose". Left out: "bank".
 * @returns Swell, percent.
 */
export function swellPct(bankDry: any[][], looseDry: any[][], basis?: any[][]): any[][] {
  return reply(() => swellColumn(cells(bankDry), cells(looseDry), cells(basis)));
}

/**
 * Shrink from bank to fill: how much less room the soil takes once it is compacted. Negative where it takes more, as rock does.
 * @customfunction SHRINKPCT
 * @param bankDry Dry density in the bank. A cell or a column.
 * @param fillDry Dry density of the fill, same unit.
 * @param [basis] Volume that the percent is of: "bank" or "fill". Left out: "bank".
 * @returns Shrink, percent.
 */
export function shrinkPct(bankDry: any[][], fillDry: any[][], basis?: any[][]): any[][] {
  return reply(() => shrinkColumn(cells(bankDry), cells(fillDry), cells(basis)));
}

/**
 * Loose thickness to spread so that a lift has its thickness once it is compacted.
 * @customfunction LOOSELIFT
 * @param thickness Thickness of the compacted lift, any unit. A cell or a column.
 * @param fillDry Dry density of the compacted fill.
 * @param looseDry Loose dry density as spread, same unit.
 * @returns Loose thickness, in the unit of the lift.
 */
export function looseLiftThickness(thickness: any[][], fillDry: any[][], looseDry: any[][]): any[][] {
  return reply(() => looseLiftColumn(cells(thickness), cells(fillDry), cells(looseDry)));
}

/**
 * Bulking of moist sand: how much more room it takes than dry or flooded.
 * @customfunction SANDBULK
 * @param moistDry Dry density of the sand as it lies moist and loose. A cell or a column.
 * @param looseDry Dry density of the same sand loose and dry (or flooded), same unit.
 * @returns Bulking, percent of the volume dry.
 */
export function sandBulk(moistDry: any[][], looseDry: any[][]): any[][] {
  return reply(() => bulkingColumn(cells(moistDry), cells(looseDry)));
}
