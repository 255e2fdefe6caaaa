import { built } from "./support/host-runtime";

// content policies of hosts forbid generated code; the spreadsheet engine in the bench contains some, ours must not
test.each(["functions.js", "taskpane.js"])("%s needs no generated code", (name) => expect(built(name).toString("utf8")).not.toMatch(/\beval\s*\(|new Function\b/));

test.each(["functions.json", "taskpane.html", "taskpane.css", "manifest.xml", "example.xlsx", "assets/icon-32.png", "bench/index.html", "bench/bench.js"])("the build puts %s in place", (name) => expect(built(name).length).toBeGreaterThan(100));

test("the pane's page names no other host than the office host's own script", () => {
  const sources = [...built("taskpane.html").toString("utf8").matchAll(/(?:src|href)="([^"]+)"/g)].map((match) => match[1]!);
  expect(sources.filter((source) => /^https?:/.test(source))).toEqual(["https://appsforoffice.microsoft.com/lib/1/hosted/office.js"]);
});
