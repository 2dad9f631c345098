import type { PageDesign } from "@/lib/sheets/page-design";
import { setLines, textWidth } from "@/lib/sheets/set-lines";
import type { Metrics, TextLine } from "@/lib/sheets/set-lines";
import type { Sheet } from "@/lib/sheets/sheet";

/** What stands at the head and foot of every page, and the room it leaves between. Points, y down. */
export type Furniture = {
  readonly size: number;
  readonly lineHeight: number;
  readonly head: readonly TextLine[];
  readonly headTop: number;
  readonly foot: readonly TextLine[];
  readonly headRuleY: number;
  readonly footRuleY: number;
  readonly contentTop: number;
  readonly contentHeight: number;
};

const largestFurniture = 24;
const smallestFurniture = 10;
const leastContent = 0.55;

/**
 * The page number is as large as the text, upper right. Head and foot are as large as the text up to 24 pt and
 * shrink where they would leave too little of the page: all they say stands in the text at full size too.
 */
export function furnish(sheet: Sheet, design: PageDesign, metrics: Metrics): Furniture {
  let size = Math.min(design.textSize, largestFurniture);
  let furniture = furnishAt(size, sheet, design, metrics);
  while (size > smallestFurniture && furniture.contentHeight < design.height * leastContent) {
    size -= 1;
    furniture = furnishAt(size, sheet, design, metrics);
  }
  return furniture;
}

function furnishAt(size: number, sheet: Sheet, design: PageDesign, metrics: Metrics): Furniture {
  const lineHeight = size * 1.25;
  const numberWidth = textWidth("page 000 of 000", "bold", design.textSize, metrics) + design.textSize;
  // Beside the page number while there is room, else under it.
  const isUnder = numberWidth > design.contentWidth * 0.5;
  const headWidth = isUnder ? design.contentWidth : design.contentWidth - numberWidth;
  const numberHeight = design.textSize * 1.25;
  const headTop = design.top + (isUnder ? numberHeight : 0);
  const head = setLines([{ text: sheet.runningHead, weight: "regular" }], size, headWidth, metrics);
  const foot = setLines([{ text: sheet.runningFoot ?? "", weight: "regular" }], size, design.contentWidth, metrics);
  const headBottom = Math.max(headTop + head.length * lineHeight, design.top + numberHeight);
  const headRuleY = headBottom + size * 0.3;
  const footTop = design.bottom - foot.length * lineHeight;
  const footRuleY = foot.length === 0 ? design.bottom : footTop - size * 0.3;
  const contentTop = headRuleY + design.textSize * 0.9;
  return {
    size, lineHeight, head, headTop, foot, headRuleY, footRuleY, contentTop,
    contentHeight: footRuleY - size * 0.5 - contentTop,
  };
}
