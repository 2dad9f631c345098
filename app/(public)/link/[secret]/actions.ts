"use server";

import { answerByLink } from "@/lib/helpers/answer-request";
import { acceptInvitation } from "@/lib/people/accept-invitation";
import { followMailLink } from "@/lib/people/follow-mail-link";
import { formAction } from "@/lib/web/form-action";
import { safeBack } from "@/lib/web/safe-back";
import { startSession } from "@/lib/web/session";

export const followLinkAction = formAction(followMailLink, {
  next: async ({ personId, back }) => {
    await startSession(personId);
    return { to: safeBack(back) };
  },
});

export const acceptInvitationAction = formAction(acceptInvitation, {
  next: async ({ personId }) => {
    await startSession(personId);
    return { to: "/account" };
  },
});

export const answerByLinkAction = formAction(answerByLink, {
  next: ({ answer, title }) => ({ say: answerInWords(answer, title) }),
});

function answerInWords(answer: "yes" | "maybe" | "no", title: string): string {
  if (answer === "yes") return `Thank you: you are coming to ${title}. The meeting point follows by mail.`;
  if (answer === "maybe") return `Noted as a maybe for ${title}. A maybe does not count for the ratio, so please say yes or no when you know.`;
  return `Noted: you are not coming to ${title}. Thank you for telling us.`;
}
