const path = require("node:path");
const { existsSync } = require("node:fs");
const { sources, Compilation } = require("webpack");
const Copy = require("copy-webpack-plugin");
const Metadata = require("custom-functions-metadata-plugin");
const Html = require("html-webpack-plugin");
const Css = require("mini-css-extract-plugin");
const Minimizer = require("minimizer-webpack-plugin");

const dist = path.resolve(__dirname, "dist");
const functionFiles = ["mass-and-volume", "compaction", "beyond-one-curve", "field", "lots", "earthwork"].map((family) => `./functions/${family}.ts`);

/** What the metadata generator cannot say: error values may reach our functions, and no rich data types do. */
class FinishMetadata {
  apply(compiler) {
    compiler.hooks.thisCompilation.tap("FinishMetadata", (compilation) => {
      compilation.hooks.processAssets.tap({ name: "FinishMetadata", stage: Compilation.PROCESS_ASSETS_STAGE_OPTIMIZE }, () => {
        const metadata = JSON.parse(compilation.getAsset("functions.json").source.source().toString());
        const finished = { ...metadata, allowErrorForDataTypeAny: true, allowCustomDataForDataTypeAny: false };
        compilation.updateAsset("functions.json", new sources.RawSource(JSON.stringify(finished, null, 1)));
      });
    });
  }
}

/** Marks dist/ as built from the files as they stand, once all bundles are through without an error. */
class Stamp {
  apply(compiler) {
    compiler.hooks.done.tapPromise("Stamp", async (stats) => {
      if (stats.hasErrors()) return;
      Stamp.finished.add(compiler.name);
      if (Stamp.finished.size === Stamp.expected) (await import("./src/commands/stamp.mjs")).stampBuild();
    });
  }
}
Stamp.finished = new Set();
Stamp.expected = 3;

/** One line that tells how far a bundle is; only where someone watches. */
const progress = (name) => {
  const { ProgressPlugin } = require("webpack");
  let last = -1;
  return new ProgressPlugin((share) => {
    const tenth = Math.floor(share * 10);
    if (tenth <= last || (tenth < 10 && !process.stderr.isTTY)) return;
    last = tenth;
    process.stderr.write(process.stderr.isTTY ? `\r${name.padEnd(10)} ${"#".repeat(tenth).padEnd(10, ".")}${tenth === 10 ? "\n" : ""}` : `${name} built\n`);
  });
};

const minimizer = new Minimizer({ minify: Minimizer.swcMinify, extractComments: false, parallel: false });

const bundle = (name, target) => ({
  name,
  mode: "production",
  context: __dirname,
  target: ["web", target],
  devtool: name === "bench" ? false : "source-map",
  resolve: { extensions: [".ts", ".js"] },
  module: {
    rules: [
      // types are checked once for all bundles, by tsc; each bundle only strips them
      { test: /\.ts$/, exclude: /node_modules/, use: { loader: "ts-loader", options: { transpileOnly: true, instance: name, onlyCompileBundledFiles: true } } },
      { test: /\.css$/, use: [Css.loader, "css-loader"] },
    ],
  },
  // terser takes 75 s and 2.1 GB on the spreadsheet engine; swc's minifier 14 s and 1 GB for the same size
  optimization: { minimizer: [minimizer] },
  cache: { type: "filesystem", name, buildDependencies: { config: [__filename] } },
  performance: { hints: false },
  stats: "errors-warnings",
});

module.exports = [
  {
    ...bundle("functions", "es2020"),
    entry: { functions: "./functions/index.ts" },
    output: { path: dist, filename: "functions.js" },
    // the metadata plugin rewrites its files while they are loaded; a cache would skip that
    cache: false,
    plugins: [new Metadata({ input: functionFiles, output: "functions.json" }), new FinishMetadata(), new Stamp(), progress("functions")],
  },
  {
    ...bundle("taskpane", "es2020"),
    entry: { taskpane: "./taskpane/index.ts" },
    output: { path: dist, filename: "taskpane.js", chunkFilename: "[name].js" },
    plugins: [
      new Css({ filename: "taskpane.css" }),
      new Html({ filename: "taskpane.html", template: "./taskpane/taskpane.html", scriptLoading: "defer" }),
      new Copy({ patterns: [
        { from: "manifest.xml", noErrorOnMissing: !existsSync("manifest.xml") },
        { from: "assets/*.png", to: "assets/[name][ext]", noErrorOnMissing: true },
        { from: "assets/example.xlsx", noErrorOnMissing: true },
      ] }),
      new Stamp(), progress("pane"),
    ],
  },
  {
    ...bundle("bench", "es2022"),
    entry: { bench: "./src/bench/index.ts" },
    output: { path: path.join(dist, "bench"), filename: "bench.js", chunkFilename: "[name].js" },
    plugins: [new Css({ filename: "bench.css" }), new Html({ filename: "index.html", template: "./src/bench/index.html", scriptLoading: "defer" }), new Stamp(), progress("bench")],
  },
];
