import { relation } from "../relations/relation";

/** Water content from the masses of wet and dry soil, each weighed in its tin. */
export const waterContentFromMasses = relation(
  "waterContent", "100 * (wetMass - dryMass) / (dryMass - tare)",
  { title: "ASTM D2216", clause: "calculation of water content" });

/** Water content on dry mass from one on wet mass, as a calcium carbide tester reads it. */
export const waterContentFromWetBasis = relation(
  "waterContent", "100 * wetBasisWater / (100 - wetBasisWater)",
  { title: "AASHTO T 217", clause: "conversion of the gauge reading to dry mass" });
