import "./pane.css";
import { fitTest } from "../src/compaction/fit-test";
import { recordRules } from "../src/compaction/quality/record";
import { CurveController } from "./curve/controller";
import { CurveView } from "./curve/view";
import { findHost } from "./host";
import { showOutside } from "./outside";

const pane = document.getElementById("pane")!;

async function start(): Promise<void> {
  const host = await findHost();
  if (host === null) return showOutside(pane);
  const view: CurveView = new CurveView(pane, () => controller);
  const controller = new CurveController(host, view, (test, word, options) => fitTest(test, word, { ...options, rules: recordRules }));
  await controller.start();
  document.documentElement.dataset["ready"] = "true";
}

start().catch((error: unknown) => {
  const message = document.createElement("p");
  message.className = "trouble";
  message.textContent = `The workbook could not be reached: ${error instanceof Error ? error.message : String(error)}. Close the pane and open it again.`;
  pane.replaceChildren(message);
});
