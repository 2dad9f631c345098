"use server";

import { answerRequest } from "@/lib/helpers/answer-request";
import { changeAbilities } from "@/lib/helpers/change-abilities";
import { formAction } from "@/lib/web/form-action";

export const answerRequestAction = formAction(answerRequest, {
  next: ({ answer, title }) => ({ say: `Your answer for ${title} is ${answer}. Thank you.` }),
});

export const changeAbilitiesAction = formAction(changeAbilities, {
  next: () => ({ say: "Saved. Thank you." }),
});
