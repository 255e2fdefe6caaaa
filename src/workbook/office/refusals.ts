import { refused } from "../consent";
import type { Area, Done, Why } from "../port";

/** What the host's own error codes mean for a request; a code that is not here is the host failing, and is thrown on. */
const MEANING: Readonly<Record<string, readonly [Why, string]>> = {
  AccessDenied: ["protected", "The host does not allow this here: the sheet or workbook is protected, or open for reading only."],
  ItemNotFound: ["gone", "The sheet or the cells are no longer there."],
  InvalidArgument: ["unsupported", "The host did not take this change. Is a cell being edited, or does it lie in an array formula?"],
  InvalidOperation: ["unsupported", "The host cannot do this at the moment. Finish editing the cell and try again."],
  InvalidOperationInCellEditMode: ["unsupported", "A cell is being edited. Finish it and try again."],
  InsertDeleteConflict: ["table", "A table or an array formula is in the way."],
  RequestAborted: ["unsupported", "The host gave the request up. Try again."],
  RangeExceedsLimit: ["too-large", "That is more cells than the host hands over at once: select fewer."],
  ResponsePayloadSizeLimitExceeded: ["too-large", "That is more than the host hands over at once: select fewer cells."],
};

/** A refusal for a host error that is one; anything else is thrown with words that a person can read. */
export function refusalOf(error: unknown, where: readonly Area[]): Done<never> {
  const { code, message } = error as { code?: unknown; message?: unknown };
  const meaning = typeof code === "string" ? MEANING[code] : undefined;
  if (meaning) return refused(meaning[0], where, meaning[1]);
  throw error instanceof Error ? new Error(`The spreadsheet host failed: ${String(message)}`, { cause: error }) : error;
}
