/** Money is integer cents with a currency; it becomes a decimal only in words. */
export type Money = { cents: number; currency: string };

export function moneyInWords({ cents, currency }: Money): string {
  const whole = cents % 100 === 0;
  return new Intl.NumberFormat("en-US", {
    style: "currency",
    currency: currency.toUpperCase(),
    minimumFractionDigits: whole ? 0 : 2,
    maximumFractionDigits: 2,
  }).format(cents / 100);
}

/**
 * Reads what a person types for an amount ("12", "$12.50", "1,200").
 * Returns cents, or null when it is not an amount.
 */
export function centsFromTyped(typed: string): number | null {
  const match = /^\$?\s*(\d{1,3}(?:,?\d{3})*)(?:\.(\d{1,2}))?$/.exec(typed.trim());
  if (!match) return null;
  const [, whole = "", part = ""] = match;
  return Number(whole.replaceAll(",", "")) * 100 + Number(part.padEnd(2, "0"));
}

export function typedFromCents(cents: number): string {
  return cents % 100 === 0 ? String(cents / 100) : (cents / 100).toFixed(2);
}
