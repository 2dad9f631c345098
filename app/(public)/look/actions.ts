"use server";

import { cookies } from "next/headers";
import { formAction } from "@/lib/web/form-action";
import { lookCookie } from "@/lib/web/look";
import { chooseLook } from "@/lib/web/look-choice";

export const chooseLookAction = formAction(chooseLook, {
  next: async ({ theme, text }) => {
    const value = `${theme.replaceAll(" ", "-")}/${text}`;
    (await cookies()).set(lookCookie, value, { path: "/", maxAge: 60 * 60 * 24 * 400, sameSite: "lax" });
    return { to: "/look?saved=1" as "/look" };
  },
});
