import "./bench.css";
import { createRuntime, type FunctionsMetadata } from "../engine/custom-functions";
import { CellError } from "../worksheet/cell";
import { cellName } from "../workbook/address";
import { BookRefusal } from "../workbook/file/book";
import { servePort } from "../workbook/frame/host";
import { Desk } from "./desk";
import { editsOnly } from "./edits-only";
import { closeNotice, download, element, loadScript, notice, onDrop, splitter } from "./page";
import { pageEngine } from "./page-engine";

declare global {
  interface Window {
    /** for tests and benchmarks: settles when the example stands computed */
    bench: { ready: Promise<void>; desk?: Desk; computedAfterMs?: number };
  }
}

async function start(): Promise<void> {
  const began = performance.now();
  splitter();
  // the functions come as the office host loads them: metadata, then a script that registers itself with the global
  const runtime = createRuntime();
  Object.assign(window, { CustomFunctions: runtime.CustomFunctions });
  const [metadata] = await Promise.all([fetch("../functions.json").then((answer) => answer.json() as Promise<FunctionsMetadata>), loadScript("../functions.js")]);

  const engine = pageEngine("grid", metadata, runtime);
  const desk = new Desk(engine);
  window.bench.desk = desk;
  editsOnly(engine.api, (says) => notice(says, "plain"), () => desk.loading);
  desk.onNews(() => { showFile(desk); speak(desk); });
  buttons(desk);

  const example = await fetch("../example.xlsx");
  if (!example.ok) throw new Error("the example workbook is missing from the build; open a workbook of your own");
  await desk.open(new Uint8Array(await example.arrayBuffer()), "example.xlsx");
  window.bench.computedAfterMs = performance.now() - began;

  const pane = element<HTMLIFrameElement>("pane");
  servePort(pane, desk.port);
  pane.src = "../taskpane.html";
}

function buttons(desk: Desk): void {
  const file = element<HTMLInputElement>("file");
  const take = async (chosen: File): Promise<void> => {
    if (desk.unsaved && !confirm(`${desk.fileName} has changes that are not saved. Open ${chosen.name} all the same?`)) return;
    notice(`Opening ${chosen.name} …`, "plain");
    // the page shows that before the work begins
    await new Promise((resolve) => { setTimeout(resolve, 30); });
    try {
      await desk.open(new Uint8Array(await chosen.arrayBuffer()), chosen.name);
      closeNotice();
    } catch (error) {
      notice(`${chosen.name} was not opened: ${error instanceof BookRefusal ? error.says : `the bench could not lay it out (${error instanceof Error ? error.message : String(error)}).`} ${desk.fileName} stays open.`);
    }
  };
  const save = (): void => {
    try {
      const { bytes, fileName } = desk.save();
      download(fileName, bytes);
      notice(`${fileName} was saved as a download.`, "plain");
    } catch (error) {
      notice(`The workbook was not saved: ${error instanceof BookRefusal ? error.says : error instanceof Error ? error.message : String(error)}`);
    }
  };
  const choose = (): void => { file.value = ""; file.click(); };
  element("open").addEventListener("click", choose);
  file.addEventListener("change", () => { const chosen = file.files?.[0]; if (chosen) void take(chosen); });
  element("save").addEventListener("click", save);
  element("undo").addEventListener("click", () => desk.undo());
  element("redo").addEventListener("click", () => desk.redo());
  element("notice-close").addEventListener("click", closeNotice);
  // a click leaves the typing where it was, in the grid; the keyboard reaches the buttons all the same
  for (const button of document.querySelectorAll(".tools button")) button.addEventListener("mousedown", (event) => event.preventDefault());
  const attend = (target: Window): void => {
    onDrop(target, (dropped) => void take(dropped));
    target.addEventListener("keydown", (event) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      const key = event.key.toLowerCase();
      if (key === "s") { event.preventDefault(); save(); }
      if (key === "o") { event.preventDefault(); choose(); }
    }, true);
  };
  attend(window);
  // the pane is a page of its own: keys pressed and files dropped there come to no one else
  const pane = element<HTMLIFrameElement>("pane");
  pane.addEventListener("load", () => { if (pane.contentWindow && pane.src) attend(pane.contentWindow); });
  addEventListener("beforeunload", (event) => { if (desk.unsaved) event.preventDefault(); });
}

function showFile(desk: Desk): void {
  element("file-name").textContent = desk.fileName;
  element("unsaved").hidden = !desk.unsaved;
  document.title = `${desk.unsaved ? "• " : ""}${desk.fileName} – Tampsheet bench`;
}

/** The grid is a picture to a screen reader; this line says what its active cell holds, and why it shows an error. */
function speak(desk: Desk): void {
  const line = element("active-cell"), area = desk.active();
  if (!area) return;
  const { value, formula, shown, message } = desk.port.cell(area);
  const trouble = value instanceof CellError;
  const parts = [`${area.sheet}, ${cellName(area.row, area.column)}`, trouble ? `${value.code}${message ? `: ${message}` : ""}` : shown || "empty", ...(formula ? [formula] : [])];
  line.textContent = parts.join(" · ");
  line.classList.toggle("error", trouble && Boolean(message));
}

window.bench = { ready: Promise.resolve() };
window.bench.ready = start().catch((error: unknown) => {
  notice(`The bench did not start as it should: ${error instanceof Error ? error.message : String(error)}.`);
  throw error;
});
window.bench.ready.catch(() => undefined);
