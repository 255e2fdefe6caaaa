import { dryingDaysSi, dryingDaysUs, dryShareOfBlend, moistShareOfBlend, sprayGallons, sprayLitres, waterOfBlend } from "../earthwork/conditioning";
import { curvatureCoefficient, finesThatFill, packedDensity, uniformityCoefficient } from "../earthwork/packing";
import { lastUsefulPass, passesTo, rollerTrial, rollRateSi, rollRateUs } from "../earthwork/rolling";
import { waterToSpray } from "../earthwork/water";
import { CellError, isLeftOut, notEnough, refusal, type Block, type Cell } from "./cell";
import { argument, column } from "./column";
import { mixedUnits } from "./compaction-test";
import { readPairs } from "./pairs";
import { numberOf, waterDensity, wordOf, type Reader } from "./readers";
import { relationColumn } from "./relation-column";
import { readAll, single } from "./single";
import { systemGuard, systemWord } from "./systems";
import { sameUnitGuard, unitGuard } from "./unit-guard";

type Cells = Block | null;
const inOrder = ["thickness", "dryDensity", "waterContent", "targetWater"] as const;
const sprays = { SI: sprayLitres.by(...inOrder), US: sprayGallons.by(...inOrder) }, drying = { SI: dryingDaysSi.by(...inOrder, "evaporation"), US: dryingDaysUs.by(...inOrder, "evaporation") };
const withLoss = waterToSpray.by("waterNeed", "loss");

/** Water on a lift: litres a m² or US gallons a yd²; negative is to dry out. */
export const waterSpray = (thickness: Cells, dry: Cells, now: Cells, target: Cells, loss: Cells, system: Cells): Cell[][] | CellError =>
  column([argument(numberOf("thickness"), thickness), argument(numberOf("dryDensity"), dry), argument(numberOf("waterContent"), now), argument(numberOf("targetWater"), target), argument(numberOf("loss"), loss), argument(systemWord, system)],
    (t, density, water, wanted, lost, word) => {
      const trouble = systemGuard(density, word);
      if (trouble) return trouble;
      const need = sprays[word](t, density, water, wanted);
      return need > 0 ? withLoss(need, lost) : need;
    });

/** Days of drying; none where the soil is dry enough. */
export const dryTime = (thickness: Cells, dry: Cells, now: Cells, target: Cells, evaporation: Cells, system: Cells): Cell[][] | CellError =>
  column([argument(numberOf("thickness"), thickness), argument(numberOf("dryDensity"), dry), argument(numberOf("waterContent"), now), argument(numberOf("targetWater"), target), argument(numberOf("evaporation"), evaporation), argument(systemWord, system)],
    (t, density, water, wanted, rate, word) => systemGuard(density, word) ?? Math.max(0, drying[word](t, density, water, wanted, rate)));

export const blendWater = (firstMass: Cells, firstWater: Cells, secondMass: Cells, secondWater: Cells): Cell[][] | CellError =>
  relationColumn(waterOfBlend, { firstMass, firstWater, secondMass, secondWater }, { guard: ({ firstMass: a, secondMass: b }) => a! + b! > 0 ? undefined : refusal("both masses are 0: there is nothing to blend.") });

const shares = { moist: moistShareOfBlend.by("firstWater", "secondWater", "targetWater"), dry: dryShareOfBlend.by("firstWater", "secondWater", "targetWater") };

/** Share of the second soil that brings a blend to a target between the two. */
export const blendShare = (firstWater: Cells, secondWater: Cells, target: Cells, basis: Cells): Cell[][] | CellError =>
  column([argument(numberOf("firstWater"), firstWater), argument(numberOf("secondWater"), secondWater), argument(numberOf("targetWater"), target), argument(wordOf("basis", ["moist", "dry"], "moist"), basis)],
    (first, second, wanted, word) => first === second ? refusal(`both soils have ${first} % of water: no blend of them has another.`)
      : (wanted - first) * (wanted - second) > 0 ? refusal(`a target of ${wanted} % lies outside the two soils' ${Math.min(first, second)} to ${Math.max(first, second)} %: no blend of them meets it.`)
        : shares[word](first, second, wanted));

/** Share of fines that fills the voids of a coarse soil, and the density there. */
export function finesFill(coarseDry: Cells, coarseGs: Cells, finesDry: Cells, water: Cells): Cell[][] | CellError {
  const read = readAll({ coarseDryDensity: coarseDry, coarseGravity: coarseGs, finesDryDensity: finesDry });
  if (read instanceof CellError) return read;
  const density = single(waterDensity, water);
  if (density instanceof CellError) return density;
  const inputs = { ...read, waterDensity: density! } as Record<"coarseDryDensity" | "coarseGravity" | "finesDryDensity" | "waterDensity", number>;
  const trouble = unitGuard(inputs.coarseDryDensity, inputs.waterDensity) ?? sameUnitGuard(inputs.finesDryDensity, "dry density of the fines", inputs.coarseDryDensity, "dry density of the coarse soil", 0.3, 3);
  if (trouble) return trouble;
  if (inputs.coarseDryDensity >= inputs.coarseGravity * inputs.waterDensity) return refusal(`a coarse soil of ${inputs.coarseDryDensity} has no voids at a specific gravity of ${inputs.coarseGravity}: check both.`);
  return [[finesThatFill.value(inputs), packedDensity.value(inputs)]];
}

