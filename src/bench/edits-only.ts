import type { Api } from "../engine/library";

/**
 * Commands of the engine that change more than what cells hold. Saving patches cells into the user's own file,
 * so what cannot be saved is not offered: it is refused with a word on where to do it. Widths and heights may change:
 * they are for looking, and a workbook loses nothing where they are not saved.
 */
const STRUCTURE = /^sheet\.command\.(?:insert-(?!defined)|remove-(?!defined)|delete-(?!defined|conditional|note)|move-(?:rows|cols|range)|copy-sheet|append-row|reorder-range|split-text|set-worksheet-(?!activate|permission|protection|col-width)|set-(?:rows|col|selected|specific)[a-z-]*(?:hidden|visible)|set-tab-color|add-worksheet|set-frozen|cancel-frozen)/;
const FORMAT = /^(?:sheet\.command\.(?:set-(?:style|bold|italic|underline|stroke|overline|font|text|background|border|vertical|horizontal|range-custom)|reset-|numfmt|clear-selection-(?:all|format)|toggle-gridlines|set-gridlines|set-once-format|apply-format)|sheet\.command\.numfmt)/;

/** Why a command is not offered, or undefined where it is. */
export const refusalOfCommand = (id: string): string | undefined =>
  STRUCTURE.test(id) ? "Rows, columns and sheets are added, removed and hidden in your own spreadsheet program." : FORMAT.test(id) ? "Formats are set in your own spreadsheet program." : undefined;

/** Refuses such commands while `loading` is false; `tell` says so. */
export function editsOnly(api: Api, tell: (says: string) => void, loading: () => boolean): void {
  api.addEvent(api.Event.BeforeCommandExecute, (event) => {
    if (loading()) return;
    const why = refusalOfCommand(event.id);
    if (!why) return;
    event.cancel = true;
    tell(`The bench edits what cells hold. ${why}`);
  });
}
