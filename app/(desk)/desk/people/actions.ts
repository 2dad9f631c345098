"use server";

import { changeClearance } from "@/lib/helpers/change-clearance";
import { invite } from "@/lib/people/invite";
import { takeRole } from "@/lib/people/take-role";
import { plainDayInWords } from "@/lib/shared/dates";
import { formAction } from "@/lib/web/form-action";

export const inviteAction = formAction(invite, {
  next: ({ name, email, role }) => ({ say: `${name} is invited as ${role}; a mail is on its way to ${email}.` }),
});

export const takeRoleAction = formAction(takeRole, {
  next: ({ name, role }) => ({ say: `${name} is no longer ${role}, and is signed out everywhere.` }),
});

export const changeClearanceAction = formAction(changeClearance, {
  next: ({ name, clearedUntil }) => ({ say: clearedUntil ? `${name} is cleared to ${plainDayInWords(clearedUntil)}.` : `${name} is no longer cleared.` }),
});
