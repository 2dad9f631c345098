export type Paper = "letter" | "a4";
export type Background = "white" | "yellow";

/** Lengths in points (1/72 inch), y down from the top of the page. */
export type PageDesign = {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly contentWidth: number;
  readonly textSize: number;
  /** Line height as a multiple of the size. */
  readonly spacing: number;
  readonly headingSizes: readonly [number, number, number, number];
  readonly isLargePrint: boolean;
  readonly tickSide: number;
};

const paperSizes: Readonly<Record<Paper, readonly [number, number]>> = {
  letter: [612, 792],
  a4: [595.28, 841.89],
};

/** Large print begins at 18 pt (American Council of the Blind, Board of Publications 2022, acb.org/node/173). */
export const largePrintFrom = 18;
export const textSizeRange = { smallest: 10, largest: 48 } as const;

/** From the middle of a line down to its base line, as a share of the size: centres capitals on the line. */
export const middleToBaseline = 0.34;

/** A box of one centimetre, large enough for a gloved hand. */
export const oneCentimetre = 72 / 2.54;

/**
 * The measures of a page for a text size in points. Large print has one-inch margins left and right and 1.5 line
 * spacing (the same guidance asks for 1.15, its earlier edition and the W3C low vision task force for 1.5).
 */
export function designPage(paper: Paper, textSize: number, turned: boolean): PageDesign {
  const [short, long] = paperSizes[paper];
  const [width, height] = turned ? [long, short] : [short, long];
  const isLargePrint = textSize >= largePrintFrom;
  const side = isLargePrint ? 72 : 54;
  const headings = isLargePrint ? ([1.4, 1.22, 1.1, 1] as const) : ([1.86, 1.36, 1.14, 1] as const);
  return {
    width,
    height,
    left: side,
    right: width - side,
    top: 38,
    bottom: height - 38,
    contentWidth: width - 2 * side,
    textSize,
    spacing: isLargePrint ? 1.5 : 1.35,
    headingSizes: [
      headings[0] * textSize,
      headings[1] * textSize,
      headings[2] * textSize,
      headings[3] * textSize,
    ],
    isLargePrint,
    tickSide: isLargePrint ? oneCentimetre : Math.max(16, textSize * 1.2),
  };
}
