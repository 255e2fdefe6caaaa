import { namesIn, type Formula, type Operator } from "./parse";

/** How often a name stands in a formula. */
function count(formula: Formula, name: string): number {
  switch (formula.op) {
    case "number": return 0;
    case "name": return formula.name === name ? 1 : 0;
    case "call": return count(formula.of, name);
    default: return count(formula.left, name) + count(formula.right, name);
  }
}

/**
 * Solves `formula = result` for a name that stands in the formula once, by undoing one operation at a time.
 * The wet density from the dry-density relation and the least specific gravity from the zero-air-voids line are had this way,
 * so that the same fact is never written twice.
 * @throws Error where the name stands more than once, or inside a power.
 */
export function solveFor(formula: Formula, name: string, result: string): Formula {
  if (count(formula, name) !== 1) throw new Error(`${name} must stand exactly once among ${namesIn(formula).join(", ")}`);
  const node = (op: Operator, left: Formula, right: Formula): Formula => ({ op, left, right });
  let inside = formula;
  let answer: Formula = { op: "name", name: result };
  while (inside.op !== "name") {
    if (inside.op === "number" || inside.op === "^" || inside.op === "call") throw new Error(`cannot solve through ${inside.op}`);
    const onLeft = count(inside.left, name) === 1;
    const other = onLeft ? inside.right : inside.left;
    switch (inside.op) {
      case "+": answer = node("-", answer, other); break;
      case "*": answer = node("/", answer, other); break;
      case "-": answer = onLeft ? node("+", answer, other) : node("-", other, answer); break;
      case "/": answer = onLeft ? node("*", answer, other) : node("/", other, answer); break;
    }
    inside = onLeft ? inside.left : inside.right;
  }
  return answer;
}
