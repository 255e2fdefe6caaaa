import { relation } from "../relations/relation";

/** Borrow volume in the bank that holds the dry soil of a fill, a share of the bank volume being lost on the way. */
export const bankVolumeForFill = relation(
  "bankVolume", "fillVolume * fillDryDensity / bankDryDensity / (1 - loss / 100)",
  { title: "mass balance on dry soil", clause: "borrow-pit problems of any text of geotechnical engineering" });
