import { relation } from "../relations/relation";

const balance = { title: "mass balance on dry soil", clause: "FM 5-434, moisture control; water at 1 kg a litre or 8.345 lb a US gallon" };

/** Water on a lift, litres a m² (mm) from mm and Mg/m³; negative is to dry out. */
export const sprayLitres = relation("sprayRate", "thickness * dryDensity * (targetWater - waterContent) / 100", balance);
/** The same, US gallons a yd² from inches and lb/ft³. */
export const sprayGallons = relation("sprayRate", "thickness / 12 * 9 * dryDensity * (targetWater - waterContent) / 100 / 8.345", balance);

/** Days in which the surplus water of a lift evaporates: mm, Mg/m³, mm a day. */
export const dryingDaysSi = relation("dryingDays", "thickness * dryDensity * (waterContent - targetWater) / 100 / evaporation", balance);
/** The same: in, lb/ft³, in a day; water weighs 62.4 lb a cubic foot. */
export const dryingDaysUs = relation("dryingDays", "thickness * dryDensity * (waterContent - targetWater) / 100 / 62.4 / evaporation", balance);

const blending = { title: "mass balance on dry soil and water", clause: "blending of two moist soils" };
/** Water content of a blend of two moist masses. */
export const waterOfBlend = relation(
  "waterContent", "100 * ((firstMass + secondMass) / (firstMass / (1 + firstWater / 100) + secondMass / (1 + secondWater / 100)) - 1)", blending);
/** Share of the second in a blend that meets a target, percent of dry mass. */
export const dryShareOfBlend = relation("blendShare", "100 * (targetWater - firstWater) / (secondWater - firstWater)", blending);
/** The same, percent of moist mass. */
export const moistShareOfBlend = relation(
  "blendShare", "100 * (targetWater - firstWater) * (100 + secondWater) / ((secondWater - firstWater) * (100 + targetWater))", blending);
