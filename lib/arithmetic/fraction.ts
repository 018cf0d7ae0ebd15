import { exact, plain } from "./exact";
import type { DecimalString } from "./decimal";

/** An exact ratio of whole numbers, for sums of quotients where even eighty digits could end on the wrong side of a half. */
export class Fraction {
  private constructor(
    private readonly numerator: bigint,
    private readonly denominator: bigint,
  ) {}

  static readonly zero = new Fraction(0n, 1n);

  static of(value: number): Fraction {
    return new Fraction(BigInt(value), 1n);
  }

  static from(text: DecimalString): Fraction {
    const [whole = "0", decimals = ""] = plain(exact(text)).split(".");
    return Fraction.reduced(BigInt(whole + decimals), 10n ** BigInt(decimals.length));
  }

  private static reduced(numerator: bigint, denominator: bigint): Fraction {
    if (denominator === 0n) throw new RangeError("Cannot divide by zero.");
    let [a, b] = [numerator < 0n ? -numerator : numerator, denominator < 0n ? -denominator : denominator];
    while (b > 0n) [a, b] = [b, a % b];
    const divisor = denominator < 0n ? -a : a;
    return new Fraction(numerator / divisor, denominator / divisor);
  }

  plus(other: Fraction): Fraction {
    return Fraction.reduced(this.numerator * other.denominator + other.numerator * this.denominator, this.denominator * other.denominator);
  }

  minus(other: Fraction): Fraction {
    return this.plus(new Fraction(-other.numerator, other.denominator));
  }

  times(other: Fraction): Fraction {
    return Fraction.reduced(this.numerator * other.numerator, this.denominator * other.denominator);
  }

  over(other: Fraction): Fraction {
    return Fraction.reduced(this.numerator * other.denominator, this.denominator * other.numerator);
  }

  get isZero(): boolean {
    return this.numerator === 0n;
  }

  /** The nearest whole number, half away from zero. */
  rounded(): number {
    const size = this.numerator < 0n ? -this.numerator : this.numerator;
    const nearest = (size * 2n + this.denominator) / (this.denominator * 2n);
    return Number(this.numerator < 0n ? -nearest : nearest);
  }
}
