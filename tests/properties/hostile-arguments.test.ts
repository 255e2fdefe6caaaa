import fc from "fast-check";
import { HostError, metadata, shippedFunctions } from "../support/host-runtime";

const { call } = shippedFunctions();
const { functions } = metadata();

const hostile = fc.oneof(
  fc.double(), fc.integer({ min: -5, max: 300 }), fc.double({ min: 0, max: 40, noNaN: true }), fc.double({ min: 1.2, max: 2.8, noNaN: true }),
  fc.constantFrom<unknown>(null, undefined, "", " ", "12", "12,5", "12.5 %", "n/a", true, false, NaN, Infinity, -0, 1e308, 5e-324, "kN/m3", "Mg/m3", "cubic", "top three", "auto", "us", "__proto__", "constructor"),
  fc.constant(new HostError("#DIV/0!")), fc.constant(new HostError("#N/A", "from elsewhere")),
);
const argument = fc.oneof(hostile, fc.constant(null),
  fc.array(hostile, { minLength: 1, maxLength: 7 }).map((values) => values.map((value) => [value])),
  fc.array(hostile, { minLength: 1, maxLength: 7 }).map((values) => [values]),
  fc.array(fc.double({ min: 5, max: 25, noNaN: true }), { minLength: 3, maxLength: 7 }).map((values) => values.map((value) => [value])),
);

function judge(value: unknown, where: string): "answer" | "error" {
  if (value instanceof HostError) {
    // a host's own error passes through as it came; ours always say something
    if (["#VALUE!", "#N/A"].includes(value.code) && value.message !== "from elsewhere") expect([where, value.message.length > 10]).toEqual([where, true]);
    expect(value.message).not.toMatch(/undefined|\[object/);
    return "error";
  }
  if (typeof value === "number") expect([where, Number.isFinite(value)]).toEqual([where, true]);
  else expect([where, ["string", "boolean"].includes(typeof value)]).toEqual([where, true]);
  return "answer";
}

test.each(functions.map((fn) => [fn.id, fn] as const))("%s never gives NaN, Infinity, or an error without a message", (id, fn) => {
  const met = { answer: 0, error: 0, refused: 0 };
  fc.assert(fc.property(fc.tuple(...fn.parameters.map(() => argument)), (args) => {
    try {
      for (const row of call(id, ...args)) for (const value of row) met[judge(value, id)]++;
    } catch (error) {
      expect([id, error instanceof HostError || String((error as Error).stack)]).toEqual([id, true]);
      judge(error, id);
      met.refused++;
    }
  }), { numRuns: 800, seed: 99 });
  expect(met.error + met.refused).toBeGreaterThan(100);
});
