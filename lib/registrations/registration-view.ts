import { outingView, type OutingView } from "@/lib/outings/outing-view";
import type { AccessProfile } from "@/lib/families/access-profile";
import { momentInWords } from "@/lib/shared/dates";
import { moneyInWords } from "@/lib/shared/money";
import { sentence } from "@/lib/shared/words";
import { isLive, stepsLeft, type GuardianPlan, type RegistrationState, type Step } from "./registration";
import type { Registration } from "./registration-store";

/** A registration as its family sees it. */
export type RegistrationView = {
  id: string;
  outing: OutingView;
  child: { id: string; nameUsed: string; profile: AccessProfile | null };
  state: RegistrationState;
  stateInWords: string;
  /** Still to come and neither withdrawn nor called off: there is something to do or to wait for. */
  isOn: boolean;
  /** Where to meet, for those who come. */
  meetingText: string | null;
  holdUntil: string | null;
  placeInQueue: number | null;
  seatNumber: number | null;
  stepsLeft: Step[];
  guardianStays: GuardianPlan | null;
  thisTime: string;
  signed: string | null;
  fee: { state: "open" | "pending" | "settled"; amount: string; checkoutUrl: string | null };
};

export function registrationView(registration: Registration, now: string): RegistrationView {
  const { outing, participant, payment, signature } = registration;
  const zone = outing.site.zone;
  const holdUntil = registration.holdEndsAt && momentInWords(registration.holdEndsAt, zone);
  return {
    id: registration.id,
    outing: outingView(outing, now),
    child: { id: participant.id, nameUsed: participant.nameUsed, profile: participant.profile?.answers ?? null },
    state: registration.state,
    stateInWords: stateInWords(registration, holdUntil, now),
    isOn: isLive(registration.state) && outing.state !== "called off" && outing.endsAt > now,
    meetingText: registration.state === "confirmed" ? outing.meetingText : null,
    holdUntil,
    placeInQueue: registration.placeInQueue,
    seatNumber: registration.seatNumber,
    stepsLeft: stepsLeft({ hasNeeds: registration.hasNeeds, signed: signature !== null, feeSettled: registration.feeSettled }),
    guardianStays: registration.guardianStays,
    thisTime: registration.thisTime,
    signed: signature && `Signed by ${signature.typedName} on ${momentInWords(signature.signedAt, zone)}, text version ${signature.version}.`,
    fee: {
      state: payment === null ? "open" : payment.state === "settled" ? "settled" : "pending",
      amount: payment ? moneyInWords({ cents: payment.amountCents, currency: payment.currency }) : "",
      checkoutUrl: payment?.checkoutUrl ?? null,
    },
  };
}

function stateInWords(registration: Registration, holdUntil: string | null, now: string): string {
  const name = registration.participant.nameUsed;
  const { outing, state } = registration;
  const isLiveHere = state === "confirmed" || state === "held" || state === "waiting";
  if (outing.state === "called off" && isLiveHere) return `This outing is called off. ${outing.calledOffBecause ?? ""}`.trim();
  if (outing.endsAt <= now && isLiveHere) return state === "confirmed" ? `${name} was registered for this outing.` : "This outing is over.";
  switch (state) {
    case "confirmed":
      return `${name} is coming. Count-off number ${registration.seatNumber ?? "to follow"}.`;
    case "held":
      return sentence(`A seat is held for ${name} until ${holdUntil ?? "later today"}`);
    case "waiting":
      return `${name} is number ${registration.placeInQueue ?? 1} on the waiting list. We write to you as soon as a seat is free.`;
    case "turned away":
      return `We could not take ${name} this time.`;
    case "withdrawn":
      return `${name} is not registered for this outing.`;
  }
}
