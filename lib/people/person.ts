import type { Role } from "@/lib/shared/actor";

export const readingFormats = [
  "print",
  "large print",
  "contracted braille",
  "uncontracted braille",
  "electronic text",
  "audio",
  "by phone",
] as const;
export type ReadingFormat = (typeof readingFormats)[number];

export type Person = {
  id: string;
  email: string;
  name: string;
  phone: string | null;
  roles: readonly Role[];
  emailConfirmed: boolean;
  hasPassword: boolean;
  readingFormat: ReadingFormat;
  textSizePt: number;
};

/** E-mail addresses are compared as people mean them: without case or the space around them. */
export function sameEmail(typed: string): string {
  return typed.trim().toLowerCase();
}

export const linkLifeMinutes = {
  "confirm-email": 3 * 24 * 60,
  "sign-in": 30,
  invitation: 14 * 24 * 60,
} as const;

/** Nobody is sent more links than this in an hour, whoever asks for them. */
export const mailsAnHour = 5;

/** Ten wrong answers in a quarter of an hour close the door for that address until the quarter is over. */
export const attemptsAllowed = { count: 10, minutes: 15 } as const;
