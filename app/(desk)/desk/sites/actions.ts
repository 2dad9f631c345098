"use server";

import { addSite } from "@/lib/outings/add-site";
import { formAction } from "@/lib/web/form-action";

export const addSiteAction = formAction(addSite, {
  next: ({ name }) => ({ say: `${name} is in the list. You can plan outings there now.` }),
});
