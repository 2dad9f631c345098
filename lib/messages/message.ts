/** Every mail the programme sends, by kind, with the facts its template needs. */

export type OutingFacts = {
  title: string;
  slug: string;
  siteName: string;
  day: string;
  hours: string;
  meetingText: string;
};

export type MessageFacts = {
  "confirm-email": { name: string; link: string };
  "already-registered": { name: string; link: string };
  "sign-in-link": { name: string; link: string };
  invitation: { name: string; role: string; from: string; link: string };
  "registration-confirmed": { name: string; outing: OutingFacts; registrationId: string; amount: string; calendar: string };
  "on-the-waiting-list": { name: string; outing: OutingFacts; registrationId: string; place: number };
  "seat-offered": { name: string; outing: OutingFacts; registrationId: string; until: string };
  "asked-to-help": { name: string; outing: OutingFacts; task: string; from: string; link: string };
  "meeting-point": { name: string; outing: OutingFacts; task: string; phone: string; calendar: string };
  "called-off": { name: string; outing: OutingFacts; because: string; calendar: string };
  "outing-changed": { name: string; outing: OutingFacts; calendar: string };
};

export type MessageKind = keyof MessageFacts;
export type Message = { [Kind in MessageKind]: { kind: Kind; facts: MessageFacts[Kind] } }[MessageKind];

/** The mail a template makes of a message; `text` is complete on its own. */
export type Letter = {
  subject: string;
  html: string;
  text: string;
  calendar?: string;
};

/** Minutes until the next try after 1, 2, 3 … failed ones; after the last the message is failed and staff act. */
export const retryAfterMinutes = [1, 5, 15, 60, 180, 720] as const;

export const messageKindInWords: Record<MessageKind, string> = {
  "confirm-email": "Confirm your e-mail",
  "already-registered": "You already have an account",
  "sign-in-link": "Sign-in link",
  invitation: "Invitation",
  "registration-confirmed": "Registration confirmed",
  "on-the-waiting-list": "On the waiting list",
  "seat-offered": "A seat is free",
  "asked-to-help": "Asked to help",
  "meeting-point": "Meeting-point instructions",
  "called-off": "Outing called off",
  "outing-changed": "Outing changed",
};

/** A link's secret has no business in the log of what was sent. */
export function withoutSecrets(text: string): string {
  return text.replaceAll(/(\/link\/)[\w-]{20,}/g, "$1(kept out)");
}

export const messageStates = ["queued", "sending", "sent", "failed", "cancelled"] as const;

/** A mail as the desk sees it. */
export type DeliveryView = {
  id: string;
  kind: MessageKind;
  toAddress: string;
  state: (typeof messageStates)[number];
  attempts: number;
  lastProblem: string | null;
  subject: string | null;
  textBody: string | null;
  createdAt: string;
  sentAt: string | null;
};
