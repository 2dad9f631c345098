export const paperForms = ["standard", "large print"] as const;
export type PaperForm = (typeof paperForms)[number];

export const standardSizePt = 14;
export const largeSizePt = 18;
export const largestSizePt = 36;

export type Paper = {
  id: string;
  outingId: string;
  form: PaperForm;
  textSizePt: number;
  version: number;
  printedAt: string;
  printedBy: string;
};
