/** The error codes a worksheet cell can show. */
export type ErrorCode = "#VALUE!" | "#N/A" | "#NUM!" | "#DIV/0!" | "#REF!" | "#NAME?" | "#NULL!" | "#SPILL!" | "#CALC!";

/**
 * What a cell shows instead of a value. It is returned, never thrown: a bad row keeps its error in its own cell.
 * The hosts show `says` for #VALUE! and #N/A only, so our own errors use no other code.
 */
export class CellError {
  constructor(readonly code: ErrorCode, readonly says: string) {}
}

export const refusal = (says: string): CellError => new CellError("#VALUE!", says);
export const notEnough = (says: string): CellError => new CellError("#N/A", says);

export type Cell = number | string | boolean | null | CellError;

/** A range as a host hands it over: rows of numbers, texts, booleans, blanks and errors. */
export type Block = readonly (readonly unknown[])[];

export const isBlank = (value: unknown): boolean => value === null || value === undefined || value === "";

/** An argument that was not given at all, or points to one blank cell. */
export const isLeftOut = (block: Block | null | undefined): boolean =>
  block === null || block === undefined || (block.length <= 1 && (block[0]?.length ?? 0) <= 1 && isBlank(block[0]?.[0]));

export const rowsOf = (block: Block): number => block.length;
export const columnsOf = (block: Block): number => block[0]?.length ?? 0;
export const isRange = (block: Block): boolean => rowsOf(block) * columnsOf(block) > 1;

/** A row of headings: every cell a text, none with a digit in it. */
export const isHeading = (values: readonly unknown[]): boolean =>
  values.length > 0 && values.every((value) => typeof value === "string" && value !== "" && !/\d/.test(value));

/** A user's text inside a message, cut to a length that a tooltip can show. */
export const quoted = (value: unknown): string => {
  const text = String(value);
  return `"${text.length > 24 ? `${text.slice(0, 23)}…` : text}"`;
};
