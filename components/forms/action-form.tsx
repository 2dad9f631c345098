"use client";

import { useActionState, type ReactNode } from "react";
import { freshForm, type FormAction } from "@/lib/web/form-state";
import { DoneMessage } from "./done-message";
import { ErrorSummary } from "./error-summary";
import { FormFactsProvider } from "./form-context";
import { SubmitButton } from "./submit-button";

type Props = {
  action: FormAction;
  submit: string;
  look?: "first" | "second" | "stop";
  /** Facts the form carries along, such as an id. */
  carry?: Record<string, string>;
  children?: ReactNode;
  /** Whether the answer is shown above the form; a row of small forms shows it below. */
  answer?: "above" | "below";
  /** Where a page has several forms with the same fields: something that tells this one apart. */
  scope?: string;
};

/** A form that works before and without JavaScript: errors, values and answers come from the server. */
export function ActionForm({ action, submit, look = "first", carry = {}, children, answer = "above", scope = "" }: Props) {
  const [state, dispatch, pending] = useActionState(action, freshForm);
  const refused = state.status === "refused" ? state : null;
  const result = (
    <>
      {refused && <ErrorSummary scope={scope} sentence={refused.sentence} fields={refused.fields} attempt={refused.attempt} />}
      <DoneMessage sentence={state.status === "done" ? state.sentence : ""} />
    </>
  );
  return (
    <FormFactsProvider value={{ scope, values: refused?.values ?? null, errors: refused?.fields ?? {} }}>
      {answer === "above" && result}
      <form action={dispatch} noValidate>
        <Carried carry={carry} />
        {children}
        <SubmitButton text={submit} look={look} pending={pending} />
      </form>
      {answer === "below" && result}
    </FormFactsProvider>
  );
}

export function Carried({ carry }: { carry: Record<string, string> }) {
  return Object.entries(carry).map(([name, value]) => <input key={name} type="hidden" name={name} value={value} />);
}
