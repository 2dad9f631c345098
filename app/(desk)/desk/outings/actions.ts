"use server";

import { changeOuting } from "@/lib/registrations/change-outing";
import { closeOuting } from "@/lib/outings/close-outing";
import { planOuting } from "@/lib/outings/plan-outing";
import { publishOuting } from "@/lib/outings/publish-outing";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { formAction } from "@/lib/web/form-action";
import { pathTo } from "@/lib/web/paths";

export const planOutingAction = formAction(planOuting, {
  next: ({ slug }) => ({ to: pathTo.deskOuting(slug) }),
});

export const changeOutingAction = formAction(changeOuting, {
  next: ({ slug }) => ({ to: pathTo.deskOuting(slug) }),
});

export const publishOutingAction = formAction(publishOuting, {
  next: ({ title }) => ({ say: `${title} is published. Families can register now.` }),
});

export const closeOutingAction = formAction(closeOuting, {
  next: ({ title }) => ({ say: `Registration for ${title} is closed. Who has a seat keeps it.` }),
});

export const callOffOutingAction = formAction(callOffOuting, {
  next: ({ title, told }) => ({ say: `${title} is called off. ${told === 1 ? "One person is" : `${told} people are`} told by mail.` }),
});
