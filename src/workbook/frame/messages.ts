import type { WorkbookPort } from "../port";

/** What crosses between the pane's frame and the page around it. */
export const HELLO = "tampsheet:pane-ready";
export const WELCOME = "tampsheet:workbook-port";

type Method = Exclude<keyof WorkbookPort, "on">;

/** Every method of the port but the subscription, which goes the other way. A method that is missing here does not compile. */
const METHODS: Readonly<Record<Method, true>> = {
  abilities: true, sheets: true, selection: true, read: true, write: true, mark: true, unmark: true, goTo: true, recall: true, remember: true,
};
export const isMethod = (name: unknown): name is Method => typeof name === "string" && Object.hasOwn(METHODS, name);
export const methods = Object.keys(METHODS) as Method[];

export interface Call { readonly call: number; readonly method: string; readonly args: readonly unknown[] }
export type Answer = { readonly call: number; readonly value: unknown } | { readonly call: number; readonly failed: string };
export interface Told { readonly event: "selection" | "change"; readonly area: unknown }

/** Cell errors lose their class in the crossing; these names bring it back. */
export interface PlainError { readonly tampsheetError: string; readonly says: string }
