import type { MessageFacts, OutingFacts } from "@/lib/messages/message";
import { publicAddress } from "@/lib/shared/addresses";
import { facts, heading, link, paragraph, written, type Draft, type LetterPart } from "./letter-parts";

function keyFacts(outing: OutingFacts): LetterPart {
  return facts(["What", outing.title], ["When", `${outing.day}, ${outing.hours}`], ["Where", outing.siteName]);
}

function registrationLink(id: string): LetterPart {
  return link("Open this registration", publicAddress(`/family/registrations/${id}`));
}

export function registrationConfirmed(given: MessageFacts["registration-confirmed"]): Draft {
  const { name, outing, registrationId, amount } = given;
  return {
    subject: `Confirmed for ${outing.day}: ${outing.title}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, the seat is yours: what you told us is kept, the waiver is signed and nothing more is to pay.`),
      ...(amount === "" ? [] : [paragraph(`Received: ${amount}. Thank you.`)]),
      heading("Where to meet"),
      written(outing.meetingText),
      registrationLink(registrationId),
      paragraph("If something changes, tell us on that page up to the morning of the outing, or call. The calendar file with this mail is an extra; everything it says is above."),
    ],
  };
}

export function onTheWaitingList({ name, outing, registrationId, place }: MessageFacts["on-the-waiting-list"]): Draft {
  return {
    subject: `Waiting list for ${outing.day}: you are number ${place}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, all seats are taken. You are number ${place} on the waiting list, and we write as soon as a seat is free. There is nothing to pay until then.`),
      registrationLink(registrationId),
    ],
  };
}

export function seatOffered({ name, outing, registrationId, until }: MessageFacts["seat-offered"]): Draft {
  return {
    subject: `Action by ${until}: a seat is free on ${outing.day}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, a seat has become free and is held for you until ${until}. Finish the registration before then; after that it goes to the next family.`),
      registrationLink(registrationId),
    ],
  };
}

export function askedToHelp({ name, outing, task, from, link: href }: MessageFacts["asked-to-help"]): Draft {
  const what = task === "leader" ? "lead this outing" : "come along as a chaperone";
  return {
    subject: `Can you help on ${outing.day}? ${outing.title}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, ${from || "we"} would like to know whether you can ${what}. Answer yes, maybe or no; you can change it later with the same link.`),
      link("Answer yes, maybe or no", href),
      paragraph("You need no password for this link, so please do not pass it on."),
    ],
  };
}

export function meetingPoint({ name, outing, task, phone }: MessageFacts["meeting-point"]): Draft {
  return {
    subject: `Where to meet on ${outing.day}: ${outing.title}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, thank you for coming as ${task === "leader" ? "the leader" : "a chaperone"}.`),
      facts(["On the day, call or text", phone]),
      heading("How to find us"),
      written(outing.meetingText),
      heading("Before you come"),
      paragraph("Who you guide and what helps them is told on the day, never by mail. If you cannot come after all, tell us at once: it may decide whether the outing can go."),
      link("Your outings", publicAddress("/helping")),
    ],
  };
}

export function outingChanged({ name, outing }: MessageFacts["outing-changed"]): Draft {
  return {
    subject: `Changed: ${outing.title} on ${outing.day}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, something about this outing has changed. Above and below is how it stands now; please use this and forget earlier mails.`),
      heading("Where to meet"),
      written(outing.meetingText),
      link("The outing's page", publicAddress(`/outings/${outing.slug}`)),
      paragraph("If it no longer suits you, tell us on your own page, or call."),
    ],
  };
}

export function calledOff({ name, outing, because }: MessageFacts["called-off"]): Draft {
  return {
    subject: `Called off: ${outing.title} on ${outing.day}`,
    parts: [
      keyFacts(outing),
      paragraph(`Hello ${name}, this outing is called off. ${because}`),
      paragraph("If you have paid a fee, we return it or keep it for another outing, as you like: just answer this mail or call."),
      link("Other outings", publicAddress("/outings")),
    ],
  };
}
