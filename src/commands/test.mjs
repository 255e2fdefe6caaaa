// npm test: installs what is missing, builds, checks types and style, and runs every test, the browser's included.
import { install } from "./install.mjs";
import { isBuilt } from "./stamp.mjs";
import { tool } from "./tool.mjs";

install();
console.log("Types …");
tool("typescript/bin/tsc", ["--noEmit", "-p", "."]);
console.log("Style …");
tool("eslint/bin/eslint.js", ["."]);
if (!isBuilt()) {
  console.log("Bundles …");
  tool("webpack/bin/webpack.js");
}
tool("jest/bin/jest.js", process.argv.slice(2), { env: { NODE_OPTIONS: "" } });
