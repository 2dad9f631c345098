export const answers = ["yes", "maybe", "no"] as const;
export type Answer = (typeof answers)[number];
export const tasks = ["chaperone", "leader"] as const;
export type Task = (typeof tasks)[number];

export type HelperRecord = {
  personId: string;
  isAdult: boolean;
  clearedUntil: string | null;
  guidesLeft: boolean;
  guidesRight: boolean;
  pushesChair: boolean;
  firstAid: boolean;
  drives: boolean;
};

export type HelperAnswer = {
  id: string;
  outingId: string;
  personId: string;
  name: string;
  email: string;
  task: Task;
  state: "asked" | Answer;
  askedAt: string;
  answeredAt: string | null;
  record: HelperRecord | null;
};

/** A clearance counts on a day up to and including its last one. */
export function isClearedOn(record: Pick<HelperRecord, "clearedUntil"> | null, day: string): boolean {
  return record?.clearedUntil != null && record.clearedUntil >= day;
}

export function abilitiesInWords(record: HelperRecord | null): string {
  if (!record) return "Nothing noted yet.";
  const can: string[] = [];
  if (record.guidesLeft && record.guidesRight) can.push("guides on either side");
  else if (record.guidesLeft) can.push("guides with the left arm");
  else if (record.guidesRight) can.push("guides with the right arm");
  if (record.pushesChair) can.push("pushes a chair");
  if (record.firstAid) can.push("first aid");
  if (record.drives) can.push("drives");
  return can.length === 0 ? "Does not guide." : `${can.join(", ")}.`.replace(/^./, (first) => first.toUpperCase());
}
