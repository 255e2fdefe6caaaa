/** What a fill can be judged by. */
export const zoneQuantities = ["RC", "gap", "ratio", "water", "air", "saturation", "dry"] as const;
export type ZoneQuantity = (typeof zoneQuantities)[number];

export interface Clause {
  readonly quantity: ZoneQuantity;
  /** an end that is null is not there */
  readonly low: number | null;
  readonly high: number | null;
  /** decimals in which the limits are written */
  readonly decimals: number;
}

/** A zone of acceptance, as a specification writes it. */
export interface Zone {
  readonly clauses: readonly Clause[];
  /** step to which the specification has figures rounded before they are judged; null where it says nothing */
  readonly round: number | null;
}

const NUMBER = "[+\\-\u2212]?\\d+(?:[.,]\\d+)?";
const BETWEEN = new RegExp(`^(\\w+)\\s*(?:between\\s+)?(${NUMBER})\\s*(?:\\.\\.|to|\u2026)\\s*(${NUMBER})\\s*%?$`, "i");
const LIMIT = new RegExp(`^(\\w+)\\s*(>=|=>|\u2265|<=|=<|\u2264)\\s*(${NUMBER})\\s*%?$`, "i");
const ROUND = new RegExp(`^round\\s+(${NUMBER})$`, "i");

const numberOf = (text: string): number => Number(text.replace("\u2212", "-").replace(",", "."));
const decimalsOf = (text: string): number => text.split(/[.,]/)[1]?.length ?? 0;

/**
 * Reads a zone such as `RC >= 95; gap -2..+2; air <= 10; round 0.1`.
 * @returns the zone, or a sentence that says which clause is not understood and how to write it
 */
export function parseZone(text: string): Zone | string {
  const parts = text.split(/[;\n]/).map((part) => part.trim()).filter((part) => part !== "");
  if (parts.length === 0) return 'the zone is empty: write clauses such as "RC >= 95; gap -2..+2".';
  const clauses: Clause[] = [];
  let round: number | null = null;
  for (const [i, part] of parts.entries()) {
    const rounding = ROUND.exec(part), limit = LIMIT.exec(part), between = BETWEEN.exec(part);
    if (rounding) {
      round = numberOf(rounding[1]!);
      if (!(round > 0)) return `clause ${i + 1} of the zone, "${part}": the step of rounding must be above 0, such as "round 0.1".`;
      continue;
    }
    const found = limit ?? between;
    if (!found) return `clause ${i + 1} of the zone, "${part}", is not understood: write a quantity with >= or <= and a number, or from..to, such as "RC >= 95" or "gap -2..+2".`;
    const quantity = zoneQuantities.find((one) => one.toLowerCase() === found[1]!.toLowerCase());
    if (!quantity) return `clause ${i + 1} of the zone, "${part}": "${found[1]!}" is no quantity of it; they are ${zoneQuantities.join(", ")}.`;
    if (limit) {
      const value = numberOf(limit[3]!), least = /[>\u2265]/.test(limit[2]!);
      clauses.push({ quantity, low: least ? value : null, high: least ? null : value, decimals: decimalsOf(limit[3]!) });
    } else {
      const low = numberOf(between![2]!), high = numberOf(between![3]!);
      if (low > high) return `clause ${i + 1} of the zone, "${part}": ${low} lies above ${high}.`;
      clauses.push({ quantity, low, high, decimals: Math.max(decimalsOf(between![2]!), decimalsOf(between![3]!)) });
    }
  }
  return clauses.length === 0 ? 'the zone has no limit: write a clause such as "RC >= 95".' : { clauses, round };
}
