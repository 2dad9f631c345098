import { describe, expect, it } from "vitest";
import { ceilFraction, compareFractions, formatFraction, fraction, sumFractions } from "@/lib/cover/fraction";

describe("exact fractions", () => {
  it("a quarter, a quarter and a half are one adult exactly", () => {
    const sum = sumFractions([fraction(1, 4), fraction(1, 4), fraction(1, 2)]);
    expect(compareFractions(sum, fraction(1))).toBe(0);
    expect(ceilFraction(sum)).toBe(1);
  });

  it("ten tenths are one, where floating point says 0.9999999999999999", () => {
    const tenths = Array.from({ length: 10 }, () => fraction(1, 10));
    expect(ceilFraction(sumFractions(tenths))).toBe(1);
    expect(tenths.reduce((sum) => sum + 0.1, 0)).not.toBe(1);
  });

  it("the least bit over one needs a second adult", () => {
    expect(ceilFraction(sumFractions([fraction(1), fraction(1, 1_000_003)]))).toBe(2);
  });

  it("rounds up towards the greater number, also below zero", () => {
    expect([fraction(7, 2), fraction(-7, 2), fraction(0), fraction(3)].map(ceilFraction)).toEqual([4, -3, 0, 3]);
  });

  it("does not overflow on awkward ratios", () => {
    const primes = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37, 41, 43, 47];
    const sum = sumFractions(primes.flatMap((n) => Array.from({ length: n }, () => fraction(1, n))));
    expect(compareFractions(sum, fraction(primes.length))).toBe(0);
  });

  it("keeps lowest terms and a positive denominator", () => {
    expect(fraction(2, -4)).toEqual(fraction(-1, 2));
  });

  it("reads as people write it", () => {
    const written = [fraction(3), fraction(4, 5), fraction(5, 4), fraction(-5, 4)].map(formatFraction);
    expect(written).toEqual(["3", "4/5", "1 1/4", "-1 1/4"]);
  });

  it("refuses a denominator of zero and parts of numbers", () => {
    expect(() => fraction(1, 0)).toThrow(RangeError);
    expect(() => fraction(0.5)).toThrow(RangeError);
  });
});
