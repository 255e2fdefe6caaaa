// Runs a tool of node_modules by its own entry, so that no shell and no .cmd file stands between.
import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";

export const root = fileURLToPath(new URL("../../", import.meta.url));

/** Runs to the end; a failure ends this process with the tool's own exit code. */
export function tool(entry, args = [], { optional = false, nodeArgs = [], env = {} } = {}) {
  const path = fileURLToPath(new URL(`../../node_modules/${entry}`, import.meta.url));
  const result = spawnSync(process.execPath, [...nodeArgs, path, ...args], { cwd: root, stdio: "inherit", env: { ...process.env, ...env } });
  const status = result.status ?? 1;
  if (status !== 0 && !optional) process.exit(status);
  return status;
}
