// Whether dist/ was built from the files as they stand now: a hash of everything that goes into the bundles.
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { root } from "./tool.mjs";

const INPUTS = ["src", "functions", "taskpane", "assets", "manifest.xml", "package-lock.json", "tsconfig.json", "webpack.config.js"];
const stampFile = path.join(root, "dist/.built-from");

function hashOfInputs() {
  const hash = createHash("sha256");
  const add = (name) => {
    const full = path.join(root, name);
    if (!existsSync(full)) return;
    const entries = readdirSync(path.dirname(full), { withFileTypes: true });
    if (entries.find((entry) => entry.name === path.basename(full)).isDirectory()) {
      for (const entry of readdirSync(full).sort()) add(path.join(name, entry));
    } else {
      hash.update(name).update(readFileSync(full));
    }
  };
  INPUTS.forEach(add);
  return hash.digest("hex");
}

export const isBuilt = () => existsSync(stampFile) && readFileSync(stampFile, "utf8") === hashOfInputs();
export const stampBuild = () => writeFileSync(stampFile, hashOfInputs());
