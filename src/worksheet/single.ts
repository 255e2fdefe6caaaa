import type { QuantityId } from "../relations/quantities";
import { CellError, isLeftOut, isRange, refusal, type Block } from "./cell";
import { numberOf, type Reader } from "./readers";

type Cells = Block | null;

/** One value where a range would make no sense. */
export function single<T>(reader: Reader<T>, block: Cells): T | CellError | undefined {
  if (isLeftOut(block)) return reader.leftOut;
  return isRange(block!) ? refusal(`${reader.name}: give one cell, not a range.`) : reader.check?.(block!) ?? reader.read(block![0]![0]);
}

/** Several numbers of known quantities, one cell each, all of them needed; the first trouble in the order given. */
export function readAll<Id extends QuantityId>(blocks: Readonly<Record<Id, Cells>>): Record<Id, number> | CellError {
  const out = {} as Record<Id, number>;
  for (const id of Object.keys(blocks) as Id[]) {
    const reader = numberOf(id);
    if (isLeftOut(blocks[id])) return refusal(`give the ${reader.name}.`);
    const read = single(reader, blocks[id]);
    if (read instanceof CellError) return read;
    out[id] = read!;
  }
  return out;
}
