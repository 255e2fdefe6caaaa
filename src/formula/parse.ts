/** A formula as a tree. The text it was read from is the only home of the relation. */
export type Formula =
  | { readonly op: "number"; readonly value: number }
  | { readonly op: "name"; readonly name: string }
  | { readonly op: "call"; readonly name: Call; readonly of: Formula }
  | { readonly op: Operator; readonly left: Formula; readonly right: Formula };

/** Functions of one number that a formula may use; the type of names (names.ts) passes them over. */
export const calls = ["log10", "exp"] as const;
export type Call = (typeof calls)[number];

export type Operator = "+" | "-" | "*" | "/" | "^";

const BINDING: Readonly<Record<Operator, number>> = { "+": 1, "-": 1, "*": 2, "/": 2, "^": 3 };
const TOKEN = /\d+\.?\d*(?:e[+-]?\d+)?|[A-Za-z]\w*|\S/g;

const isOperator = (token: string | undefined): token is Operator => token !== undefined && token in BINDING;

/**
 * Reads a formula text of `+ - * / ^`, brackets, numbers, names, log10(…) and exp(…).
 * @throws SyntaxError naming the token that does not fit; a formula text is a programmer's, never a user's.
 */
export function parse(text: string): Formula {
  const tokens = text.match(TOKEN) ?? [];
  let at = 0;

  function fail(what: string): never {
    throw new SyntaxError(`${what} at token ${at + 1} of "${text}"`);
  }

  function operand(): Formula {
    const token = tokens[at++];
    if (token === undefined) fail("unexpected end");
    if (token === "(") {
      const inner = expression(0);
      if (tokens[at++] !== ")") fail("missing )");
      return inner;
    }
    if (/^\d/.test(token)) return { op: "number", value: Number(token) };
    const call = calls.find((name) => name === token);
    if (call) {
      if (tokens[at++] !== "(") fail(`${call} needs a bracket`);
      const of = expression(0);
      if (tokens[at++] !== ")") fail("missing )");
      return { op: "call", name: call, of };
    }
    if (/^[A-Za-z]/.test(token)) return { op: "name", name: token };
    return fail(`unexpected ${token}`);
  }

  function expression(floor: number): Formula {
    let left = operand();
    for (;;) {
      const token = tokens[at];
      if (!isOperator(token) || BINDING[token] <= floor) return left;
      at++;
      left = { op: token, left, right: expression(token === "^" ? BINDING[token] - 1 : BINDING[token]) };
    }
  }

  const tree = expression(0);
  if (at < tokens.length) fail(`unexpected ${tokens[at]}`);
  return tree;
}

/** Every name in the formula, in the order in which they first stand in it. */
export function namesIn(formula: Formula): string[] {
  switch (formula.op) {
    case "number": return [];
    case "name": return [formula.name];
    case "call": return namesIn(formula.of);
    default: return [...new Set([...namesIn(formula.left), ...namesIn(formula.right)])];
  }
}
