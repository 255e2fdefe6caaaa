import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { BookRefusal } from "./book";
import { LIMITS, type Limits } from "./limits";

const startsWith = (bytes: Uint8Array, ...head: number[]): boolean => head.every((byte, i) => bytes[i] === byte);

/** A text of UTF-16 somewhere in the first part of a file, as an old compound file names its streams. */
function namesStream(bytes: Uint8Array, name: string): boolean {
  const wanted = [...name].flatMap((letter) => [letter.charCodeAt(0), 0]), end = Math.min(bytes.length, 1 << 20) - wanted.length;
  for (let i = 0; i <= end; i++) if (wanted.every((byte, k) => bytes[i + k] === byte)) return true;
  return false;
}

function refuseByHead(bytes: Uint8Array, limits: Limits): void {
  if (bytes.length > limits.fileBytes) throw new BookRefusal("too-large", `the file has ${Math.round(bytes.length / 1e6)} MB; the limit is ${Math.round(limits.fileBytes / 1e6)} MB. Save a smaller copy with the sheets you need.`);
  if (startsWith(bytes, 0xd0, 0xcf, 0x11, 0xe0)) {
    if (namesStream(bytes, "EncryptedPackage")) throw new BookRefusal("encrypted", "it is protected by a password. Open it in your spreadsheet program, take the password off, and save a copy.");
    throw new BookRefusal("old-format", "it is in the old binary format (.xls). Save it as an .xlsx workbook first.");
  }
  if (!startsWith(bytes, 0x50, 0x4b)) throw new BookRefusal("not-xlsx", bytes.length === 0 ? "the file is empty." : "it is not an .xlsx workbook.");
}

/** The parts of an .xlsx file by name, in the order of the file. */
export class Package {
  private constructor(private readonly parts: Map<string, Uint8Array>, private readonly limits: Limits) {}

  /** @throws BookRefusal for what is no .xlsx, or would not fit in memory */
  static open(bytes: Uint8Array, limits: Limits = LIMITS): Package {
    refuseByHead(bytes, limits);
    let size = 0, count = 0;
    let files: Record<string, Uint8Array>;
    try {
      files = unzipSync(bytes, {
        filter({ name, originalSize }) {
          size += originalSize;
          if (size > limits.unzippedBytes) throw new BookRefusal("too-large", `unpacked it would take more than ${Math.round(limits.unzippedBytes / 1e6)} MB.`);
          if (++count > limits.parts) throw new BookRefusal("too-large", "it holds too many parts.");
          return !name.endsWith("/") && !name.includes("__proto__");
        },
      });
    } catch (error) {
      if (error instanceof BookRefusal) throw error;
      throw new BookRefusal("damaged", "the file is damaged and cannot be unpacked. Open it in your spreadsheet program, let that repair it, and save a copy.");
    }
    const opened = new Package(new Map(Object.entries(files)), limits);
    if (opened.names().some((name) => /vbaProject\.bin$/i.test(name))) throw new BookRefusal("macros", "it holds macros. Save a copy as .xlsx, without macros.");
    if (!opened.has("[Content_Types].xml")) throw new BookRefusal("not-xlsx", "it is a zip file, but no .xlsx workbook.");
    return opened;
  }

  static empty(): Package { return new Package(new Map(), LIMITS); }

  names(): string[] { return [...this.parts.keys()]; }
  has(name: string): boolean { return this.parts.has(name); }

  /** the part as text; a missing one is damage */
  text(name: string): string {
    const bytes = this.parts.get(name);
    if (!bytes) throw new BookRefusal("damaged", `the part ${name} is missing from the file.`);
    if (bytes[0] === 0xff && bytes[1] === 0xfe || bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder(bytes[0] === 0xff ? "utf-16le" : "utf-16be").decode(bytes);
    const text = strFromU8(bytes);
    return text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
  }

  put(name: string, text: string): void {
    if (!this.has(name) || this.text(name) !== text) this.parts.set(name, strToU8(text));
  }

  remove(name: string): void { this.parts.delete(name); }

  get depth(): number { return this.limits.depth; }
  get mostCells(): number { return this.limits.cells; }

  zip(): Uint8Array {
    return zipSync(Object.fromEntries(this.parts), { level: 6 });
  }
}
