// Runs once, outside jest's sandbox: one browser and one server for all browser tests.
const path = require("node:path");
const { launchServer } = require("./launch.cjs");

module.exports = async () => {
  const { serve } = await import("../../src/bench/serve.mjs");
  const server = await serve(path.join(__dirname, "../../dist"), 3500);
  const browser = await launchServer();
  process.env.BENCH_URL = server.url;
  process.env.BROWSER_ENDPOINT = browser.wsEndpoint();
  globalThis.stopBrowserTests = async () => {
    await browser.close();
    await server.close();
  };
};
