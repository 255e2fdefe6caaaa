import { numberOf, waterDensity, type Reader } from "./readers";
import { quantity, type QuantityId } from "../relations/quantities";
import type { Relation } from "../relations/relation";
import { refusal, type Block, type Cell, type CellError } from "./cell";
import { argument, column } from "./column";
import { unitGuard } from "./unit-guard";

const readerOf = (id: QuantityId): Reader<number> => id === "waterDensity" ? waterDensity : numberOf(id);

export interface Limits {
  /** said where the relation gives a negative or unbounded result: what about the inputs cannot be */
  readonly impossible?: string;
  /** a check on one row's numbers before the relation is used */
  readonly guard?: (values: Readonly<Record<string, number>>) => CellError | undefined;
}

/**
 * Fills a column from a relation. The arguments are named by quantity, in the order of the worksheet function,
 * which is the order in which a row's troubles are told.
 */
export function relationColumn<In extends QuantityId>(
  relation: Relation<QuantityId, In>, blocks: Readonly<Record<In, Block | null | undefined>>, { impossible, guard }: Limits = {},
): Cell[][] | CellError {
  const order = Object.keys(blocks) as In[];
  const compute = relation.by(...order);
  const water = order.indexOf("waterDensity" as In);
  // beside a density of water, every other density must be a soil's in the same unit
  const soils = water < 0 ? [] : order.flatMap((id, i) => id !== "waterDensity" && quantity(id).kind === "density" ? [i] : []);
  return column<number[]>(order.map((id) => argument(readerOf(id), blocks[id])), (...values) => {
    let trouble: CellError | undefined;
    for (const i of soils) trouble ??= unitGuard(values[i]!, values[water]!);
    trouble ??= guard?.(Object.fromEntries(order.map((id, i) => [id, values[i]!])));
    if (trouble) return trouble;
    const result = compute(...values);
    return impossible !== undefined && !(result >= 0 && result < Infinity) ? refusal(impossible) : result;
  });
}
