import { describe, expect, it } from "vitest";
import { heading, list, note, sheetTexts } from "@/lib/sheets/sheet";

describe("the texts of a sheet", () => {
  it("are all there in reading order, each with the place where it stands", () => {
    const texts = sheetTexts({
      title: "T", language: "en", runningHead: "H", runningFoot: "F",
      blocks: [
        heading(2, "P"),
        {
          kind: "table",
          caption: "C",
          columns: [{ header: "N", kind: "name" }, { header: "A", kind: "tick" }],
          rows: [["R", ""]],
        },
        {
          kind: "entry",
          number: "3",
          name: "W",
          lines: [{ label: "Do", text: "x" }, { label: "Called", writeHere: true }],
          ticks: ["G"],
        },
        list("labelled", [{ label: "L", text: "y" }]),
        note("B", "z"),
      ],
    });
    expect(texts.map(({ text }) => text)).toEqual([
      "T", "H", "F", "P", "C", "N", "A", "R", "3", "W", "Do: x", "Called", "G", "L: y", "B", "z",
    ]);
    expect(texts.find(({ text }) => text === "R")?.where).toBe("the table “C”, row R");
    expect(texts.find(({ text }) => text === "Do: x")?.where).toBe("the entry of number 3");
  });
});
