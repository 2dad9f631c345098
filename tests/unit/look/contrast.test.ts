import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, test } from "vitest";

// Contrast as WCAG 2.2 defines it: "relative luminance" and "contrast ratio" in its glossary,
// https://www.w3.org/TR/WCAG22/#dfn-contrast-ratio. Text 7:1 is success criterion 1.4.6, edges 3:1 is 1.4.11.

const css = readFileSync(path.join(process.cwd(), "app/globals.css"), "utf8");

function tokensOf(selector: string): Record<string, string> {
  const start = css.indexOf(selector);
  const block = css.slice(css.indexOf("{", start) + 1, css.indexOf("}", start));
  return Object.fromEntries([...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/g)].map(([, name, value]) => [name, value]));
}

const themes = {
  light: tokensOf(":root {"),
  "dark by the device": tokensOf(":root:not([data-theme])"),
  dark: tokensOf(':root[data-theme="dark"]'),
  "high contrast": tokensOf(':root[data-theme="contrast"]'),
};

function luminance(colour: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(one: string, other: string): number {
  const [light = 0, dark = 0] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

const texts = ["ink", "quiet", "marsh", "madder"].flatMap((text) => ["paper", "card"].map((ground) => [text, ground] as const));
const textPairs = [...texts, ["ink", "foam"], ["ink", "shell"], ["quiet", "foam"], ["quiet", "shell"], ["on-action", "marsh"], ["on-amber", "amber"]] as const;
const edgePairs = [["edge", "paper"], ["edge", "card"], ["marsh", "card"], ["ring", "paper"], ["ring", "card"], ["ink", "amber"]] as const;

test("black on white is 21 to 1, as WCAG says", () => {
  expect(contrast("#000000", "#ffffff")).toBeCloseTo(21, 5);
});

test("dark by choice is the dark of the device", () => {
  expect(themes.dark).toEqual(themes["dark by the device"]);
});

describe.each(Object.entries(themes))("in the theme %s", (name, tokens) => {
  test("every token is there", () => {
    expect(Object.keys(tokens).sort()).toEqual(Object.keys(themes.light).sort());
  });

  test.each(textPairs)("%s on %s is at least 7 to 1", (text, ground) => {
    expect(contrast(tokens[text] ?? "", tokens[ground] ?? "")).toBeGreaterThanOrEqual(7);
  });

  // The amber ring is seen because of the second ring around it, which is the ink of the theme; amber itself
  // carries ink in the light theme only.
  test.each(edgePairs.filter(([one]) => one !== "ink" || name === "light"))("%s against %s is at least 3 to 1", (edge, ground) => {
    expect(contrast(tokens[edge] ?? "", tokens[ground] ?? "")).toBeGreaterThanOrEqual(3);
  });
});
