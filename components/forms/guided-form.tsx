"use client";

import { startTransition, useActionState, useId, useMemo, useState, type ChangeEvent, type FormEvent, type ReactNode } from "react";
import { get, set, useForm, type FieldErrors, type FieldValues, type UseFormRegisterReturn } from "react-hook-form";
import type { z } from "zod";
import { fieldMessages } from "@/lib/shared/field-messages";
import { readForm } from "@/lib/web/read-form";
import { freshForm, type FormAction } from "@/lib/web/form-state";
import { Carried } from "./action-form";
import { DoneMessage } from "./done-message";
import { ErrorSummary } from "./error-summary";
import { FormFactsProvider } from "./form-context";
import { SubmitButton } from "./submit-button";

type Props = {
  action: FormAction;
  schema: z.ZodType;
  submit: string;
  carry?: Record<string, string>;
  children: ReactNode;
};

/**
 * An action form that also helps while typing: not before it is sent, since a sentence that appears when a field
 * is left moves the page under the pointer, but from then on with every change. React Hook Form watches the fields;
 * what it checks is the form as the server will read it, with the same schema, so the two cannot disagree.
 */
export function GuidedForm({ action, schema, submit, carry = {}, children }: Props) {
  const [state, dispatch, pending] = useActionState(action, freshForm);
  const [localAttempt, setLocalAttempt] = useState(0);
  const [answered, setAnswered] = useState(0);
  const formId = useId();
  const resolver = useMemo(() => resolverFor(schema, formId), [schema, formId]);
  const { register, trigger, formState } = useForm<FieldValues>({ mode: "onSubmit", resolver });

  const refused = state.status === "refused" ? state : null;
  const local = flatErrors(formState.errors);
  const isLocal = localAttempt > answered;
  const errors = { ...(isLocal ? {} : refused?.fields), ...local };

  // Once something was wrong, each change is checked at once, so that what is mended stops being named.
  const afterwards = () => {
    if (localAttempt > 0) void trigger();
  };

  async function submitForm(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (pending) return;
    const sent = new FormData(event.currentTarget);
    const isGood = await trigger();
    setLocalAttempt(localAttempt + 1);
    if (!isGood) return;
    setAnswered(localAttempt + 1);
    startTransition(() => dispatch(sent));
  }

  return (
    <FormFactsProvider value={{ scope: "", values: refused?.values ?? null, errors, watch: (name) => watcherOf(register(name), afterwards) }}>
      {isLocal && Object.keys(local).length > 0 && <ErrorSummary sentence="There is a problem" fields={local} attempt={localAttempt} />}
      {!isLocal && refused && <ErrorSummary sentence={refused.sentence} fields={refused.fields} attempt={1000 + refused.attempt} />}
      <DoneMessage sentence={state.status === "done" ? state.sentence : ""} />
      <form id={formId} action={dispatch} onSubmit={(event) => void submitForm(event)} noValidate>
        <Carried carry={carry} />
        {children}
        <SubmitButton text={submit} look="first" pending={pending} />
      </form>
    </FormFactsProvider>
  );
}

/**
 * Only the handlers, never the ref: given a field's element, React Hook Form writes its own idea of the value into
 * it, and a group of tick boxes with one ticked came out with all of them ticked.
 */
function watcherOf({ onChange, onBlur }: UseFormRegisterReturn, afterwards: () => void) {
  return {
    onChange: (event: ChangeEvent) => void onChange(event).then(afterwards),
    onBlur,
  };
}

/** Reads the form element rather than the watched values: unticked boxes and hidden fields count as the server counts them. */
function resolverFor(schema: z.ZodType, formId: string) {
  return async (values: FieldValues) => {
    const element = document.getElementById(formId);
    const parsed = schema.safeParse(element instanceof HTMLFormElement ? readForm(new FormData(element)) : values);
    if (parsed.success) return { values, errors: {} };
    const errors: FieldErrors = {};
    for (const [name, message] of Object.entries(fieldMessages(parsed.error))) set(errors, name, { type: "schema", message });
    return { values: {}, errors };
  };
}

function flatErrors(errors: FieldErrors, prefix = ""): Record<string, string> {
  const flat: Record<string, string> = {};
  for (const key of Object.keys(errors)) {
    const entry: unknown = get(errors, key);
    if (typeof entry !== "object" || entry === null) continue;
    const message: unknown = (entry as { message?: unknown }).message;
    if (typeof message === "string") flat[prefix + key] = message;
    else Object.assign(flat, flatErrors(entry as FieldErrors, `${prefix}${key}.`));
  }
  return flat;
}
