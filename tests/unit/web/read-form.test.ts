import { describe, expect, it } from "vitest";
import { readForm, typedValues } from "@/lib/web/read-form";

function form(...pairs: [string, string | Blob][]): FormData {
  const data = new FormData();
  for (const [name, value] of pairs) data.append(name, value);
  return data;
}

describe("a form as data", () => {
  it("has dots as nesting and repeated names as a list", () => {
    const data = readForm(form(["title", "Owls"], ["contacts.0.name", "Rosa"], ["contacts.0.phone", "1"], ["contacts.1.name", "Nils"], ["travel", "cane"], ["travel", "walks"]));
    expect(data).toEqual({ title: "Owls", contacts: { 0: { name: "Rosa", phone: "1" }, 1: { name: "Nils" } }, travel: ["cane", "walks"] });
  });

  it("leaves out what the framework sends along, and files", () => {
    expect(readForm(form(["$ACTION_ID_1", "x"], ["$ACTION_REF_1", "y"], ["a", "1"], ["upload", new Blob(["x"])]))).toEqual({ a: "1", upload: undefined });
  });

  it.each(["__proto__.admin", "__proto__", "constructor.prototype.admin", "a.__proto__.admin", "prototype.admin", "a.constructor.name"])(
    "cannot reach a prototype by the name %s",
    (name) => {
      const data = readForm(form([name, "yes"], ["b", "1"]));
      expect(({} as Record<string, unknown>).admin).toBeUndefined();
      expect(Object.getPrototypeOf(data)).toBe(Object.prototype);
      expect(JSON.stringify(data)).not.toContain("yes");
      expect(data.b).toBe("1");
    },
  );

  it("takes names that every object has for names like any other", () => {
    const data = readForm(form(["toString", "1"], ["hasOwnProperty.x", "2"], ["", "3"]));
    expect(Object.entries(data)).toEqual([["toString", "1"], ["hasOwnProperty", { x: "2" }], ["", "3"]]);
    expect(typeof Object.prototype.hasOwnProperty).toBe("function");
  });

  it("does not mix a value and what is nested under the same name", () => {
    expect(readForm(form(["a", "1"], ["a.b", "2"]))).toEqual({ a: { b: "2" } });
    expect(readForm(form(["a.b", "2"], ["a", "1"]))).toEqual({ a: "1" });
  });
});

it("what was typed comes back under its own names, and secrets do not", () => {
  const typed = typedValues(form(["email", "a@b.c"], ["password", "hush"], ["secret", "hush"], ["travel", "cane"], ["travel", "walks"], ["c.0.name", "R"]));
  expect(typed).toEqual({ email: "a@b.c", travel: ["cane", "walks"], "c.0.name": "R" });
});
