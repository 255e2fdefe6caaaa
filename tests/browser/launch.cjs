// A Chromium that needs no system browser, no root and no download (Linux x64), or an installed Chrome or Edge elsewhere.
const fs = require("node:fs");
const path = require("node:path");

const SWITCHES = [
  "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync",
  "--force-color-profile=srgb", "--font-render-hinting=none",
];

async function executable() {
  if (process.platform !== "linux" || process.arch !== "x64") return undefined;
  const home = path.join(__dirname, "../../node_modules/.cache/tampsheet-chromium");
  fs.mkdirSync(path.join(home, "fontconfig"), { recursive: true });
  // makes the package unpack its own system libraries
  process.env.AWS_EXECUTION_ENV ??= "AWS_Lambda_nodejs20.x";
  // a folder of our own: another user's half-unpacked browser may lie in the system's
  const before = process.env.TMPDIR;
  process.env.TMPDIR = home;
  // the package's own fonts.conf names one fixed folder; in another it finds no font at all, and Chromium aborts
  const conf = path.join(home, "fontconfig/fonts.conf");
  fs.writeFileSync(conf, `<?xml version="1.0"?><!DOCTYPE fontconfig SYSTEM "fonts.dtd"><fontconfig><dir>${home}/fonts</dir><cachedir>${home}/font-cache</cachedir></fontconfig>`);
  process.env.FONTCONFIG_PATH = path.dirname(conf);
  process.env.FONTCONFIG_FILE = conf;
  const chromium = require("@sparticuz/chromium");
  const found = await chromium.executablePath();
  if (before === undefined) delete process.env.TMPDIR; else process.env.TMPDIR = before;
  return found;
}

/** A browser that other processes can connect to by its endpoint. */
exports.launchServer = async function launchServer() {
  const { chromium } = require("playwright-core");
  const executablePath = await executable();
  const args = process.getuid?.() === 0 ? [...SWITCHES, "--no-sandbox"] : SWITCHES;
  if (executablePath) return chromium.launchServer({ executablePath, headless: true, args });
  const missing = [];
  for (const channel of ["chrome", "msedge"]) {
    try {
      return await chromium.launchServer({ channel, headless: true, args });
    } catch (error) {
      missing.push(error.message.split("\n")[0]);
    }
  }
  throw new Error(`No browser for the tests: install Chrome or Edge, or run on Linux x64. (${missing.join("; ")})`);
};
