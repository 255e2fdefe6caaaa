import { CellError, type ErrorCode } from "../../worksheet/cell";
import type { PlainError } from "./messages";

const isPlainError = (value: object): value is PlainError => "tampsheetError" in value;

function walk(value: unknown, change: (value: object) => unknown): unknown {
  if (typeof value !== "object" || value === null) return value;
  const changed = change(value);
  if (changed !== value) return changed;
  if (Array.isArray(value)) return value.map((one) => walk(one, change));
  return Object.fromEntries(Object.entries(value).map(([key, one]) => [key, walk(one, change)]));
}

/** Structured cloning keeps data but no class: an error in a cell is made plain before it crosses, and whole again after. */
export const pack = (value: unknown): unknown => walk(value, (one) => one instanceof CellError ? { tampsheetError: one.code, says: one.says } satisfies PlainError : one);
export const unpack = (value: unknown): unknown => walk(value, (one) => isPlainError(one) ? new CellError(one.tampsheetError as ErrorCode, one.says) : one);
