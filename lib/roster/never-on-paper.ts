import { sheetTexts } from "@/lib/sheets/sheet";
import type { Sheet } from "@/lib/sheets/sheet";

/**
 * What must never be on a roster that leaves the house, on paper, in braille or as sound. Such facts go on
 * numbered sealed cards and the base's copy. Source: the programme's privacy rules; common practice, no published
 * source. `patterns` find what a text check can find; they may flag an innocent word, and say so in a sentence.
 */
export type NeverOnPaper = {
  readonly id: string;
  readonly what: string;
  readonly instead: string;
  readonly patterns: readonly RegExp[];
};

export const neverOnPaper: readonly NeverOnPaper[] = [
  {
    id: "diagnosis",
    what: "a diagnosis",
    instead: "Write what to do, not why.",
    patterns: [
      /\bdiagnos\w*/iu,
      /\b(?:epilep\w*|seizures?|diabet\w*|asthma\w*|autis\w*|adhd|retin\w*|glaucoma|cataracts?|albinism|syndrome|disorder|allerg\w*|anaphyla\w*)\b/iu,
    ],
  },
  {
    id: "medication",
    what: "a medicine or a dose",
    instead: "Put it on the person's sealed card and print the card's number.",
    patterns: [
      /\b\d+(?:[.,]\d+)?\s?(?:mg|mcg|µg|ml|units?|puffs?|tablets?|pills?)\b/iu,
      /\b(?:medic(?:ine|ation)s?(?! lead)|dose|doses|dosage|insulin|inhaler|epipen|epinephrine|midazolam|diazepam|injector)\b/iu,
    ],
  },
  {
    id: "toileting",
    what: "a detail of toileting or personal care",
    instead: "Tell the named helper in private.",
    patterns: [/\b(?:toilet\w*|diapers?|nappy|nappies|catheters?|incontinen\w*|continence|menstrua\w*)\b/iu],
  },
  {
    id: "custody",
    what: "a fact of custody or a court",
    instead: "Print PK, check ID list.",
    patterns: [/\b(?:custody|court|restraining|protective order|must not collect|divorc\w*|foster)\b/iu],
  },
  {
    id: "address",
    what: "a home address",
    instead: "The base keeps addresses.",
    patterns: [
      /\b\d{1,6}[A-Za-z]?\s+(?:\p{Lu}[\p{L}'’.]*\s+){1,4}(?:Street|St|Avenue|Ave|Road|Rd|Lane|Ln|Drive|Dr|Court|Ct|Boulevard|Blvd|Way|Place|Pl|Terrace|Highway|Hwy)\b\.?/u,
      /\b(?:apt|apartment|zip code|home address)\b/iu,
      /\b[A-Z]{2}\s+\d{5}(?:-\d{4})?\b/u,
    ],
  },
  {
    id: "birth-date",
    what: "a birth date",
    instead: "An age band is enough, and only where someone needs it.",
    patterns: [
      /\b(?:date of birth|birth ?dates?|birthdays?|born|dob)\b/iu,
      /\b\d{1,2}[/.-]\d{1,2}[/.-](?:\d{4}|\d{2})\b/u,
      /\b\d{4}-\d{2}-\d{2}\b/u,
      /\b(?:\d{1,2} )?(?:January|February|March|April|May|June|July|August|September|October|November|December)(?: \d{1,2},?)? \d{4}\b/iu,
    ],
  },
  {
    id: "identity-numbers",
    what: "an insurance, identity or social security number",
    instead: "The base keeps those.",
    patterns: [
      /\b(?:insurance|insured|policy (?:no|number)|member id|social security|ssn|medicaid|medicare|passport)\b/iu,
      /\b\d{3}-\d{2}-\d{4}\b/u,
    ],
  },
  {
    id: "money",
    what: "a fee or what someone pays",
    instead: "Nobody on the day needs to know.",
    patterns: [
      /[$€£]\s?\d/u,
      /\b\d+(?:[.,]\d{2})?\s?(?:dollars?|usd|eur|euros?)\b/iu,
      /\b(?:no[- ]fee|fee|fees|scholarships?|unpaid|paid|owes|waived)\b/iu,
    ],
  },
  {
    id: "clearance",
    what: "the result of a clearance",
    instead: "An adult on the roster is cleared; say no more.",
    patterns: [/\b(?:background checks?|clearances?|criminal|convict\w*|fingerprint\w*)\b/iu],
  },
  {
    id: "behaviour",
    what: "a behaviour history",
    instead: "Write what helps.",
    patterns: [
      /\b(?:aggressive|aggression|violent|violence|tantrums?|runs away|self-harm\w*|expelled|suspended)\b/iu,
      /\b(?:eloped?|elopement)\b/iu,
    ],
  },
  {
    id: "photo-reason",
    what: "the reason for no photo",
    instead: "Print NP or NV alone.",
    patterns: [/\bno (?:photos?|voice(?: recording)?)\b\s*(?:because|due to|since|as the|\()/iu],
  },
  {
    id: "guardian-remark",
    what: "a guardian's private remark",
    instead: "Ask the coordinator to turn it into an action.",
    patterns: [
      /\b(?:in confidence|confidential|private(?:ly)?|please don['’]t tell|(?:mother|father|mom|dad) says)\b/iu,
    ],
  },
  {
    id: "phone",
    what: "another phone number than the base's",
    instead: "Call the base.",
    patterns: [/(?<![\w-])\+?\(?\d(?:[\s().\u00A0-]?\d){6,14}(?!\w)/u],
  },
  {
    id: "e-mail",
    what: "an e-mail address",
    instead: "Call the base.",
    patterns: [/[^\s@]+@[^\s@]+\.\p{L}{2,}/u],
  },
];

export type NeverOnPaperFinding = {
  readonly id: string;
  readonly found: string;
  readonly where: string;
  /** What looks wrong and what to do, in words to show to the person who prints. */
  readonly sentence: string;
};

/**
 * Looks through every text of a sheet for what must never be on paper. `known` are texts the programme itself
 * put there (the base's phone, the outing's date, its title and place): they are not looked at. A clean result
 * proves nothing about what no pattern can know; a finding may be a false alarm and says what raised it.
 */
export function checkNeverOnPaper(sheet: Sheet, known: readonly string[] = []): NeverOnPaperFinding[] {
  const innocent = known.filter((text) => text.trim() !== "").toSorted((one, other) => other.length - one.length);
  return sheetTexts(sheet).flatMap(({ where, text }) => {
    const rest = innocent.reduce((left, part) => left.replace(wholeWords(part), " … "), text);
    return neverOnPaper.flatMap((rule) => findingsOf(rule, rest, where));
  });
}

/** A known text as whole words: the name "Al" says nothing about "allergy". */
function wholeWords(part: string): RegExp {
  const literal = part.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
  return new RegExp(`(?<![\\p{L}\\p{N}])${literal}(?![\\p{L}\\p{N}])`, "gu");
}

/** Whether a note of a family's may stand on a roster, as far as a pattern can know. */
export function mayBeOnPaper(note: string): boolean {
  return neverOnPaper.every((rule) => rule.patterns.every((pattern) => !pattern.test(note)));
}

function findingsOf(rule: NeverOnPaper, text: string, where: string): NeverOnPaperFinding[] {
  for (const pattern of rule.patterns) {
    const found = pattern.exec(text)?.[0].trim();
    if (found === undefined) continue;
    const sentence =
      `“${found}” in ${where} looks like ${rule.what}, which must never be on a roster. ` +
      `${rule.instead} If it is something else, word it differently.`;
    return [{ id: rule.id, found, where, sentence }];
  }
  return [];
}
