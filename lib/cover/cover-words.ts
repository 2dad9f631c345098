const NUMBER_WORDS = [
  "no",
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
] as const;

const MONTHS = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
] as const;

/** "one" to "twelve", digits above; "no" for zero. */
export function numberWord(count: number): string {
  return NUMBER_WORDS[count] ?? `${count}`;
}

/** "1 person", "2 people". */
export function counted(count: number, singular: string, plural: string): string {
  return `${count} ${count === 1 ? singular : plural}`;
}

/** "one guide", "two guides". */
export function countedInWords(count: number, singular: string, plural: string): string {
  return `${numberWord(count)} ${count === 1 ? singular : plural}`;
}

export function people(count: number): string {
  return counted(count, "person", "people");
}

export function adults(count: number): string {
  return counted(count, "adult", "adults");
}

/** "A", "A and B", "A, B and C". */
export function joinWithAnd(parts: readonly string[]): string {
  const last = parts.at(-1) ?? "";
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(", ")} and ${last}`;
}

/** Names joined with "and"; beyond four, the first three and how many more. */
export function listNames(names: readonly string[]): string {
  if (names.length <= 4) return joinWithAnd(names);
  return joinWithAnd([...names.slice(0, 3), `${names.length - 3} more`]);
}

/** The verb for that many: `verb(1, "needs", "need")`. */
export function verb(count: number, singular: string, plural: string): string {
  return count === 1 ? singular : plural;
}

export function capitalized(sentence: string): string {
  return sentence.charAt(0).toUpperCase() + sentence.slice(1);
}

/** True for a real day written YYYY-MM-DD; "2026-02-30" is not one. */
export function isIsoDate(text: string): boolean {
  const [year, month, day] = isoParts(text);
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text) || month < 1 || month > 12 || day < 1) return false;
  return day <= new Date(Date.UTC(year, month, 0)).getUTCDate();
}

function isoParts(text: string): [year: number, month: number, day: number] {
  const [year = NaN, month = NaN, day = NaN] = text.split("-").map(Number);
  return [year, month, day];
}

/** "3 January", with the year where it is not that of `besideDate`. Both YYYY-MM-DD. */
export function dayInWords(date: string, besideDate: string): string {
  const [year, month, day] = isoParts(date);
  const dayAndMonth = `${day} ${MONTHS[month - 1] ?? ""}`;
  return date.slice(0, 4) === besideDate.slice(0, 4) ? dayAndMonth : `${dayAndMonth} ${year}`;
}
