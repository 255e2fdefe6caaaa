/** Makes the README's picture of the bench: `npm run pictures`, after `npm run build`. */
import { createRequire } from "node:module";
import path from "node:path";
import { chromium } from "playwright-core";
import { serve } from "../src/bench/serve.mjs";

const root = path.resolve(path.dirname(process.argv[1]!), "..");
const { launchServer } = createRequire(path.join(root, "package.json"))(path.join(root, "tests/browser/launch.cjs")) as { launchServer(): Promise<{ wsEndpoint(): string; close(): Promise<void> }> };

void (async () => {
  const server = await serve(path.join(root, "dist"), 3700), started = await launchServer(), browser = await chromium.connect(started.wsEndpoint());
  const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
  await page.goto(`${server.url}bench/`);
  await page.waitForFunction(() => window.bench?.computedAfterMs);
  await page.evaluate(() => window.bench.desk!.port.goTo({ sheet: "Lab C", row: 3, column: 0, rows: 7, columns: 3 }));
  const pane = page.frameLocator("#pane");
  await pane.getByText("Maximum dry density").first().waitFor();
  await page.waitForTimeout(500);
  await page.screenshot({ path: path.join(root, "assets/bench.png") });
  await browser.close();
  await started.close();
  await server.close();
  console.log("assets/bench.png is made.");
  process.exit(0);
})();
