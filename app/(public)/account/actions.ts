"use server";

import { becomeGuardian } from "@/lib/families/become-guardian";
import { changeReading } from "@/lib/people/change-reading";
import { signOut } from "@/lib/people/sign-out";
import { formAction } from "@/lib/web/form-action";
import { endSession } from "@/lib/web/session";

export const signOutAction = formAction(signOut, {
  next: async () => {
    await endSession();
    return { to: "/" };
  },
});

export const becomeGuardianAction = formAction(becomeGuardian, {
  next: () => ({ to: "/family" }),
});

export const changeReadingAction = formAction(changeReading, {
  next: ({ readingFormat }) => ({ say: `Saved: you read ${readingFormat}.` }),
});
