/**
 * Remembers the latest answers by their arguments' content, so that a result asked for by several cells is computed once.
 * Same arguments, same answer: there is nothing else an answer could depend on.
 */
export function once<Args extends readonly unknown[], Answer>(compute: (...args: Args) => Answer, limit = 64): (...args: Args) => Answer {
  const answers = new Map<string, Answer>();
  return (...args) => {
    // numbers that JSON writes alike (−0, NaN) are told apart by name
    const key = JSON.stringify(args, (_, value: unknown) => typeof value === "number" && (!Number.isFinite(value) || Object.is(value, -0)) ? `number ${Object.is(value, -0) ? "-0" : value}` : value === undefined ? "nothing" : value);
    const known = answers.get(key);
    if (known !== undefined) {
      // the oldest entry is the first of the map: what is asked for again goes to the end
      answers.delete(key);
      answers.set(key, known);
      return known;
    }
    const answer = compute(...args);
    answers.set(key, answer);
    if (answers.size > limit) answers.delete(answers.keys().next().value!);
    return answer;
  };
}
