import type { Call, Formula, Operator } from "./parse";

/** What a formula can be read in: numbers, closed intervals, or a value with its slope. */
export interface World<T> {
  number(value: number): T;
  operate(op: Operator, left: T, right: T): T;
  call(name: Call, of: T): T;
}

export function evaluate<T>(formula: Formula, world: World<T>, valueOf: (name: string) => T): T {
  switch (formula.op) {
    case "number": return world.number(formula.value);
    case "name": return valueOf(formula.name);
    case "call": return world.call(formula.name, evaluate(formula.of, world, valueOf));
    default: return world.operate(formula.op, evaluate(formula.left, world, valueOf), evaluate(formula.right, world, valueOf));
  }
}

export const numbers: World<number> = {
  number: (value) => value,
  operate(op, left, right) {
    switch (op) {
      case "+": return left + right;
      case "-": return left - right;
      case "*": return left * right;
      case "/": return left / right;
      case "^": return left ** right;
    }
  },
  call: (name, of) => name === "exp" ? Math.exp(of) : Math.log10(of),
};

/** A value and its derivative with respect to one chosen input. */
export interface Slope<T> { readonly value: T; readonly slope: T }

/** Forward differentiation over any world. Exponents are constants in every relation of the trade met so far. */
export function slopes<T>(world: World<T>): World<Slope<T>> {
  const zero = world.number(0);
  const times = (a: T, b: T): T => world.operate("*", a, b);
  return {
    number: (value) => ({ value: world.number(value), slope: zero }),
    operate(op, left, right) {
      const value = world.operate(op, left.value, right.value);
      switch (op) {
        case "+":
        case "-": return { value, slope: world.operate(op, left.slope, right.slope) };
        case "*": return { value, slope: world.operate("+", times(left.slope, right.value), times(left.value, right.slope)) };
        case "/": return { value, slope: world.operate("/", world.operate("-", left.slope, times(value, right.slope)), right.value) };
        case "^": {
          const lower = world.operate("^", left.value, world.operate("-", right.value, world.number(1)));
          return { value, slope: times(times(right.value, lower), left.slope) };
        }
      }
    },
    call(name, of) {
      const value = world.call(name, of.value);
      return { value, slope: name === "exp" ? times(value, of.slope) : world.operate("/", of.slope, times(of.value, world.number(Math.LN10))) };
    },
  };
}
