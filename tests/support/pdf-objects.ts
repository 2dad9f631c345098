import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";

export type Json = null | boolean | number | string | Json[] | { [key: string]: Json };
export type Dictionary = { [key: string]: Json };

/** The objects of a PDF as qpdf reads them; references are followed by `at`. */
export class PdfObjects {
  constructor(private readonly objects: Dictionary) {}

  /** The value behind a reference, or the value itself. A stream gives its dictionary. */
  resolve(value: Json | undefined): Json {
    if (typeof value !== "string" || !/^\d+ \d+ R$/u.test(value)) return value ?? null;
    const object = asDictionary(this.objects[`obj:${value}`] ?? null);
    const stream = asDictionary(object.stream ?? null);
    return stream.dict ?? object.value ?? null;
  }

  dictionary(value: Json | undefined): Dictionary {
    return asDictionary(this.resolve(value));
  }

  array(value: Json | undefined): Json[] {
    const resolved = this.resolve(value);
    return Array.isArray(resolved) ? resolved : [];
  }

  /** A stream's decoded bytes, one character a byte. */
  stream(reference: Json | undefined): string {
    if (Array.isArray(reference)) return reference.map((one) => this.stream(one)).join("\n");
    const object = asDictionary(this.objects[`obj:${String(reference)}`] ?? null);
    const data = asDictionary(object.stream ?? null).data;
    return typeof data === "string" ? Buffer.from(data, "base64").toString("latin1") : "";
  }

  catalog(): Dictionary {
    const trailer = asDictionary(this.objects.trailer ?? null);
    return this.dictionary(asDictionary(trailer.value ?? null)["/Root"]);
  }

  pages(): { readonly reference: string; readonly page: Dictionary }[] {
    const walk = (reference: Json, inherited: Dictionary): { reference: string; page: Dictionary }[] => {
      const node = { ...inherited, ...this.dictionary(reference) };
      if (node["/Type"] === "/Page") return [{ reference: String(reference), page: node }];
      const passedOn: Dictionary = node["/Resources"] === undefined ? {} : { "/Resources": node["/Resources"] };
      return this.array(node["/Kids"]).flatMap((kid) => walk(kid, passedOn));
    };
    const root = this.catalog()["/Pages"];
    return root === undefined ? [] : walk(root, {});
  }
}

export function asDictionary(value: Json): Dictionary {
  return value !== null && typeof value === "object" && !Array.isArray(value) ? value : {};
}

/** Text of a string object: qpdf writes `u:` before text and `b:` before bytes. */
export function textOf(value: Json | undefined): string {
  return typeof value === "string" ? value.replace(/^[ub]:/u, "") : "";
}

/** Reads a PDF with `qpdf --json`, which the machine must have (Debian package `qpdf`). */
export function readPdfObjects(bytes: Uint8Array): PdfObjects {
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-pdf-"));
  try {
    const file = path.join(folder, "sheet.pdf");
    const out = path.join(folder, "sheet.json");
    writeFileSync(file, bytes);
    const options = ["--json-output", "--json-stream-data=inline", "--decode-level=generalized", file, out];
    const run = spawnSync("qpdf", options, { encoding: "utf8" });
    if (run.error !== undefined) throw new Error("qpdf is needed to check PDF files", { cause: run.error });
    // 3 means it read the file with warnings.
    if (run.status !== 0 && run.status !== 3) throw new Error(`qpdf could not read the file: ${run.stderr}`);
    const parsed = JSON.parse(readFileSync(out, "utf8")) as { qpdf: [Json, Dictionary] };
    return new PdfObjects(parsed.qpdf[1]);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
