"use server";

import { signUp } from "@/lib/people/sign-up";
import { formAction } from "@/lib/web/form-action";

export const signUpAction = formAction(signUp, {
  next: ({ email }) => ({ say: `Nearly there: open the mail we have sent to ${email} and follow its link. It works for three days.` }),
});
