import { z } from "zod";
import { isStaff } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { retryMessages } from "./message-store";

/** Puts what failed or waits at the head of the queue again, once the mail server is back. */
export const retryDeliveries = defineCommand({
  input: z.object({}),
  load: () => ({}),
  allow: (actor) => isStaff(actor),
  run: ({ conn, now }) => ok({ messages: retryMessages(conn, now) }),
});
