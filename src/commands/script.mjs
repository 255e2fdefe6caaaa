// Runs a TypeScript script of the project: node src/commands/script.mjs assets/make-example.ts
import { install } from "./install.mjs";
import { tool } from "./tool.mjs";

install();
tool("tsx/dist/cli.mjs", process.argv.slice(2));
