// npm run bench:NAME runs tests/benchmarks/NAME.ts.
import { existsSync } from "node:fs";
import { install } from "./install.mjs";
import { isBuilt } from "./stamp.mjs";
import { root, tool } from "./tool.mjs";

const [name, ...rest] = process.argv.slice(2);
const file = `tests/benchmarks/${name}.ts`;
if (!name || !existsSync(root + file)) {
  console.error(`There is no benchmark ${name ?? ""}.`);
  process.exit(2);
}
install();
if (!isBuilt()) tool("webpack/bin/webpack.js");
tool("tsx/dist/cli.mjs", [file, ...rest]);
