// npm start: installs what is missing, builds what has changed, serves the bench on this machine only, and opens a browser where there is one.
import { spawn } from "node:child_process";
import { install } from "./install.mjs";
import { isBuilt } from "./stamp.mjs";
import { root, tool } from "./tool.mjs";

const args = process.argv.slice(2);
if (args.includes("--help")) {
  console.log("npm start -- [--no-open] [--port N]\n  --no-open   do not open a browser\n  --port N    first port to try (3210)");
  process.exit(0);
}
const portAt = args.indexOf("--port");
const port = portAt < 0 ? 3210 : Number(args[portAt + 1]);
if (!Number.isInteger(port) || port < 1 || port > 65535) {
  console.error("--port wants a whole number from 1 to 65535.");
  process.exit(2);
}

install();
if (!isBuilt()) {
  console.log("Building (about half a minute the first time) …");
  tool("webpack/bin/webpack.js");
}
const { serve } = await import("../bench/serve.mjs");
const { url } = await serve(`${root}dist`, port);
const address = `${url}bench/`;
console.log(`Tampsheet bench: ${address}\nStop it with Ctrl+C.`);
if (!args.includes("--no-open")) open(address);

function open(where) {
  const [command, ...rest] = process.platform === "win32" ? ["cmd", "/c", "start", "", where] : process.platform === "darwin" ? ["open", where] : ["xdg-open", where];
  // a machine without a browser still serves the page
  spawn(command, rest, { stdio: "ignore", detached: true }).on("error", () => {}).unref();
}
