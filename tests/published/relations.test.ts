import { evaluate, numbers } from "../../src/formula/world";
import type { Formula } from "../../src/formula/parse";
import { write } from "../../src/formula/write";
import { allRelations, solved } from "../relations-of-all-rooms";
import { figures, tolerance, type Figure } from "./relation-figures";

const valueOf = (formula: Formula, { inputs }: Figure): number => evaluate(formula, numbers, (name) => inputs[name]!);
const holds = (formula: Formula, figure: Figure): boolean => Math.abs(valueOf(formula, figure) - Number(figure.says)) <= tolerance(figure);

test.each(figures.map((figure) => [`${figure.relation.gives} = ${figure.says}: ${figure.source}`, figure] as const))("%s", (_, figure) => {
  expect(Math.abs(valueOf(figure.relation.formula, figure) - Number(figure.says))).toBeLessThanOrEqual(tolerance(figure));
});

const OTHER = { "+": "-", "-": "+", "*": "/", "/": "*", "^": "*" } as const;

/** Every way of spoiling a formula a little: a constant off by one percent or with its sign lost, an operation swapped, operands swapped or dropped. */
function* spoilings(formula: Formula): Generator<Formula> {
  switch (formula.op) {
    case "name": return;
    case "number":
      yield { ...formula, value: formula.value * 1.01 };
      yield { ...formula, value: -formula.value };
      return;
    case "call":
      yield formula.of;
      yield { ...formula, name: formula.name === "exp" ? "log10" : "exp" };
      for (const of of spoilings(formula.of)) yield { ...formula, of };
      return;
    default:
      yield { ...formula, op: OTHER[formula.op] };
      yield { ...formula, left: formula.right, right: formula.left };
      yield formula.left;
      yield formula.right;
      for (const left of spoilings(formula.left)) yield { ...formula, left };
      for (const right of spoilings(formula.right)) yield { ...formula, right };
  }
}

const written = allRelations.filter(([name]) => !(name in solved));

describe.each(written)("%s", (name, relation) => {
  const family = [relation, ...allRelations.filter(([other]) => solved[other] === name).map(([, other]) => other)];
  const own = figures.filter((figure) => figure.relation === relation);
  test("has a published or derived figure, and a source", () => {
    expect(figures.some((figure) => family.includes(figure.relation))).toBe(true);
    expect(relation.source.title.length).toBeGreaterThan(3);
  });
  test("no spoiled formula survives the figures", () => {
    // a spoiling that is the same function (factors swapped) is none
    const differs = (spoiled: Formula): boolean => own.some((figure) => Math.abs(valueOf(spoiled, figure) / valueOf(relation.formula, figure) - 1) > 1e-12 || !Number.isFinite(valueOf(spoiled, figure)));
    const alive = [...spoilings(relation.formula)].filter(differs).filter((spoiled) => own.every((figure) => holds(spoiled, figure)));
    expect(alive.map((spoiled) => write(spoiled, (leaf) => leaf, "plain"))).toEqual([]);
  });
});
