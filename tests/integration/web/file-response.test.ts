import { beforeAll, describe, expect, it } from "vitest";
import { storeFile } from "@/lib/files/file-store";
import { env } from "@/lib/shared/env";
import { sha256 } from "@/lib/shared/ids";
import { fileResponse } from "@/lib/web/file-response";
import { openDatabaseCopy } from "../../support/database";

const bytes = Buffer.from("0123456789");
const file = { sha256: sha256(bytes), bytes: 10, mediaType: "audio/wav" };

beforeAll(() => {
  const { conn, remove } = openDatabaseCopy();
  storeFile(conn, "2027-01-04T18:00:00.000Z", env().FILES_DIR, { bytes, mediaType: "audio/wav" });
  return remove;
});

const asked = (range: string | null) => fileResponse(file, { name: "a.wav", range, download: false });

describe("a stored file", () => {
  it("comes whole with its length, kind and name", async () => {
    const response = asked(null);
    expect(response.status).toBe(200);
    expect(Object.fromEntries(response.headers)).toMatchObject({
      "content-type": "audio/wav", "content-length": "10", "accept-ranges": "bytes", "content-disposition": 'inline; filename="a.wav"',
    });
    expect(await response.text()).toBe("0123456789");
  });

  // RFC 9110, 14.1.2: first and last byte, from a byte on, the last so many bytes; 15.5.17: outside is 416.
  it.each([
    ["bytes=2-4", 206, "234", "bytes 2-4/10"],
    ["bytes=7-", 206, "789", "bytes 7-9/10"],
    ["bytes=-3", 206, "789", "bytes 7-9/10"],
    ["bytes=-99", 206, "0123456789", "bytes 0-9/10"],
    ["bytes=8-99", 206, "89", "bytes 8-9/10"],
    ["bytes=10-", 416, "", "bytes */10"],
    ["bytes=-0", 416, "", "bytes */10"],
    ["bytes=5-2", 416, "", "bytes */10"],
    ["bytes=0-1,3-4", 200, "0123456789", null],
    ["lines=1-2", 200, "0123456789", null],
    ["bytes=-", 200, "0123456789", null],
  ])("asked for %s answers %i with %j", async (range, status, text, contentRange) => {
    const response = asked(range);
    expect(response.status).toBe(status);
    expect(response.headers.get("content-range")).toBe(contentRange);
    expect(await response.text()).toBe(text);
  });
});
