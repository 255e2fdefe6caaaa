import { relation } from "../relations/relation";

/** The zero-air-voids line: the dry density at which water fills every void. */
export const zeroAirVoids = relation(
  "dryDensity", "waterDensity / (waterContent / 100 + 1 / specificGravity)",
  { title: "ASTM D698", clause: "zero-air-voids curve" });
/** The water content that fills every void at a dry density. */
export const saturationWater = zeroAirVoids.solvedFor("waterContent");
/** The smallest specific gravity at which a point does not lie past the zero-air-voids line. */
export const leastSpecificGravity = zeroAirVoids.solvedFor("specificGravity");

/** A point this share past the line is let be: the spread of the round figures in use for the density of water, 62.3 to 62.43 lb/ft3. Common practice, no published source. */
export const LINE_ALLOWANCE = 0.002;

/** The line of a constant degree of saturation. */
export const saturationLine = relation(
  "dryDensity", "waterDensity / (waterContent / saturation + 1 / specificGravity)",
  { title: "definition of the degree of saturation", clause: "saturation = water content x specific gravity / void ratio" });
export const degreeOfSaturation = saturationLine.solvedFor("saturation");

/** The line of constant air voids, as percent of the total volume. */
export const airVoidsLine = relation(
  "dryDensity", "(1 - airVoids / 100) * waterDensity / (waterContent / 100 + 1 / specificGravity)",
  { title: "BS 1377-4", clause: "air-voids lines" });
export const airVoidsOfPoint = airVoidsLine.solvedFor("airVoids");
