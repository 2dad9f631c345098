/**
 * Exact fractions, so that 1/4 + 1/4 + 1/2 is one adult and never 1.0000000000000002 of one.
 * Always in lowest terms with a positive denominator. BigInt, so no policy can overflow it.
 */
export type Fraction = { readonly numerator: bigint; readonly denominator: bigint };

const ZERO = BigInt(0);
const ONE = BigInt(1);

function greatestCommonDivisor(a: bigint, b: bigint): bigint {
  let [larger, smaller] = [a < ZERO ? -a : a, b < ZERO ? -b : b];
  while (smaller !== ZERO) [larger, smaller] = [smaller, larger % smaller];
  return larger;
}

function reduced(numerator: bigint, denominator: bigint): Fraction {
  const divisor = greatestCommonDivisor(numerator, denominator);
  const sign = denominator < ZERO ? -ONE : ONE;
  return { numerator: (sign * numerator) / divisor, denominator: (sign * denominator) / divisor };
}

/**
 * The fraction `numerator / denominator` of two whole numbers.
 * @throws RangeError when either is not a whole number or the denominator is zero.
 */
export function fraction(numerator: number, denominator = 1): Fraction {
  if (denominator === 0) throw new RangeError("A fraction cannot have a denominator of zero.");
  return reduced(BigInt(numerator), BigInt(denominator));
}

/** The exact sum; of no terms, zero. */
export function sumFractions(terms: readonly Fraction[]): Fraction {
  return terms.reduce(
    (sum, term) =>
      reduced(
        sum.numerator * term.denominator + term.numerator * sum.denominator,
        sum.denominator * term.denominator,
      ),
    fraction(0),
  );
}

/** Negative, zero or positive as `a` is less than, equal to or greater than `b`. */
export function compareFractions(a: Fraction, b: Fraction): number {
  const difference = a.numerator * b.denominator - b.numerator * a.denominator;
  if (difference === ZERO) return 0;
  return difference < ZERO ? -1 : 1;
}

/** The smallest whole number that is not less than the fraction. */
export function ceilFraction(value: Fraction): number {
  const towardsZero = value.numerator / value.denominator;
  const hasRest = value.numerator % value.denominator !== ZERO;
  return Number(hasRest && value.numerator > ZERO ? towardsZero + ONE : towardsZero);
}

/** As people write it: "3", "4/5", "1 1/4". */
export function formatFraction(value: Fraction): string {
  const { numerator, denominator } = value;
  if (denominator === ONE) return `${numerator}`;
  const whole = numerator / denominator;
  if (whole === ZERO) return `${numerator}/${denominator}`;
  const rest = numerator % denominator;
  return `${whole} ${rest < ZERO ? -rest : rest}/${denominator}`;
}
