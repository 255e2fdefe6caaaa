import { relation } from "../relations/relation";

/**
 * Compactive effort in kJ/m3 from kg, mm and cm3 with standard gravity: mm over 1000 gives joules,
 * and cm3 over a million times a thousand joules a kilojoule leaves no factor at all.
 */
export const compactiveEffort = relation(
  "compactiveEffort", "rammerMass * 9.80665 * drop * blows * layers / mouldVolume",
  { title: "ASTM D698 and D1557", clause: "compactive effort in the titles and the notes on it" });
