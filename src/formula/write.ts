import type { Formula, Operator } from "./parse";

const BINDING: Readonly<Record<Operator, number>> = { "+": 1, "-": 1, "*": 2, "/": 2, "^": 3 };
const SIGN: Readonly<Record<Operator, string>> = { "+": "+", "-": "−", "*": "×", "/": "÷", "^": "^" };

/**
 * The formula as text, brackets only where they are needed. The leaf writer decides what a name becomes:
 * itself, its symbol, or the number of a cell. `signs` chooses between signs for people and signs that parse again.
 */
export function write(formula: Formula, leaf: (name: string) => string, signs: "printed" | "plain" = "printed"): string {
  function go(node: Formula, floor: number): string {
    switch (node.op) {
      case "number": return String(node.value);
      case "name": return leaf(node.name);
      case "call": return `${node.name}(${go(node.of, 0)})`;
      default: {
        const own = BINDING[node.op];
        // a - (b - c) and a / (b / c) need their brackets on the right; (a ^ b) ^ c needs them on the left
        const left = go(node.left, node.op === "^" ? own + 0.5 : own);
        const right = go(node.right, node.op === "-" || node.op === "/" ? own + 0.5 : own);
        const text = `${left} ${signs === "printed" ? SIGN[node.op] : node.op} ${right}`;
        return own < floor ? `(${text})` : text;
      }
    }
  }
  return go(formula, 0);
}
