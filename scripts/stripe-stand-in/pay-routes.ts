import { readForm } from "./form-encoding";
import { endingPage, payPage, PAY_PAGE_HEADERS } from "./pay-page";
import type { Ending } from "./pay-page";
import { decline, pay, wasDeclined } from "./payment";
import type { SessionRecord } from "./records";
import { redirectTo } from "./reply";
import type { Reply } from "./reply";
import type { Incoming } from "./router";
import type { StandIn } from "./stand-in";

/** The hosted page at /pay/:id, and the answers pressed on it. */
export function answerPay(standIn: StandIn, incoming: Incoming): Reply {
  const [, , id = ""] = incoming.path.split("/");
  const session = standIn.store.sessions.get(id);
  if (session === undefined) return endingReply(404, NO_SUCH_PAGE);
  if (session.status === "complete") return endingReply(refusedStatus(incoming), alreadyPaid(session));
  if (session.status === "expired") return endingReply(refusedStatus(incoming), tooLate(session));
  if (incoming.method !== "POST") return showPage(standIn, session);
  return takeAnswer(standIn, session, incoming.body);
}

function showPage(standIn: StandIn, session: SessionRecord): Reply {
  const minutesLeft = Math.max(1, Math.floor((session.expiresAt - standIn.clock.seconds()) / 60));
  const body = payPage(session, { declined: wasDeclined(standIn, session), minutesLeft });
  return { status: 200, headers: PAY_PAGE_HEADERS, body };
}

function takeAnswer(standIn: StandIn, session: SessionRecord, body: string): Reply {
  const reading = readForm(body);
  const answer = reading.ok ? reading.fields.answer : undefined;
  if (answer === "pay") {
    pay(standIn, session);
    return redirectTo(successAddress(session));
  }
  if (answer === "decline") {
    decline(standIn, session);
    return redirectTo(`/pay/${session.id}`);
  }
  if (answer === "back" && session.cancelUrl !== null) return redirectTo(new URL(session.cancelUrl).href);
  return endingReply(400, {
    title: "This answer is not known",
    sentence: "The page was sent without Pay, Decline or Go back. Nothing was paid.",
    link: { url: `/pay/${session.id}`, text: "Open the payment page again" },
  });
}

/** Replaced in the text as it was given: where the braces were percent-encoded, nothing is filled in. */
function successAddress(session: SessionRecord): string {
  return new URL(session.successUrl.replaceAll("{CHECKOUT_SESSION_ID}", session.id)).href;
}

function refusedStatus({ method }: Incoming): number {
  return method === "POST" ? 409 : 410;
}

function endingReply(status: number, ending: Ending): Reply {
  return { status, headers: PAY_PAGE_HEADERS, body: endingPage(ending) };
}

const NO_SUCH_PAGE: Ending = {
  title: "No such payment page",
  sentence: "The address is not one that was given out here, or the stand-in was started anew since.",
  link: null,
};

function alreadyPaid(session: SessionRecord): Ending {
  return {
    title: "This is already paid",
    sentence: "The payment was made before. It is not taken a second time.",
    link: { url: successAddress(session), text: "Go on to the site" },
  };
}

function tooLate(session: SessionRecord): Ending {
  return {
    title: "This payment page has expired",
    sentence: "The time to pay here is over. Nothing was paid. To pay, start again from the site.",
    link: session.cancelUrl === null ? null : { url: session.cancelUrl, text: "Go back to the site" },
  };
}
