/** What the office host gives a functions bundle, as much of it as one uses: a registry, and errors that carry a message. */
export interface ParameterMetadata { readonly name: string; readonly description?: string; readonly type?: string; readonly dimensionality?: string; readonly optional?: boolean; readonly repeating?: boolean }
export interface FunctionMetadata { readonly id: string; readonly name: string; readonly description: string; readonly parameters: readonly ParameterMetadata[] }
export interface FunctionsMetadata { readonly functions: readonly FunctionMetadata[] }

export const ErrorCode = {
  invalidValue: "#VALUE!", notAvailable: "#N/A", invalidNumber: "#NUM!", divisionByZero: "#DIV/0!", invalidName: "#NAME?", nullReference: "#NULL!", invalidReference: "#REF!",
} as const;

/** An error as a function throws it, returns it in a cell, or is handed it. */
export class FunctionError extends Error {
  override readonly name = "FunctionError";
  constructor(readonly code: string, message?: string) { super(message ?? ""); }
}

export type WorksheetFunction = (...args: unknown[]) => unknown;

export interface Runtime {
  readonly registry: ReadonlyMap<string, WorksheetFunction>;
  /** the global that a functions bundle expects */
  readonly CustomFunctions: { readonly Error: typeof FunctionError; readonly ErrorCode: typeof ErrorCode; associate(id: string, fn: WorksheetFunction): void };
}

export function createRuntime(): Runtime {
  const registry = new Map<string, WorksheetFunction>();
  return { registry, CustomFunctions: { Error: FunctionError, ErrorCode, associate: (id, fn) => void registry.set(id.toUpperCase(), fn) } };
}
