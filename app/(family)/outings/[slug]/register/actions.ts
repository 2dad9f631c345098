"use server";

import { registerChild } from "@/lib/registrations/register-child";
import { formAction } from "@/lib/web/form-action";
import { pathTo } from "@/lib/web/paths";

export const registerChildAction = formAction(registerChild, {
  next: ({ registrationId }) => ({ to: pathTo.registration(registrationId) }),
});
