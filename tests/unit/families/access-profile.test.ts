import { describe, expect, it } from "vitest";
import { guideNeedOf, type AccessProfile } from "@/lib/families/access-profile";
import { profile } from "../../support/world";

const needOf = (changes: Partial<AccessProfile>) => guideNeedOf({ ...profile, ...changes });

describe("how much of a guide a person needs", () => {
  it.each([
    [["all the time"], "throughout"],
    [["all the time", "roads"], "throughout"],
    [["uneven ground"], "at-times"],
    [["only if I ask"], "at-times"],
    [["not needed"], "not-needed"],
    [["not needed", "roads"], "at-times"],
  ] as const)("%j: %s", (guideWhen, need) => expect(needOf({ guideWhen: [...guideWhen] })).toBe(need));

  it("that is not sure is planned for until somebody has talked to the family", () => {
    expect(needOf({ guideWhen: ["not sure"] })).toBe("at-times");
  });

  it("by voice alone binds nobody's arm all day, unless the family says all the time", () => {
    expect(needOf({ guideHold: "spoken directions only", guideWhen: ["roads"] })).toBe("at-times");
    expect(needOf({ guideHold: "spoken directions only", guideWhen: ["all the time"] })).toBe("throughout");
  });

  it("is none where the family says so, however a guide would be held", () => {
    expect(needOf({ guideHold: "spoken directions only", guideWhen: ["not needed"] })).toBe("not-needed");
  });
});
