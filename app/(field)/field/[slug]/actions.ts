"use server";

import { printRoster } from "@/lib/roster/print-roster";
import { formAction } from "@/lib/web/form-action";

export const printRosterAction = formAction(printRoster, {
  next: ({ version }) => ({ say: `Roster version ${version} is made. Open it in the list below.` }),
});
