import { relation } from "../relations/relation";

const massBalance = { title: "mass balance on dry soil", clause: "FM 5-434, moisture control; water at 1 kg a litre or 8.345 lb a US gallon" };

/** Litres from m3 and Mg/m3; negative is water to dry out. */
export const waterNeedLitres = relation("waterNeed", "volume * dryDensity * 1000 * (targetWater - waterContent) / 100", massBalance);
/** US gallons from yd3 and lb/ft3; negative is water to dry out. */
export const waterNeedGallons = relation("waterNeed", "volume * 27 * dryDensity * (targetWater - waterContent) / 100 / 8.345", massBalance);
/** What has to be sprayed so that the need still arrives after a share is lost. */
export const waterToSpray = relation("waterToSpray", "waterNeed / (1 - loss / 100)", { title: "mass balance of sprayed water", clause: "loss as share of what is sprayed" });
