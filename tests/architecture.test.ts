import { readdirSync, readFileSync, statSync } from "node:fs";
import path from "node:path";

const root = path.join(__dirname, "..");
const files = (folder: string): string[] => readdirSync(path.join(root, folder)).flatMap((name) => {
  const at = `${folder}/${name}`;
  return statSync(path.join(root, at)).isDirectory() ? files(at) : /\.ts$/.test(name) && !name.endsWith(".d.ts") ? [at] : [];
});
const sources = ["src", "functions", "taskpane"].flatMap(files);
const text = new Map(sources.map((file) => [file, readFileSync(path.join(root, file), "utf8")]));

const imports = (file: string): string[] => [...text.get(file)!.matchAll(/(?:import|export)\s(?:[^"';]*?\sfrom\s)?"([^"]+)"/g)].map((match) => match[1]!);
/** A relative import as the file it names. */
function target(file: string, name: string): string | undefined {
  const at = path.posix.join(path.posix.dirname(file), name);
  return [`${at}.ts`, `${at}/index.ts`].find((one) => text.has(one));
}
const graph = new Map(sources.map((file) => [file, imports(file).filter((name) => name.startsWith(".") && !name.endsWith(".css")).map((name) => {
  const found = target(file, name);
  if (!found) throw new Error(`${file} imports ${name}, which is not there`);
  return found;
})]));
const edges = [...graph].flatMap(([from, to]) => to.map((one) => [from, one] as const));

/** The rooms, inner ones first: a room may import from those listed for it and from itself, nothing else. */
const ROOMS: Readonly<Record<string, readonly string[]>> = {
  "src/formula": [],
  "src/relations": ["src/formula"],
  "src/numerics": [],
  "src/units": ["src/relations"],
  "src/phase": ["src/relations"],
  "src/findings": ["src/relations"],
  "src/field": ["src/relations"],
  "src/earthwork": ["src/relations", "src/numerics"],
  "src/lots": ["src/numerics"],
  "src/judging": ["src/phase", "src/field"],
  "src/compaction": ["src/relations", "src/units", "src/phase", "src/numerics", "src/findings"],
  "src/worksheet": ["src/relations", "src/units", "src/phase", "src/findings", "src/compaction", "src/field", "src/earthwork", "src/lots", "src/judging"],
  "src/tables": ["src/relations", "src/units", "src/phase", "src/compaction", "src/worksheet"],
  "src/workbook/office": ["src/worksheet"],
  "src/workbook/file": ["src/worksheet"],
  "src/workbook/frame": ["src/worksheet"],
  "src/workbook/bench": ["src/worksheet", "src/engine"],
  "src/workbook/headless": ["src/worksheet", "src/engine", "src/workbook/file"],
  "src/workbook": ["src/worksheet"],
  "src/engine": ["src/worksheet"],
  "src/bench": ["src/engine", "src/worksheet"],
  functions: ["src/worksheet", "src/phase", "src/units", "src/relations"],
  taskpane: ["src/worksheet", "src/tables", "src/compaction", "src/findings", "src/phase", "src/units", "src/relations"],
};
/** what stands between pane and hosts may be known to all of these: the port, addresses, and what a book is */
const PORT = ["src/workbook/port.ts", "src/workbook/address.ts", "src/workbook/consent.ts", "src/workbook/pieces.ts", "src/workbook/file/book.ts"];
const MAY_KNOW_THE_PORT = /^(?:src\/workbook|src\/engine|src\/bench|src\/tables|taskpane)/;
/** the outermost pieces, which join rooms together */
const JOINS: Readonly<Record<string, readonly string[]>> = { "src/bench": ["src/workbook/bench", "src/workbook/frame", "src/workbook/file"], taskpane: ["src/workbook/frame", "src/workbook/office"], "src/tables": ["src/workbook"] };

const roomOf = (file: string): string => Object.keys(ROOMS).filter((room) => file.startsWith(`${room}/`)).sort((a, b) => b.length - a.length)[0] ?? "";

test("every source file stands in a room", () => expect(sources.filter((file) => roomOf(file) === "")).toEqual([]));

test("dependencies point inwards", () => {
  expect(edges.length).toBeGreaterThan(150);
  const wrong = edges.filter(([from, to]) => {
    const room = roomOf(from), other = roomOf(to);
    if (room === other || ROOMS[room]!.includes(other) || JOINS[room]?.includes(other)) return false;
    return !(PORT.includes(to) && MAY_KNOW_THE_PORT.test(from));
  });
  expect(wrong.map(([from, to]) => `${from} -> ${to}`)).toEqual([]);
});

test("there are no cycles, not even of types", () => {
  const state = new Map<string, "open" | "done">(), cycles: string[] = [];
  const visit = (file: string, trail: readonly string[]): void => {
    if (state.get(file) === "done") return;
    if (state.get(file) === "open") {
      cycles.push([...trail.slice(trail.indexOf(file)), file].join(" -> "));
      return;
    }
    state.set(file, "open");
    for (const next of graph.get(file)!) visit(next, [...trail, file]);
    state.set(file, "done");
  };
  for (const file of sources) visit(file, []);
  expect(cycles).toEqual([]);
});

const code = (file: string): string => text.get(file)!.replace(/\/\*[\s\S]*?\*\/|\/\/[^\n]*/g, "").replace(/"(?:[^"\\\n]|\\.)*"|'(?:[^'\\\n]|\\.)*'|`(?:[^`\\]|\\.)*`/g, '""');

test("only the office adapter, and the pane's choice of host, name the office host", () => {
  const named = sources.filter((file) => /\b(?:Excel|Office|OfficeExtension)\.\w/.test(code(file)));
  expect(named.filter((file) => !file.startsWith("src/workbook/office/") && file !== "taskpane/host.ts")).toEqual([]);
  expect(named).toContain("src/workbook/office/office-port.ts");
});

test("only functions/reply.ts speaks to the host's function runtime", () => {
  expect(sources.filter((file) => /\bCustomFunctions\.\w/.test(code(file)) && file !== "functions/reply.ts" && !file.startsWith("src/bench/") && !file.startsWith("src/engine/"))).toEqual([]);
});

test("only the engine's room and the bench name the engine", () => {
  expect(sources.filter((file) => imports(file).some((name) => name.startsWith("@univerjs")) && !/^src\/(?:engine|bench)\//.test(file))).toEqual([]);
});

test("the rooms that know soil and numbers use no library at all", () => {
  const bare = ["formula", "relations", "numerics", "units", "phase", "findings", "field", "earthwork", "compaction", "worksheet", "tables"].map((room) => `src/${room}/`);
  expect(sources.filter((file) => bare.some((room) => file.startsWith(room)) && imports(file).some((name) => !name.startsWith(".")))).toEqual([]);
});

test("every relation that the project declares is in the list that the tests check", () => {
  const declaring = sources.filter((file) => /=\s*relation\(/.test(text.get(file)!)).map((file) => file.replace(/^src\//, "").replace(/\.ts$/, ""));
  const listed = readFileSync(path.join(root, "tests/relations-of-all-rooms.ts"), "utf8");
  for (const file of declaring) expect([file, listed.includes(`../src/${file}"`)]).toEqual([file, true]);
  expect(declaring.length).toBeGreaterThan(8);
});
