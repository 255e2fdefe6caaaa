import { bankVolumeForFill } from "../earthwork/borrow";
import { bulkingOfSand, looseLift, shrinkOfBank, shrinkOfFill, swellOfBank, swellOfLoose } from "../earthwork/states";
import { waterNeedGallons, waterNeedLitres, waterToSpray } from "../earthwork/water";
import type { Block, Cell, CellError } from "./cell";
import { argument, column } from "./column";
import { numberOf, wordOf } from "./readers";
import { relationColumn } from "./relation-column";
import { systemGuard, systemWord } from "./systems";
import { sameUnitGuard } from "./unit-guard";

type Cells = Block | null;

const inputs = ["volume", "dryDensity", "waterContent", "targetWater"] as const;
const needs = { SI: waterNeedLitres.by(...inputs), US: waterNeedGallons.by(...inputs) };
const spray = waterToSpray.by("waterNeed", "loss");

/** Water to spray (with its loss) or, negative, to dry out (where there is none to lose). */
export const waterToAdd = (volume: Cells, dry: Cells, now: Cells, target: Cells, loss: Cells, system: Cells): Cell[][] | CellError =>
  column([
    argument(numberOf("volume"), volume), argument(numberOf("dryDensity"), dry), argument(numberOf("waterContent"), now),
    argument(numberOf("targetWater"), target), argument(numberOf("loss"), loss), argument(systemWord, system),
  ], (cubic, dryDensity, waterNow, wanted, lost, word) => {
    const trouble = systemGuard(dryDensity, word);
    if (trouble) return trouble;
    const water = needs[word](cubic, dryDensity, waterNow, wanted);
    return water > 0 ? spray(water, lost) : water;
  });

/** A fill is at most this many times denser or looser than its borrow; beyond, two units were mixed. Common practice, no published source. */
const FILL_OVER_BANK = { low: 0.4, high: 2.5 } as const;

export const bankVolumeColumn = (fillVolume: Cells, fillDry: Cells, bankDry: Cells, loss: Cells): Cell[][] | CellError =>
  relationColumn(bankVolumeForFill, { fillVolume, fillDryDensity: fillDry, bankDryDensity: bankDry, loss }, {
    guard: ({ fillDryDensity, bankDryDensity }) => sameUnitGuard(fillDryDensity!, "dry density of the fill", bankDryDensity!, "dry density in the bank", FILL_OVER_BANK.low, FILL_OVER_BANK.high),
  });

const swells = { bank: swellOfBank.by("bankDryDensity", "looseDryDensity"), loose: swellOfLoose.by("bankDryDensity", "looseDryDensity") } as const;
const shrinks = { bank: shrinkOfBank.by("bankDryDensity", "fillDryDensity"), fill: shrinkOfFill.by("bankDryDensity", "fillDryDensity") } as const;

export const swellColumn = (bankDry: Cells, looseDry: Cells, basis: Cells): Cell[][] | CellError =>
  column([argument(numberOf("bankDryDensity"), bankDry), argument(numberOf("looseDryDensity"), looseDry), argument(wordOf("basis", ["bank", "loose"], "bank"), basis)],
    (bank, loose, word) => sameUnitGuard(bank, "dry density in the bank", loose, "loose dry density", FILL_OVER_BANK.low, FILL_OVER_BANK.high) ?? swells[word](bank, loose));

export const shrinkColumn = (bankDry: Cells, fillDry: Cells, basis: Cells): Cell[][] | CellError =>
  column([argument(numberOf("bankDryDensity"), bankDry), argument(numberOf("fillDryDensity"), fillDry), argument(wordOf("basis", ["bank", "fill"], "bank"), basis)],
    (bank, fill, word) => sameUnitGuard(bank, "dry density in the bank", fill, "dry density of the fill", FILL_OVER_BANK.low, FILL_OVER_BANK.high) ?? shrinks[word](bank, fill));

export const looseLiftColumn = (thickness: Cells, fillDry: Cells, looseDry: Cells): Cell[][] | CellError =>
  relationColumn(looseLift, { thickness, fillDryDensity: fillDry, looseDryDensity: looseDry }, {
    guard: ({ fillDryDensity, looseDryDensity }) => sameUnitGuard(fillDryDensity!, "dry density of the fill", looseDryDensity!, "loose dry density", FILL_OVER_BANK.low, FILL_OVER_BANK.high),
  });

export const bulkingColumn = (moistDry: Cells, looseDry: Cells): Cell[][] | CellError =>
  relationColumn(bulkingOfSand, { moistDryDensity: moistDry, looseDryDensity: looseDry }, {
    guard: ({ moistDryDensity, looseDryDensity }) => sameUnitGuard(moistDryDensity!, "dry density of the moist sand", looseDryDensity!, "loose dry density", FILL_OVER_BANK.low, FILL_OVER_BANK.high),
  });
