// Installs the locked packages when they are missing or differ from the lock. Node built-ins only: it runs before anything is installed.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";

const root = new URL("../../", import.meta.url);
const stamp = new URL("node_modules/.tampsheet-installed", root);
const OLDEST = [20, 19];

function refuseOldNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major > OLDEST[0] || (major === OLDEST[0] && minor >= OLDEST[1])) return;
  console.error(`Tampsheet needs Node ${OLDEST.join(".")} or newer; this is ${process.version}.`);
  process.exit(1);
}

export function install() {
  refuseOldNode();
  const lock = readFileSync(new URL("package-lock.json", root));
  const wanted = createHash("sha256").update(lock).update(process.platform + process.arch + process.versions.modules).digest("hex");
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === wanted) return;
  console.log("Installing packages (once; about a minute) …");
  const args = ["ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"];
  const options = { cwd: fileURLToPath(root), stdio: "inherit" };
  // npm's own path keeps us clear of npm.cmd and of a second npm on the PATH
  const npm = process.env.npm_execpath;
  const result = npm
    ? spawnSync(process.execPath, [npm, ...args], options)
    : spawnSync("npm", args, { ...options, shell: process.platform === "win32" });
  if (result.status !== 0) {
    console.error("The packages could not be installed; the lines above say why. Is the package registry reachable?");
    process.exit(result.status ?? 1);
  }
  writeFileSync(stamp, wanted);
}
