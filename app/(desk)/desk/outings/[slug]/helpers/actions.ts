"use server";

import { askToHelp } from "@/lib/helpers/ask-to-help";
import { formAction } from "@/lib/web/form-action";

export const askToHelpAction = formAction(askToHelp, {
  next: ({ asked }) => ({ say: asked === 0 ? "They had been asked already." : asked === 1 ? "One person is asked by mail." : `${asked} people are asked by mail.` }),
});
