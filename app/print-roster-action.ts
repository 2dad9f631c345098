"use server";

import { printRoster } from "@/lib/roster/print-roster";
import { formAction } from "@/lib/web/form-action";

/** The desk and the leader of the day use the same door; the use case asks each time who may. */
export const printRosterAction = formAction(printRoster, {
  next: ({ version }) => ({ say: `Roster version ${version} is made. Open it in the list below.` }),
});
