import type { Formula } from "./parse";

type Step = (inputs: readonly number[]) => number;

/** A plain function of positional inputs, built of closures: the content policy forbids generated code. */
export function compile(formula: Formula, order: readonly string[]): (...inputs: number[]) => number {
  function build(node: Formula): Step {
    switch (node.op) {
      case "number": {
        const { value } = node;
        return () => value;
      }
      case "name": {
        const place = order.indexOf(node.name);
        if (place < 0) throw new Error(`no input is called ${node.name}`);
        return (inputs) => inputs[place]!;
      }
      case "call": {
        const of = build(node.of);
        return node.name === "exp" ? (x) => Math.exp(of(x)) : (x) => Math.log10(of(x));
      }
      default: {
        const left = build(node.left), right = build(node.right);
        switch (node.op) {
          case "+": return (x) => left(x) + right(x);
          case "-": return (x) => left(x) - right(x);
          case "*": return (x) => left(x) * right(x);
          case "/": return (x) => left(x) / right(x);
          case "^": return (x) => left(x) ** right(x);
        }
      }
    }
  }
  const run = build(formula);
  return (...inputs) => run(inputs);
}
