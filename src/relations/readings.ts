import { rangeOver, type Interval } from "../formula/interval";
import type { Formula } from "../formula/parse";
import { evaluate, numbers, slopes } from "../formula/world";
import { write } from "../formula/write";
import { quantity, type QuantityId } from "./quantities";
import type { Inputs, Relation } from "./relation";

/*
 * Other readings of a relation's one text. They stand beside the relation, not in it, so that a bundle that only computes
 * does not carry them.
 */

/** The formula with plain signs; it parses again. */
export const textOf = ({ formula }: { readonly formula: Formula }): string => write(formula, (name) => name, "plain");

/** The range over rounding intervals: exact where every input that stands twice only rises or only falls over them, else somewhat wide. */
export const rangeOf = <In extends QuantityId>({ formula }: Relation<QuantityId, In>, box: Inputs<In, Interval>): Interval => rangeOver(formula, box);

const withSlopes = slopes(numbers);
/** The derivative with respect to one input. */
export const slopeOf = <In extends QuantityId>({ formula }: Relation<QuantityId, In>, of: In, at: Inputs<In, number>): number =>
  evaluate(formula, withSlopes, (name) => ({ value: at[name as In], slope: name === of ? 1 : 0 })).slope;

const symbolOf = (id: string): string => quantity(id as QuantityId).symbol;
/** Symbols, then the cell's own numbers in their place. */
export const workingOf = <In extends QuantityId>({ gives, formula }: Relation<QuantityId, In>, shown: Inputs<In, string>): string =>
  `${symbolOf(gives)} = ${write(formula, symbolOf)} = ${write(formula, (name) => shown[name as In])}`;
