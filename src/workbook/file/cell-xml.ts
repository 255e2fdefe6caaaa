import { escapeXml } from "./xml";

export type Result = number | string | boolean | null | { readonly error: string };

const space = (text: string): string => /^\s|\s$|[\n\t]/.test(text) ? ' xml:space="preserve"' : "";

/** A cell as XML. Its style and place are attributes already; a formula makes a text its result, without one it is the text itself. */
export function cellXml(reference: string, style: string | undefined, result: Result, formula?: { readonly xml: string; readonly metadata?: number | undefined }): string {
  const head = `<c r="${reference}"${style ? ` s="${style}"` : ""}`;
  const meta = formula?.metadata ? ` cm="${formula.metadata}"` : "", f = formula?.xml ?? "";
  if (result === null) return f ? `${head}${meta}>${f}</c>` : `${head}/>`;
  if (typeof result === "number") return `${head}${meta}>${f}<v>${result}</v></c>`;
  if (typeof result === "boolean") return `${head} t="b"${meta}>${f}<v>${Number(result)}</v></c>`;
  if (typeof result === "object") return `${head} t="e"${meta}>${f}<v>${escapeXml(result.error)}</v></c>`;
  return f ? `${head} t="str"${meta}>${f}<v${space(result)}>${escapeXml(result)}</v></c>` : `${head} t="inlineStr"><is><t${space(result)}>${escapeXml(result)}</t></is></c>`;
}

export const formulaXml = (stored: string): string => `<f>${escapeXml(stored)}</f>`;
export const arrayXml = (stored: string, range: string): string => `<f t="array" ref="${range}">${escapeXml(stored)}</f>`;
