import type { Source } from "../relations/relation";

export const COMMON_PRACTICE = "common practice, no published source";

/** How a finding weighs. `impossible` breaks physics, `doubtful` weakens an answer, `ask` wants one more fact. */
export type Severity = "impossible" | "doubtful" | "ask";

/** Where a finding points: one point of a test (counted from 0), or the test as a whole. */
export type Place = { readonly at: "point"; readonly index: number } | { readonly at: "whole" };

type Evidence = Readonly<Record<string, number | string>>;

/** A finding is data; words come last. */
export interface Finding {
  readonly id: string;
  readonly place: Place;
  readonly severity: Severity;
  readonly evidence: Evidence;
  /** the finding in words, from its rule's one template */
  readonly says: string;
}

/** One kind of finding: what it looks at, where it comes from, and its words. One file each. */
export interface Rule<Subject> {
  readonly id: string;
  readonly source: Source | typeof COMMON_PRACTICE;
  /** a template with {placeholders} */
  readonly says: string;
  look(subject: Subject): Iterable<Finding>;
}

type Holes<Text extends string> = Text extends `${string}{${infer Hole}}${infer Rest}` ? Hole | Holes<Rest> : never;

/** Four figures are what a reader compares; counts and texts stand as they are. */
const shown = (value: number | string): string =>
  typeof value === "string" || Number.isInteger(value) ? String(value) : String(Number(value.toPrecision(4)));

/** Declares a rule. The compiler demands that every placeholder of the template is a number or text of the evidence. */
export function rule<Subject>() {
  return <E extends Evidence, const Text extends string>(declared: {
    readonly id: string;
    readonly source: Source | typeof COMMON_PRACTICE;
    readonly says: Text & (Holes<Text> extends keyof E ? unknown : { noSuchEvidence: Exclude<Holes<Text>, keyof E> });
    readonly look: (subject: Subject) => Iterable<{ readonly place: Place; readonly severity: Severity; readonly evidence: E }>;
  }): Rule<Subject> => ({
    id: declared.id,
    source: declared.source,
    says: declared.says,
    *look(subject) {
      for (const { place, severity, evidence } of declared.look(subject))
        yield { id: declared.id, place, severity, evidence, says: declared.says.replace(/\{(\w+)\}/g, (_, hole: string) => shown(evidence[hole]!)) };
    },
  });
}

const WEIGHT: Readonly<Record<Severity, number>> = { impossible: 0, doubtful: 1, ask: 2 };

/** All findings of a set of rules, the weightiest first, otherwise in the order of the rules. */
export function findAll<Subject>(rules: readonly Rule<Subject>[], subject: Subject): Finding[] {
  return rules.flatMap((one) => [...one.look(subject)]).sort((a, b) => WEIGHT[a.severity] - WEIGHT[b.severity]);
}
