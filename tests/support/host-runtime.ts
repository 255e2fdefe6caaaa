import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import vm from "node:vm";

/** The office host's error object, as much of it as a function can see. */
export class HostError extends Error {
  constructor(readonly code: string, message?: string) { super(message ?? ""); }
}

export const ErrorCode = {
  invalidValue: "#VALUE!", notAvailable: "#N/A", invalidNumber: "#NUM!", divisionByZero: "#DIV/0!",
  invalidName: "#NAME?", nullReference: "#NULL!", invalidReference: "#REF!",
} as const;

export interface FunctionMetadata {
  readonly id: string;
  readonly name: string;
  readonly description: string;
  readonly parameters: readonly { readonly name: string; readonly description?: string; readonly type?: string; readonly dimensionality?: string; readonly optional?: boolean }[];
  readonly result: { readonly type?: string; readonly dimensionality?: string };
}

export interface Metadata { readonly functions: readonly FunctionMetadata[]; readonly allowErrorForDataTypeAny?: boolean; readonly allowCustomDataForDataTypeAny?: boolean }

const dist = path.join(__dirname, "../../dist");

/** A file that `npm run build` makes; without it the test cannot mean anything, so it fails loudly. */
export function built(name: string): Buffer {
  const file = path.join(dist, name);
  if (!existsSync(file)) throw new Error(`dist/${name} is missing: run npm run build first`);
  return readFileSync(file);
}

export const metadata = (): Metadata => JSON.parse(built("functions.json").toString("utf8")) as Metadata;

type Fn = (...args: unknown[]) => unknown[][];

/** The shipped bundle, loaded as a host loads it. A function is called with plain values; lone ones become 1 × 1 matrices as in a host. */
export function shippedFunctions(): { call: (name: string, ...args: unknown[]) => unknown[][]; names: string[] } {
  const registry = new Map<string, Fn>();
  const CustomFunctions = { Error: HostError, ErrorCode, associate: (id: string, fn: Fn) => void registry.set(id, fn) };
  vm.runInNewContext(built("functions.js").toString("utf8"), { CustomFunctions, console });
  return {
    names: [...registry.keys()],
    call(name, ...args) {
      const fn = registry.get(name);
      if (!fn) throw new Error(`the bundle has no function ${name}`);
      return fn(...args.map((arg) => arg === undefined || arg === null ? null : Array.isArray(arg) ? arg : [[arg]]));
    },
  };
}
