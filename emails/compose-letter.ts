import { createElement } from "react";
import type { Letter, Message } from "@/lib/messages/message";
import { env } from "@/lib/shared/env";
import { alreadyRegistered, confirmEmail, invitation, signInLink } from "./account-letters";
import { LetterPage } from "./letter-page";
import { letterText, type Draft } from "./letter-parts";
import { askedToHelp, calledOff, meetingPoint, onTheWaitingList, outingChanged, registrationConfirmed, seatOffered } from "./outing-letters";

/** The mail for a message: subject, HTML, complete plain text, and a calendar file where there is one. */
export async function composeLetter(message: Message): Promise<Letter> {
  const draft = draftOf(message);
  const signature = `${env().PROGRAMME_NAME}\n${env().PROGRAMME_PHONE}. You can answer this mail, or call.`;
  // Imported here because a page may not import it; nothing but mail renders this way.
  const { renderToStaticMarkup } = await import("react-dom/server");
  const html = renderToStaticMarkup(createElement(LetterPage, { draft, signature }));
  return {
    subject: draft.subject,
    html: `<!doctype html>${html}`,
    text: letterText(draft, signature),
    ...("calendar" in message.facts ? { calendar: message.facts.calendar } : {}),
  };
}

function draftOf(message: Message): Draft {
  switch (message.kind) {
    case "confirm-email":
      return confirmEmail(message.facts);
    case "already-registered":
      return alreadyRegistered(message.facts);
    case "sign-in-link":
      return signInLink(message.facts);
    case "invitation":
      return invitation(message.facts);
    case "registration-confirmed":
      return registrationConfirmed(message.facts);
    case "on-the-waiting-list":
      return onTheWaitingList(message.facts);
    case "seat-offered":
      return seatOffered(message.facts);
    case "asked-to-help":
      return askedToHelp(message.facts);
    case "meeting-point":
      return meetingPoint(message.facts);
    case "outing-changed":
      return outingChanged(message.facts);
    case "called-off":
      return calledOff(message.facts);
  }
}
