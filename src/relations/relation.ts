import { compile } from "../formula/compile";
import type { Names } from "../formula/names";
import { namesIn, parse, type Formula } from "../formula/parse";
import { solveFor } from "../formula/solve";
import { evaluate, numbers } from "../formula/world";
import type { QuantityId } from "./quantities";

/** Where a relation stands in print. */
export interface Source { readonly title: string; readonly clause?: string }

export type Inputs<In extends QuantityId, T> = Readonly<Record<In, T>>;

/** One fact of the trade: a formula text, the quantity it gives, and its source. Everything else is read off the text. */
export interface Relation<Out extends QuantityId, In extends QuantityId> {
  readonly gives: Out;
  /** the inputs in the order in which they first stand in the text */
  readonly from: readonly In[];
  readonly formula: Formula;
  readonly source: Source;
  value(inputs: Inputs<In, number>): number;
  /** the same as a plain function of positional inputs in the order asked for, for columns and inner loops */
  by(...order: readonly In[]): (...inputs: number[]) => number;
  /** the same fact solved for one of its inputs */
  solvedFor<To extends In>(wanted: To): Relation<To, Exclude<In, To> | Out>;
}

/** A misspelt quantity in a formula text is a compile error that shows the wrong word. */
type Checked<Text extends string> = Names<Text> extends QuantityId ? unknown : { noSuchQuantity: Exclude<Names<Text>, QuantityId> };

export function relation<Out extends QuantityId, const Text extends string>(
  gives: Out, text: Text & Checked<Text>, source: Source,
): Relation<Out, Names<Text> & QuantityId> {
  return fromFormula(gives, parse(text), source);
}

function fromFormula<Out extends QuantityId, In extends QuantityId>(gives: Out, formula: Formula, source: Source): Relation<Out, In> {
  const from = namesIn(formula) as In[];
  return {
    gives, from, formula, source,
    value: (inputs) => evaluate(formula, numbers, (name) => inputs[name as In]),
    by: (...order) => compile(formula, order),
    solvedFor: (wanted) => fromFormula(wanted, solveFor(formula, wanted, gives), source),
  };
}
