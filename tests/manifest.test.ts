import { readFileSync } from "node:fs";
import path from "node:path";
import { readXml, type Attributes } from "../src/workbook/file/xml";

const root = path.join(__dirname, "..");
const xml = readFileSync(path.join(root, "manifest.xml"), "utf8");

interface Node { readonly name: string; readonly attributes: Attributes; text: string; readonly path: string }
const nodes: Node[] = [];
const stack: string[] = [];
readXml("manifest.xml", xml, 32, {
  open(name, attributes) { stack.push(name); nodes.push({ name, attributes, text: "", path: stack.join("/") }); },
  close() { stack.pop(); },
  text(more) { const last = nodes[nodes.length - 1]; if (last) last.text += more.trim(); },
});
const all = (name: string): Node[] => nodes.filter((node) => node.name === name);
const value = (name: string): string => all(name)[0]?.attributes.DefaultValue ?? all(name)[0]?.text ?? "";
const resources = new Map(nodes.filter((node) => ["Image", "Url", "String"].includes(node.name) && node.attributes.id).map((node) => [node.attributes.id!, node.attributes.DefaultValue!]));

// limits of the add-in-only manifest, from the host's documentation
test("identity: a GUID of its own, a four-part version, names within their lengths", () => {
  expect(value("Id")).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  expect(value("Version")).toMatch(/^\d+\.\d+\.\d+\.\d+$/);
  expect(value("Version").startsWith(`${(JSON.parse(readFileSync(path.join(root, "package.json"), "utf8")) as { version: string }).version}.`)).toBe(true);
  expect(value("DisplayName").length).toBeLessThanOrEqual(125);
  expect(value("Description").length).toBeLessThanOrEqual(250);
  expect(value("ProviderName").length).toBeLessThanOrEqual(125);
});

test("every resource that is named is there, and every one there is named", () => {
  const named = nodes.map((node) => node.attributes.resid).filter((id): id is string => id !== undefined);
  for (const id of named) {
    expect(id.length).toBeLessThanOrEqual(32);
    expect([id, resources.has(id)]).toEqual([id, true]);
  }
  expect([...resources.keys()].filter((id) => !named.includes(id))).toEqual([]);
});

test("every address is https", () => {
  const addresses = [...xml.matchAll(/DefaultValue="([a-z]+:[^"]*)"/g)].map((match) => match[1]!);
  expect(addresses.length).toBeGreaterThan(6);
  for (const address of addresses) expect(new URL(address).protocol).toBe("https:");
});

test("short strings within 125 signs, long ones within 250", () => {
  for (const node of all("String")) expect([node.attributes.id, node.attributes.DefaultValue!.length <= (node.path.includes("LongStrings") ? 250 : 125)]).toEqual([node.attributes.id, true]);
});

test("functions: namespace TAMP, one shared runtime that lives long, its page the pane", () => {
  expect(resources.get(all("Namespace")[0]!.attributes.resid!)).toBe("TAMP");
  const [runtime] = all("Runtime");
  expect(runtime!.attributes.lifetime).toBe("long");
  const pane = runtime!.attributes.resid;
  for (const node of nodes.filter((one) => /\/Page\/SourceLocation$|\/Action\/SourceLocation$|\/FunctionFile$/.test(one.path))) expect(node.attributes.resid).toBe(pane);
  expect(resources.get("Functions.Script.Url")).toMatch(/\/functions\.js$/);
  expect(resources.get("Functions.Metadata.Url")).toMatch(/\/functions\.json$/);
});

test("what the add-in needs of its host is stated", () => {
  expect(Object.fromEntries(all("Set").map(({ attributes }) => [attributes.Name, attributes.MinVersion]))).toEqual({ SharedRuntime: "1.1", CustomFunctionsRuntime: "1.1", ExcelApi: "1.9" });
  expect(all("Permissions")[0]!.text).toBe("ReadWriteDocument");
});

test("icons exist in the size their name says", () => {
  const icons = [...new Set([...xml.matchAll(/\/assets\/(icon-(\d+)\.png)"/g)].map((match) => [match[1]!, Number(match[2])] as const).map((pair) => JSON.stringify(pair)))].map((pair) => JSON.parse(pair) as [string, number]);
  expect(icons.map(([, size]) => size).sort((a, b) => a - b)).toEqual([16, 32, 64, 80]);
  for (const [name, size] of icons) {
    const png = readFileSync(path.join(root, "assets", name));
    expect([name, png.readUInt32BE(16), png.readUInt32BE(20)]).toEqual([name, size, size]);
  }
});