const rollOrder = ["drumWidth", "rollerSpeed", "thickness", "rollerPasses", "efficiency"] as const;
const rates = { SI: rollRateSi.by(...rollOrder), US: rollRateUs.by(...rollOrder) };

/** Compacted volume an hour of one roller. */
export const rollRate = (width: Cells, speed: Cells, lift: Cells, passes: Cells, efficiency: Cells, system: Cells): Cell[][] | CellError =>
  column([argument(numberOf("drumWidth"), width), argument(numberOf("rollerSpeed"), speed), argument(numberOf("thickness"), lift), argument(numberOf("rollerPasses"), passes), argument(numberOf("efficiency"), efficiency), argument(systemWord, system)],
    (b, v, t, n, share, word) => t < LIFT[word].from || t > LIFT[word].to
      ? refusal(`a lift of ${t} is no lift in ${LIFT[word].unit}: give the compacted thickness in ${LIFT[word].unit}.`) : rates[word](b, v, t, n, share));

/** Lifts that are rolled, by system. Common practice, no published source. */
const LIFT = { SI: { from: 20, to: 3000, unit: "mm" }, US: { from: 1, to: 120, unit: "in" } } as const;

/** Roller trial: plateau, passes to a target, and the pass after which a further one is hardly worth its time. */
export function rollFit(passes: Cells, dries: Cells, target: Cells, minGain: Cells): Cell[][] | CellError {
  if (isLeftOut(passes) || isLeftOut(dries)) return refusal("give the passes and the dry densities of the trial.");
  const pairs = readPairs("rollerPasses", passes!, "dryDensity", dries!);
  if (pairs instanceof CellError) return pairs;
  const wanted = isLeftOut(target) ? null : single({ ...numberOf("dryDensity"), name: "target dry density" } as Reader<number>, target), gain = isLeftOut(minGain) ? null : single({ ...numberOf("allowance"), name: "least gain a pass" } as Reader<number>, minGain);
  for (const read of [wanted, gain]) if (read instanceof CellError) return read;
  if (new Set(pairs.first).size < 3) return notEnough(`A roller trial needs at least three different numbers of passes; there ${new Set(pairs.first).size === 1 ? "is 1" : `are ${new Set(pairs.first).size}`}.`);
  const mixed = mixedUnits(wanted === null ? pairs.second : [...pairs.second, wanted as number], [...pairs.rows, 0]);
  if (mixed) return mixed;
  const trial = rollerTrial(pairs.first, pairs.second);
  if (!trial) return refusal("the densities do not rise towards a plateau with the passes: check that passes and densities are paired rightly, or roll further.");
  const needed = wanted === null ? undefined : passesTo(trial, wanted as number), most = Math.max(...pairs.first), least = (gain as number | null) ?? LEAST_GAIN * trial.plateau;
  const useful = lastUsefulPass(trial, least);
  return [
    ["", "value", "low (95 %)", "high (95 %)"],
    ["plateau of dry density", trial.plateau, trial.low ?? "no spare point", trial.high ?? "no spare point"],
    ["passes to the target", needed === undefined ? "no target given" : needed === null ? "not reached: the plateau lies below it" : needed, needed !== null && needed !== undefined && needed > most ? `beyond the trial's ${most} passes` : "", ""],
    ["pass after which the next gains too little", useful, useful > most ? `beyond the trial's ${most} passes` : "", ""],
    ["least gain taken", least, minGainWords(gain as number | null), ""],
  ];
}

/** A pass that gains less than this share of the plateau is not worth its time, where nothing else is said. Common practice, no published source. */
const LEAST_GAIN = 0.0025;
const minGainWords = (given: number | null): string => given === null ? `${100 * LEAST_GAIN} % of the plateau, as none is given` : "";

/** Coefficients of a grading, and what they say. ASTM D2487: gravel from 4, sand from 6, curvature 1 to 3. */
export function gradeWell(d10: Cells, d30: Cells, d60: Cells, kind: Cells): Cell[][] | CellError {
  const read = readAll({ tenPercentSize: d10, thirtyPercentSize: d30, sixtyPercentSize: d60 });
  if (read instanceof CellError) return read;
  if (isLeftOut(kind)) return refusal('give the kind of soil, "gravel" or "sand".');
  const word = single(wordOf("kind", ["gravel", "sand"]), kind);
  if (word instanceof CellError) return word;
  if (!(read.tenPercentSize <= read.thirtyPercentSize && read.thirtyPercentSize <= read.sixtyPercentSize)) return refusal(`the sizes must rise: ${read.tenPercentSize}, ${read.thirtyPercentSize}, ${read.sixtyPercentSize} do not.`);
  const uniformity = uniformityCoefficient.value(read), curvature = curvatureCoefficient.value(read), least = word === "gravel" ? 4 : 6;
  return [[uniformity, curvature, uniformity >= least && curvature >= 1 && curvature <= 3 ? "well graded" : "poorly graded"]];
}
