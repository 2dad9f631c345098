import { minutesLater } from "@/lib/shared/dates";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { isPassword } from "./passwords";
import { attemptsAllowed } from "./person";
import { signInSchema } from "./person-schema";
import {
  countSignInAttempts,
  findPasswordHash,
  findPersonByEmail,
  forgetSignInAttempts,
  noteSignInAttempt,
} from "./person-store";

export type SignInAnswer =
  | { kind: "signed-in"; personId: string }
  | { kind: "wrong" }
  | { kind: "too-many" };

/** Every answer is an ok outcome, since even a wrong attempt has something to keep: that it was made. */
export const signIn = defineCommand({
  input: signInSchema,
  prepare: ({ conn, input }) => isPassword(findPasswordHash(conn, input.email), input.password),
  load: (conn, _actor, input, now) => ({
    person: findPersonByEmail(conn, input.email),
    attempts: countSignInAttempts(conn, input.email, minutesLater(now, -attemptsAllowed.minutes)),
  }),
  allow: () => true,
  run: ({ conn, now, input, found: { person, attempts }, prepared: isRight }) => {
    if (attempts >= attemptsAllowed.count) return ok<SignInAnswer>({ kind: "too-many" });
    if (!person || !isRight) {
      noteSignInAttempt(conn, input.email, now);
      return ok<SignInAnswer>({ kind: "wrong" });
    }
    forgetSignInAttempts(conn, input.email);
    return ok<SignInAnswer>({ kind: "signed-in", personId: person.id });
  },
});
