"use server";

import { askForSignInLink } from "@/lib/people/ask-for-sign-in-link";
import { signIn } from "@/lib/people/sign-in";
import { formAction } from "@/lib/web/form-action";
import { safeBack } from "@/lib/web/safe-back";
import { startSession } from "@/lib/web/session";

export const signInAction = formAction(signIn, {
  next: async (answer, _context, form) => {
    switch (answer.kind) {
      case "signed-in":
        await startSession(answer.personId);
        return { to: safeBack(form.get("back")) };
      case "wrong":
        return { refuse: { kind: "invalid", sentence: "There is a problem", fields: { password: "This address and password do not fit together, or the address is not confirmed yet. Try again, or ask for a link by e-mail below." } } };
      case "too-many":
        return { refuse: { kind: "conflict", code: "too-many", sentence: "Too many wrong tries for this address. Wait a quarter of an hour, or ask for a link by e-mail below." } };
    }
  },
});

export const askForLinkAction = formAction(askForSignInLink, {
  next: ({ email }) => ({ say: `If ${email} has an account here, a link is on its way. It works for 30 minutes.` }),
});
