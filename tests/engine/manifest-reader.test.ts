import path from "node:path";
import type { OfficeAddinManifest as Reader } from "office-addin-manifest";

declare const nodeRequire: (name: string) => unknown;

// the office tools are ES modules in part, which only Node itself can load
test("the office tools' own reader agrees on who this add-in is", async () => {
  const { OfficeAddinManifest } = nodeRequire("office-addin-manifest") as { OfficeAddinManifest: typeof Reader };
  const read = await OfficeAddinManifest.readManifestFile(path.join(__dirname, "../../manifest.xml"));
  expect(read).toEqual(expect.objectContaining({ id: "3b8c2f6e-7d41-4e0a-9a56-c1f0d2b7e984", displayName: "Tampsheet", version: "0.1.0.0", hosts: ["Workbook"], permissions: "ReadWriteDocument" }));
});
