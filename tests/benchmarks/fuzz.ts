/**
 * Hostile argument lists for every shipped function: npm run fuzz -- --calls 1000000 --seed 1.
 * No answer may be NaN or infinite, and no error without words. A failing call is printed so that it can be made a test.
 */
import { seeded, type Random } from "../../src/numerics/random";
import { HostError, metadata, shippedFunctions } from "../support/host-runtime";

const option = (name: string, usual: number): number => {
  const at = process.argv.indexOf(`--${name}`);
  return at < 0 ? usual : Number(process.argv[at + 1]);
};
const calls = option("calls", 1_000_000), seed = option("seed", 1);
const { call } = shippedFunctions(), { functions } = metadata();
const random = seeded(seed);

const pick = <T>(from: readonly T[], { uniform }: Random): T => from[Math.floor(uniform() * from.length)]!;
const ODD: readonly unknown[] = [
  null, undefined, "", " ", "12", "12,5", "12.5 %", "n/a", "Soil", true, false, NaN, Infinity, -Infinity, -0, 0, 1e308, -1e308, 5e-324, 1e-9, "kN/m3", "Mg/m3", "lb/ft3", "SI", "us", "cubic", "auto", "saturation", "smooth", "top three", "quartic",
  "RC >= 95; gap -2..+2", "air <= 10; round 0.1", "percent", "gravel", "dry", "nearest", "__proto__", "constructor", "x".repeat(300), new HostError("#DIV/0!"), new HostError("#N/A", "from elsewhere"),
];
function value(kind: number): unknown {
  const u = random.uniform();
  switch (kind) {
    case 0: return pick(ODD, random);
    case 1: return 5 + 20 * u;
    case 2: return 1.3 + u;
    case 3: return 100 * u;
    case 4: return Math.round(10 * u);
    case 5: return (u - 0.5) * 10 ** (20 * random.uniform() - 10);
    default: return 2.5 + 0.4 * u;
  }
}
/** A lone value, a column or a row: mostly of one sort, with an odd one among them now and then. */
function argument(length: number): unknown {
  const u = random.uniform(), sort = Math.floor(random.uniform() * 7);
  const one = (): unknown => value(random.uniform() < 0.06 ? 0 : sort);
  if (u < 0.12) return null;
  if (u < 0.45) return one();
  const n = random.uniform() < 0.85 ? length : 1 + Math.floor(7 * random.uniform());
  if (u < 0.9) return Array.from({ length: n }, () => [one()]);
  return u < 0.96 ? [Array.from({ length: n }, one)] : Array.from({ length: n }, () => [one(), one(), one()]);
}

/** What is wrong with an answer; undefined where nothing is. */
function wrong(answer: unknown, fed: boolean): string | undefined {
  if (answer instanceof HostError) {
    if (!["#VALUE!", "#N/A"].includes(answer.code) || answer.message === "from elsewhere") return undefined;
    return answer.message.length <= 10 ? `an error without words: "${answer.message}"` : (/undefined|\[object/.test(answer.message) || (!fed && /\bNaN\b|\bInfinity\b/.test(answer.message))) ? `an error that says "${answer.message}"` : undefined;
  }
  if (typeof answer === "number") return Number.isFinite(answer) ? undefined : `the number ${answer}`;
  if (typeof answer === "string") return /undefined|\[object/.test(answer) || (!fed && /\bNaN\b|\bInfinity\b/.test(answer)) ? `the text "${answer}"` : undefined;
  return typeof answer === "boolean" ? undefined : `a ${typeof answer}`;
}

let failures = 0, answers = 0, errors = 0;
const start = Date.now();
for (let i = 0; i < calls && failures < 20; i++) {
  const fn = functions[i % functions.length]!, length = 1 + Math.floor(8 * random.uniform()), args = fn.parameters.map(() => argument(length));
  // a message may repeat what it was fed
  const fed = args.flat(2).some((one) => typeof one === "number" && !Number.isFinite(one));
  let trouble: string | undefined;
  try {
    for (const row of call(fn.id, ...args)) for (const cell of row) {
      trouble ??= wrong(cell, fed);
      if (cell instanceof HostError) errors++; else answers++;
    }
  } catch (error) {
    errors++;
    trouble = error instanceof HostError ? wrong(error, fed) : `it threw ${String((error as Error).stack).slice(0, 400)}`;
  }
  if (!trouble) continue;
  failures++;
  console.log(`${fn.id}: ${trouble}\n  ${JSON.stringify(args, (_, one: unknown) => one instanceof HostError ? `error ${one.code}` : typeof one === "number" && !Number.isFinite(one) ? String(one) : one === undefined ? "nothing" : one)}`);
}
console.log(`${calls} calls, seed ${seed}: ${answers} answers, ${errors} errors with words, ${failures} failures, ${Math.round((Date.now() - start) / 1000)} s.`);
process.exit(failures > 0 ? 1 : 0);
