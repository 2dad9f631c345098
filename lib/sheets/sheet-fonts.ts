import path from "node:path";

/** `regular` and `bold` are the house's face; the others step in for words whose letters it lacks. */
export type Face = "regular" | "bold" | "fallback-regular" | "fallback-bold";
export const faces: readonly Face[] = ["regular", "bold", "fallback-regular", "fallback-bold"];
export type Weight = "regular" | "bold";

/** The one place that names the font files of printed sheets. See `fonts/README.md` for licences. */
export const faceFiles: Readonly<Record<Face, string>> = {
  regular: path.join(process.cwd(), "fonts", "AtkinsonHyperlegibleNext_400Regular.ttf"),
  bold: path.join(process.cwd(), "fonts", "AtkinsonHyperlegibleNext_700Bold.ttf"),
  "fallback-regular": path.join(process.cwd(), "fonts", "NotoSans_400Regular.ttf"),
  "fallback-bold": path.join(process.cwd(), "fonts", "NotoSans_700Bold.ttf"),
};

export const houseFace = (weight: Weight): Face => weight;
export const fallbackFace = (weight: Weight): Face => `fallback-${weight}`;
