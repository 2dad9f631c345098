import type { z } from "zod";

/** One message a field, the first that applies; a nested field is named with dots. */
export function fieldMessages(error: z.ZodError): Record<string, string> {
  const fields: Record<string, string> = {};
  for (const issue of error.issues) {
    const name = issue.path.join(".") || "form";
    if (!Object.hasOwn(fields, name)) fields[name] = issue.message;
  }
  return fields;
}
