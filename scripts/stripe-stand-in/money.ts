/** An amount in a currency's smallest unit as a person reads it: money(1250, "usd") is "$12.50". */
export function money(smallestUnits: number, currency: string): string {
  const format = new Intl.NumberFormat("en-US", { style: "currency", currency });
  const digits = format.resolvedOptions().maximumFractionDigits ?? 2;
  return format.format(smallestUnits / 10 ** digits);
}
