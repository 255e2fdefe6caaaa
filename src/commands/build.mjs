// Builds dist/ afresh: functions, pane, bench, manifest, icons and the example workbook.
import { install } from "./install.mjs";
import { tool } from "./tool.mjs";

install();
tool("webpack/bin/webpack.js", process.argv.slice(2));
