import type { Api, Injector, Library } from "./library";
import type { Messages } from "./messages";

/** The calculation engine in a page, as the workbook port sees it. */
export interface PageEngine {
  readonly api: Api;
  readonly injector: Injector;
  readonly library: Library;
  /** why cells show errors */
  readonly messages: Messages;
  /** a number as its format shows it */
  shown(format: string, value: number): string;
}
