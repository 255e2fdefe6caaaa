// npm run bench:NAME bundles tests/benchmarks/NAME.ts as it ships (tsx would keep the name of every closure, at a cost) and runs it.
import { spawnSync } from "node:child_process";
import { existsSync, rmSync } from "node:fs";
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
const { buildSync } = await import("esbuild");
const built = `${root}tests/benchmarks/.${name}.cjs`;
buildSync({ entryPoints: [root + file], outfile: built, bundle: true, platform: "node", format: "cjs", packages: "external", logLevel: "warning" });
const { status } = spawnSync(process.execPath, [built, ...rest], { stdio: "inherit" });
rmSync(built, { force: true });
process.exit(status ?? 1);
