import { refusalOfCommand } from "../../src/bench/edits-only";

// command names as the engine (Univer 0.25.1) has them
test.each(["insert-row", "insert-col-before", "insert-multi-rows-above", "remove-row", "remove-col-by-range", "delete-range-move-up", "insert-range-move-down", "move-rows", "move-cols", "move-range", "insert-sheet", "copy-sheet", "remove-sheet", "set-worksheet-name", "set-worksheet-order", "set-worksheet-hidden", "set-worksheet-show", "set-rows-hidden", "set-col-hidden", "set-selected-rows-visible", "set-tab-color", "add-worksheet-merge-all", "remove-worksheet-merge", "set-frozen", "reorder-range", "split-text-to-columns"])(
  "%s changes the structure and is refused", (name) => expect(refusalOfCommand(`sheet.command.${name}`)).toMatch(/^Rows, columns and sheets/));
test.each(["set-style", "set-bold", "set-background-color", "set-border", "set-text-wrap", "reset-text-color", "clear-selection-format", "numfmt.set.numfmt", "set-horizontal-text-align"])(
  "%s sets a format and is refused", (name) => expect(refusalOfCommand(`sheet.command.${name}`)).toMatch(/^Formats are set/));
test.each(["set-range-values", "clear-selection-content", "auto-fill", "copy-down", "set-worksheet-activate", "delta-column-width", "delta-row-height", "set-worksheet-col-width", "set-row-height", "select-range", "insert-defined-name", "delete-conditional-rule", "delete-note"])(
  "%s is offered", (name) => expect(refusalOfCommand(`sheet.command.${name}`)).toBeUndefined());
test.each(["univer.command.undo", "univer.command.copy", "univer.command.paste", "sheet.operation.set-selections", "sheet.mutation.set-range-values"])("%s is no business of this", (id) => expect(refusalOfCommand(id)).toBeUndefined());
