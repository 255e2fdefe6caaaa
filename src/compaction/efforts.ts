import { degreeOfSaturation, saturationLine } from "../phase/lines";
import type { Fit } from "./fit";

/** The same soil under one compactive effort. */
export interface EffortTest { readonly id: string; /** kJ/m³ */ readonly effort: number; readonly fit: Fit }

export interface EffortStep {
  readonly from: string;
  readonly to: string;
  /** gain in maximum dry density and change of optimum, for ten times the effort */
  readonly gainPerDecade: number;
  readonly waterPerDecade: number;
}

export interface Efforts {
  /** by effort, the lightest first */
  readonly tests: readonly EffortTest[];
  readonly steps: readonly EffortStep[];
  /** pairs that contradict what heavier compaction does, beyond both their intervals */
  readonly contradictions: readonly string[];
  /** the gain of every further step is less than that of the one before; null where there are fewer than two steps */
  readonly gainShrinks: boolean | null;
  readonly optimums: LineOfOptimums | null;
}

/** Degree of saturation along the line of optimums, percent; it hardly changes from effort to effort. */
export interface LineOfOptimums { readonly saturation: number; readonly from: number; readonly to: number; at(water: number): number }

/**
 * One soil under several efforts. Heavier compaction gives a greater maximum dry density at a lower optimum, and each further
 * effort gains less. Source: Principles of Geotechnical Engineering, chapter on compaction, effect of effort;
 * Horpibulsuk and others, Soils and Foundations 48(1) (2008) 115, for the constant saturation of optimums.
 */
export function compareEfforts(given: readonly EffortTest[]): Efforts {
  const tests = [...given].sort((a, b) => a.effort - b.effort), steps: EffortStep[] = [], contradictions: string[] = [];
  for (let i = 1; i < tests.length; i++) {
    const light = tests[i - 1]!, heavy = tests[i]!, decades = Math.log10(heavy.effort / light.effort);
    if (!(decades > 0)) continue;
    const gain = heavy.fit.maxDryDensity.value - light.fit.maxDryDensity.value, water = heavy.fit.optimumWater.value - light.fit.optimumWater.value;
    steps.push({ from: light.id, to: heavy.id, gainPerDecade: gain / decades, waterPerDecade: water / decades });
    if (below(heavy.fit.maxDryDensity, light.fit.maxDryDensity)) contradictions.push(`${heavy.id} is the heavier compaction, and yet its maximum dry density is below that of ${light.id}, beyond both intervals: check which is which, and whether it is the same soil.`);
    if (below(light.fit.optimumWater, heavy.fit.optimumWater)) contradictions.push(`${heavy.id} is the heavier compaction, and yet its optimum is wetter than that of ${light.id}, beyond both intervals: check which is which, and whether it is the same soil.`);
  }
  const gainShrinks = steps.length < 2 ? null : steps.every((step, i) => i === 0 || step.gainPerDecade < steps[i - 1]!.gainPerDecade);
  return { tests, steps, contradictions, gainShrinks, optimums: lineOfOptimums(tests) };
}

interface Bounded { readonly low: number | null; readonly high: number | null }
const below = (a: Bounded, b: Bounded): boolean => a.high !== null && b.low !== null && a.high < b.low;

function lineOfOptimums(tests: readonly EffortTest[]): LineOfOptimums | null {
  const known = tests.flatMap(({ fit }) => fit.test.specificGravity === undefined ? [] : [{ fit, specificGravity: fit.test.specificGravity, waterDensity: fit.test.waterDensity }]);
  if (known.length < 2) return null;
  const at = known.map(({ fit, specificGravity, waterDensity }) => degreeOfSaturation.value({ dryDensity: fit.maxDryDensity.value, waterContent: fit.optimumWater.value, specificGravity, waterDensity }));
  const saturation = at.reduce((sum, one) => sum + one / at.length, 0), { specificGravity, waterDensity } = known[0]!;
  return { saturation, from: Math.min(...at), to: Math.max(...at), at: (waterContent) => saturationLine.value({ waterContent, specificGravity, saturation, waterDensity }) };
}
