import { expect, it } from "vitest";
import { z } from "zod";
import { fieldMessages } from "@/lib/shared/field-messages";

function messagesOf(schema: z.ZodType, raw: unknown): Record<string, string> {
  const parsed = schema.safeParse(raw);
  return parsed.success ? {} : fieldMessages(parsed.error);
}

it("each field has one message, the first that applies", () => {
  const schema = z.object({ name: z.string().min(3, "Longer.").regex(/^[A-Z]/, "A capital first."), age: z.number("A number.") });
  expect(messagesOf(schema, { name: "x", age: "ten" })).toEqual({ name: "Longer.", age: "A number." });
});

it("a nested field is named with dots, as in the form, and what belongs to no field is the form's", () => {
  const row = z.object({ phone: z.string().min(1, "Enter a phone.") });
  const schema = z.object({ contacts: z.array(row) }).refine(() => false, "The form as a whole.");
  const both = { "contacts.1.phone": "Enter a phone.", form: "The form as a whole." };
  expect(messagesOf(schema, { contacts: [{ phone: "1" }, { phone: "" }] })).toEqual(both);
  expect(messagesOf(schema, { contacts: [] })).toEqual({ form: "The form as a whole." });
});

it("a field called like something every object has is a field like any other", () => {
  const schema = z.object({ constructor: z.string("Enter it."), toString: z.string("Enter this too.") });
  expect(Object.entries(messagesOf(schema, { constructor: 1, toString: 2 }))).toEqual([["constructor", "Enter it."], ["toString", "Enter this too."]]);
});
