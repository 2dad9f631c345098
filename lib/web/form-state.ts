/** What a form shows after it was sent. Everything typed comes back, but for secrets. */
export type FormValues = Record<string, string | string[]>;

export type FormState =
  | { status: "fresh" }
  | { status: "refused"; sentence: string; fields: Record<string, string>; values: FormValues; attempt: number }
  | { status: "done"; sentence: string; attempt: number };

export const freshForm: FormState = { status: "fresh" };

export type FormAction = (previous: FormState, form: FormData) => Promise<FormState>;
