import type { Route } from "next";
import { refresh } from "next/cache";
import { redirect } from "next/navigation";
import { after } from "next/server";
import type { z } from "zod";
import { isSignedIn } from "@/lib/shared/actor";
import type { Refusal } from "@/lib/shared/outcome";
import type { Context, UseCase } from "@/lib/shared/use-case";
import type { FormAction, FormState } from "./form-state";
import { deliverOutbox } from "./outbox";
import { readForm, typedValues } from "./read-form";
import { currentContext } from "./session";

/** Where a form leads when it worked: to a page, to a payment page elsewhere, to a sentence, or to a refusal after all. */
export type Next = { to: Route } | { elsewhere: string } | { say: string } | { refuse: Refusal };

type Options<Value> = {
  /** Facts that are not typed, such as the id in the page's address. They win over what the form says. */
  read?: (form: FormData) => Record<string, unknown>;
  next: (value: Value, context: Context, form: FormData) => Next | Promise<Next>;
};

/** A use case as a server action: reads the form, runs it, and gives back a page or what to show. */
export function formAction<Schema extends z.ZodType, Value>(useCase: UseCase<Schema, Value>, options: Options<Value>): FormAction {
  return async (previous, form) => {
    const context = await currentContext();
    const outcome = await useCase(context, { ...readForm(form), ...options.read?.(form) });
    const next: Next = outcome.ok ? await options.next(outcome.value, context, form) : { refuse: outcome.refusal };
    if (useCase.kind === "command") after(deliverOutbox);
    if ("to" in next) redirect(next.to);
    if ("elsewhere" in next) redirect(next.elsewhere as Route);
    const attempt = previous.status === "fresh" ? 1 : previous.attempt + 1;
    if ("say" in next) {
      refresh(); // the page behind the sentence shows what is true now
      return { status: "done", sentence: next.say, attempt };
    }
    return refusedState(next.refuse, context, form, attempt);
  };
}

function refusedState(refusal: Refusal, context: Context, form: FormData, attempt: number): FormState {
  const signedOut = !isSignedIn(context.actor) && refusal.kind === "forbidden";
  const sentence = signedOut
    ? "You are signed out, so this was not saved. What you typed is still here: sign in in another tab, then send it again."
    : refusal.sentence;
  return { status: "refused", sentence, fields: refusal.kind === "invalid" ? refusal.fields : {}, values: typedValues(form), attempt };
}
