import { createReadStream } from "node:fs";
import { Readable } from "node:stream";
import { filePath } from "@/lib/files/file-store";
import { env } from "@/lib/shared/env";

type Served = { sha256: string; bytes: number; mediaType: string };

/** Streams a stored file. One range is honoured, so that an audio player can seek by keyboard (RFC 9110, 14). */
export function fileResponse(file: Served, options: { name: string; range: string | null; download: boolean }): Response {
  const headers = new Headers({
    "content-type": file.mediaType,
    "accept-ranges": "bytes",
    etag: `"${file.sha256}"`,
    "cache-control": "public, max-age=86400",
    "content-disposition": `${options.download ? "attachment" : "inline"}; filename="${options.name}"`,
  });
  const range = rangeOf(options.range, file.bytes);
  if (range === "outside") return new Response(null, { status: 416, headers: { "content-range": `bytes */${file.bytes}` } });
  const [start, end] = range ?? [0, file.bytes - 1];
  headers.set("content-length", String(end - start + 1));
  if (range) headers.set("content-range", `bytes ${start}-${end}/${file.bytes}`);
  const stream = createReadStream(filePath(env().FILES_DIR, file.sha256), { start, end });
  return new Response(Readable.toWeb(stream) as ReadableStream, { status: range ? 206 : 200, headers });
}

/** The first and last byte asked for; null for the whole file, as for a header that is not one range of bytes. */
export function rangeOf(header: string | null, bytes: number): [number, number] | "outside" | null {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header ?? "");
  if (!match) return null;
  const [, from = "", to = ""] = match;
  if (from === "" && to === "") return null;
  const start = from === "" ? Math.max(0, bytes - Number(to)) : Number(from);
  const end = from === "" || to === "" ? bytes - 1 : Math.min(Number(to), bytes - 1);
  return start >= bytes || start > end ? "outside" : [start, end];
}
