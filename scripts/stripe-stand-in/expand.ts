import { invalidRequest } from "./api-error";

export type ApiObject = { [name: string]: unknown };

/** What stands behind a name on an object: the object with that id, or a list that is left out unless asked for. */
export type Lookup = (holder: ApiObject, name: string) => ApiObject | null;

/**
 * Fills in what `expand` asks for, such as payment_intent.latest_charge, or data.payment_intent on a list.
 * @throws ApiError (400) for a name that cannot be expanded
 */
export function expandObject(object: ApiObject, paths: readonly string[], lookUp: Lookup): ApiObject {
  return paths.reduce((expanded, path) => expandPath(expanded, path.split("."), path, lookUp), object);
}

function expandPath(object: ApiObject, parts: readonly string[], path: string, lookUp: Lookup): ApiObject {
  const [name, ...rest] = parts;
  if (name === undefined) return object;
  const present = object[name];
  if (Array.isArray(present)) {
    const items: unknown[] = present;
    return { ...object, [name]: items.map((item) => (isObject(item) ? expandPath(item, rest, path, lookUp) : item)) };
  }
  // Something to expand that is not there yet (a payment that nobody has begun) stays null, as with Stripe.
  if (present === null) return object;
  const found = isObject(present) ? present : lookUp(object, name);
  if (found === null) {
    throw invalidRequest(`This property cannot be expanded (${path}).`, { param: "expand" });
  }
  return { ...object, [name]: expandPath(found, rest, path, lookUp) };
}

function isObject(value: unknown): value is ApiObject {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
