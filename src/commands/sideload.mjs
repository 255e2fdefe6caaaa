// npm run sideload: serves dist/ on https://localhost:3000 with a development certificate and starts the office host with the add-in.
import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import https from "node:https";
import { readFile } from "node:fs/promises";
import path from "node:path";
import { install } from "./install.mjs";
import { isBuilt } from "./stamp.mjs";
import { root, tool } from "./tool.mjs";

const PORT = 3000;
const TYPES = { ".html": "text/html; charset=utf-8", ".js": "text/javascript; charset=utf-8", ".css": "text/css; charset=utf-8", ".json": "application/json", ".png": "image/png", ".xml": "application/xml", ".map": "application/json" };

install();
if (!isBuilt()) tool("webpack/bin/webpack.js");

const certificates = await import("office-addin-dev-certs");
let options;
try {
  // asks once to trust a certificate of this machine's own
  options = await certificates.getHttpsServerOptions();
} catch (error) {
  console.error(`No development certificate: ${error.message}`);
  process.exit(1);
}

const dist = path.join(root, "dist");
const server = https.createServer(options, async (request, response) => {
  const file = path.join(dist, path.normalize(decodeURIComponent(new URL(request.url, "https://localhost").pathname)));
  if (!file.startsWith(dist + path.sep) || !existsSync(file)) return void response.writeHead(404).end();
  response.writeHead(200, { "content-type": TYPES[path.extname(file)] ?? "application/octet-stream", "cache-control": "no-cache", "access-control-allow-origin": "*" }).end(await readFile(file));
});
server.on("error", (error) => {
  console.error(error.code === "EADDRINUSE" ? `Port ${PORT} is taken; the manifest names it, so free it and try again.` : error.message);
  process.exit(1);
});
server.listen(PORT, "127.0.0.1", () => {
  console.log(`The add-in is served on https://localhost:${PORT}. Stop it with Ctrl+C.`);
  if (process.platform !== "win32" && process.platform !== "darwin") {
    console.log("There is no desktop office host for this system. In the host's web version: Add-ins, Upload My Add-in, and choose manifest.xml.");
    return;
  }
  // the debugging tool downloads at install, so it is called from here and is no dependency
  spawn("npx", ["--yes", "office-addin-debugging@7", "start", "manifest.xml", "desktop", "--no-debug"], { cwd: root, stdio: "inherit", shell: process.platform === "win32" });
});
