"use server";

import { checkOutingCover } from "@/lib/cover-board/check-outing-cover";
import { pairPeople } from "@/lib/cover-board/pair-people";
import { formAction } from "@/lib/web/form-action";

export const checkCoverAction = formAction(checkOutingCover, {
  next: ({ verdict }) => ({ say: `Checked just now. ${verdict.sentence}` }),
});

export const pairPeopleAction = formAction(pairPeople, {
  next: ({ sentence }) => ({ say: `Saved. ${sentence}` }),
});
