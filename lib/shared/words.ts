/** Ends a text with a full stop unless it ends with one already, as "3 p.m." does. */
export function sentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`;
}

/** "1 person", "2 people" */
export function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}
