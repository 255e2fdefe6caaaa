import { LocaleType, LogLevel, mergeLocales, Univer } from "@univerjs/core";
import { FUniver } from "@univerjs/core/facade";
import { UniverSheetsConditionalFormattingPreset } from "@univerjs/preset-sheets-conditional-formatting";
import formattingWords from "@univerjs/preset-sheets-conditional-formatting/locales/en-US";
import * as core from "@univerjs/preset-sheets-core";
import coreWords from "@univerjs/preset-sheets-core/locales/en-US";
import { UniverSheetsNotePreset } from "@univerjs/preset-sheets-note";
import noteWords from "@univerjs/preset-sheets-note/locales/en-US";
import { defaultTheme } from "@univerjs/themes";
import "@univerjs/preset-sheets-core/lib/index.css";
import "@univerjs/preset-sheets-note/lib/index.css";
import "@univerjs/preset-sheets-conditional-formatting/lib/index.css";
import type { FunctionsMetadata, Runtime } from "../engine/custom-functions";
import { engineFunctions } from "../engine/functions";
import type { Injector, Library } from "../engine/library";
import type { Messages } from "../engine/messages";
import type { PageEngine } from "../engine/page";

/** Starts the calculation engine, drawn into an element of the page. */
export function pageEngine(container: string, metadata: FunctionsMetadata, runtime: Runtime): PageEngine {
  const messages: Messages = new Map();
  const univer = new Univer({
    theme: defaultTheme,
    locale: LocaleType.EN_US,
    locales: { [LocaleType.EN_US]: mergeLocales(coreWords, noteWords, formattingWords) },
    logLevel: LogLevel.ERROR,
  });
  const library = core as unknown as Library;
  const presets = [
    core.UniverSheetsCorePreset({
      container,
      // the bench edits cells; formats and structure are left to the user's own spreadsheet, as saving patches cells only
      header: true, toolbar: false, contextMenu: false, formulaBar: true,
      footer: { sheetBar: true, statisticBar: true, menus: false, zoomSlider: true },
      formula: engineFunctions(library, metadata, "TAMP", runtime, messages),
    } as Parameters<typeof core.UniverSheetsCorePreset>[0]),
    UniverSheetsNotePreset(),
    UniverSheetsConditionalFormattingPreset(),
  ];
  // presets share plugins; each is registered once
  const plugins = new Map<string, Parameters<Univer["registerPlugin"]>>();
  for (const plugin of presets.flatMap((preset) => preset.plugins as unknown[])) {
    const [constructor, config] = (Array.isArray(plugin) ? plugin : [plugin]) as Parameters<Univer["registerPlugin"]>;
    plugins.set((constructor as unknown as { pluginName: string }).pluginName, [constructor, config]);
  }
  for (const [constructor, config] of plugins.values()) univer.registerPlugin(constructor, config);
  return {
    api: FUniver.newAPI(univer),
    injector: univer.__getInjector() as unknown as Injector,
    library,
    messages,
    shown: (format, value) => core.getPatternPreview(format, value).result,
  };
}
