/** Draws assets/icon.svg at the sizes the office host asks for: node src/commands/script.mjs assets/make-icons.ts */
import { readFileSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import { chromium } from "playwright-core";

const root = path.resolve(path.dirname(process.argv[1]!), "..");
const { launchServer } = createRequire(path.join(root, "package.json"))(path.join(root, "tests/browser/launch.cjs")) as { launchServer(): Promise<{ wsEndpoint(): string; close(): Promise<void> }> };

void (async () => {
  const server = await launchServer(), browser = await chromium.connect(server.wsEndpoint());
  const svg = readFileSync(path.join(root, "assets/icon.svg"), "utf8");
  for (const size of [16, 32, 64, 80, 128]) {
    const page = await browser.newPage({ viewport: { width: size, height: size } });
    await page.setContent(`<body style="margin:0;background:transparent">${svg.replace("<svg ", `<svg width="${size}" height="${size}" style="display:block" `)}</body>`);
    writeFileSync(path.join(root, `assets/icon-${size}.png`), await page.screenshot({ omitBackground: true }));
    await page.close();
  }
  await browser.close();
  await server.close();
  console.log("Icons are drawn.");
  process.exit(0);
})();
