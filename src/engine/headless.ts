import type * as Core from "@univerjs/core";
import type * as Facade from "@univerjs/core/facade";
import type * as NodePreset from "@univerjs/preset-sheets-node-core";
import { CellError, type Cell } from "../worksheet/cell";
import type { Book } from "../workbook/file/book";
import { CellReader, cellOf } from "./cells";
import type { FunctionsMetadata, Runtime } from "./custom-functions";
import { engineFunctions } from "./functions";
import type { Api, Injector } from "./library";
import { messageKey, type Messages } from "./messages";
import { registerNames, type TableService } from "./names";
import { sheetId, workbookData } from "./snapshot";

/** Node's own `require`: the engine's Node build is CommonJS that requires ES modules, which only Node itself can load. */
type Require = (name: string) => unknown;

const NO_CALCULATION_ON_LOAD = 2;
const PATIENCE_MS = 120_000;
const NAMESPACE = "TAMP";

export interface SheetResults {
  readonly sheet: string;
  /** every cell with a formula, and what it came to */
  readonly results: readonly { readonly row: number; readonly column: number; readonly value: Cell; readonly fills?: readonly (readonly Cell[])[] }[];
}

export interface HeadlessEngine {
  compute(book: Book): Promise<readonly SheetResults[]>;
  dispose(): void;
}

/** The calculation engine without a page, running the same functions bundle. */
export function headlessEngine(nodeRequire: Require, metadata: FunctionsMetadata, runtime: Runtime): HeadlessEngine {
  const { Univer, LogLevel, LocaleType } = nodeRequire("@univerjs/core") as typeof Core;
  const { FUniver } = nodeRequire("@univerjs/core/facade") as typeof Facade;
  const preset = nodeRequire("@univerjs/preset-sheets-node-core") as typeof NodePreset;

  const messages: Messages = new Map();
  const univer = new Univer({ logLevel: LogLevel.SILENT, locale: LocaleType.EN_US, locales: { [LocaleType.EN_US]: {} } });
  const formula = { ...engineFunctions(preset, metadata, NAMESPACE, runtime, messages), initialFormulaComputing: NO_CALCULATION_ON_LOAD };
  for (const plugin of preset.UniverSheetsNodeCorePreset({ formula } as Parameters<typeof preset.UniverSheetsNodeCorePreset>[0]).plugins) {
    if (Array.isArray(plugin)) univer.registerPlugin(plugin[0], plugin[1]); else univer.registerPlugin(plugin);
  }
  const api: Api = FUniver.newAPI(univer);
  const injector = univer.__getInjector() as unknown as Injector;
  let books = 0;

  return {
    async compute(book) {
      const id = `book-${books++}`;
      const workbook = api.createWorkbook(workbookData(book, id));
      registerNames(book, id, workbook, injector.get(preset.ISuperTableService) as TableService);
      messages.clear();
      const calculation = api.getFormula();
      calculation.executeCalculation();
      await calculation.onCalculationResultApplied(PATIENCE_MS);
      const reader = new CellReader(preset, injector, id);
      const found = book.sheets.map((sheet, index): SheetResults => {
        const worksheet = workbook.getSheetBySheetId(sheetId(index))!.getSheet();
        const spans = reader.spills(sheetId(index));
        const valueAt = (row: number, column: number): Cell => cellOf(reader.raw(worksheet, sheetId(index), row, column), messages.get(messageKey(sheetId(index), row, column)));
        const results = sheet.cells.filter((cell) => cell.formula !== undefined).map(({ row, column }) => {
          const span = spans.find((one) => one.startRow === row && one.startColumn === column && (one.endRow > row || one.endColumn > column));
          const value = valueAt(row, column);
          if (!span || value instanceof CellError && value.code === "#SPILL!") return { row, column, value };
          const fills = Array.from({ length: span.endRow - row + 1 }, (_, r) => Array.from({ length: span.endColumn - column + 1 }, (__, c) => valueAt(row + r, column + c)));
          return { row, column, value, fills };
        });
        return { sheet: sheet.name, results };
      });
      api.disposeUnit(id);
      return found;
    },
    dispose: () => univer.dispose(),
  };
}
