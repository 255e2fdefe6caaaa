import { CellError, refusal, type Block, type Cell, type ErrorCode } from "../src/worksheet/cell";

const HOST_CODE = {
  "#VALUE!": "invalidValue", "#N/A": "notAvailable", "#NUM!": "invalidNumber", "#DIV/0!": "divisionByZero",
  "#REF!": "invalidReference", "#NAME?": "invalidName", "#NULL!": "nullReference", "#SPILL!": "invalidValue", "#CALC!": "invalidValue",
} as const satisfies Record<ErrorCode, string>;

const toHost = (error: CellError): CustomFunctions.Error => new CustomFunctions.Error(CustomFunctions.ErrorCode[HOST_CODE[error.code]], error.says);

/** An error value that the host put in a cell, seen as ours; everything else as it is. The only objects among a cell's values are errors, whatever class a host gives them. */
function fromHost(value: unknown): unknown {
  if (typeof value !== "object" || value === null) return value;
  const { code, message } = value as { code?: unknown; message?: unknown };
  return new CellError(codeOf(code), typeof message === "string" ? message : "");
}

const codeOf = (code: unknown): ErrorCode => {
  for (const [ours, theirs] of Object.entries(HOST_CODE)) if (code === CustomFunctions.ErrorCode[theirs] || code === ours) return ours as ErrorCode;
  return "#VALUE!";
};

/** What a host handed over for one argument: a matrix, a lone value, or nothing. */
export function cells(given: unknown): Block | null {
  if (given === null || given === undefined) return null;
  const block = Array.isArray(given) ? given as unknown[][] : [[given]];
  let error = false;
  for (const row of block) for (const value of row) if (typeof value === "object" && value !== null) error = true;
  return error ? block.map((row) => row.map(fromHost)) : block;
}

/** The last net: figures so large that their arithmetic overflows. */
const NO_ANSWER = refusal("no answer can be had from these values.");

/** The one seam between our cells and the host's: errors become the host's own, a blank is the empty text (null would show as 0). */
export function reply(answer: () => Cell[][] | CellError): any[][] {
  const result = answer();
  if (result instanceof CellError) throw toHost(result);
  return result.map((row) => row.map((cell) => cell instanceof CellError ? toHost(cell) : typeof cell === "number" && !Number.isFinite(cell) ? toHost(NO_ANSWER) : cell ?? ""));
}
