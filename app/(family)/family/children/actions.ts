"use server";

import { addChild } from "@/lib/families/add-child";
import { writeProfile } from "@/lib/registrations/write-profile";
import { formAction } from "@/lib/web/form-action";
import { safeBack } from "@/lib/web/safe-back";
import { pathTo } from "@/lib/web/paths";

export const addChildAction = formAction(addChild, {
  next: ({ participantId }, _context, form) => {
    const back = form.get("back");
    return { to: back ? safeBack(back) : pathTo.child(participantId) };
  },
});

export const writeProfileAction = formAction(writeProfile, {
  next: ({ nameUsed }) => ({ say: `Saved. We plan ${nameUsed}'s outings with this from now on, those already registered too.` }),
});
