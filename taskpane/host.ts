import { connect } from "../src/workbook/frame/client";
import { officePort } from "../src/workbook/office/office-port";
import type { WorkbookPort } from "../src/workbook/port";

/** The bench holds the pane in a frame of its own origin; a page of another origin cannot even be asked. */
function inBench(): boolean {
  if (window.parent === window) return false;
  try { return window.parent.location.origin === window.location.origin; } catch { return false; }
}

/** The workbook that the pane stands beside, or null where it was opened outside of one. */
export async function findHost(): Promise<WorkbookPort | null> {
  if (inBench()) return connect();
  if (typeof Office === "undefined" || typeof Office.onReady !== "function") return null;
  // outside the host its script answers with no host at all
  const { host } = await Office.onReady();
  if (host !== Office.HostType.Excel) return null;
  loadFunctions();
  return officePort();
}

/** In the office host one page holds the pane and the worksheet functions: the shared runtime of the manifest. */
function loadFunctions(): void {
  const script = document.createElement("script");
  script.src = "functions.js";
  document.head.append(script);
}
