/** A small repeatable source of chance: the same seed gives the same outfit. Only whole numbers come out of it. */
export class Random {
  constructor(private state: number) {}

  /** The next 32 bits (a multiply-xor-shift generator; quality only has to look natural). */
  private next(): number {
    this.state = (this.state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(this.state ^ (this.state >>> 15), 1 | this.state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return (mixed ^ (mixed >>> 14)) >>> 0;
  }

  /** A whole number from `least` to `most`, both possible. */
  between(least: number, most: number): number {
    return least + (this.next() % (most - least + 1));
  }

  /** True `percent` times in a hundred. */
  chance(percent: number): boolean {
    return this.between(1, 100) <= percent;
  }

  pick<T>(list: readonly T[]): T {
    const item = list[this.between(0, list.length - 1)];
    if (item === undefined) throw new RangeError("nothing to pick from");
    return item;
  }

  /** A UUID in the form of a version 7 one, for records whose id must be the same every time. */
  id(at: Date): string {
    const time = at.getTime().toString(16).padStart(12, "0");
    const hex = (digits: number) => this.next().toString(16).padStart(8, "0").slice(0, digits);
    return `${time.slice(0, 8)}-${time.slice(8)}-7${hex(3)}-a${hex(3)}-${hex(8)}${hex(4)}`;
  }
}

/** Hundredths as a decimal string: 1240 is "12.40". Weights of the demo are whole hundredths, so no sum of them is rounded. */
export const hundredths = (count: number): string => `${Math.trunc(count / 100)}.${String(count % 100).padStart(2, "0")}`;

/** Thousandths as a decimal string: 85 is "0.085". */
export const thousandths = (count: number): string => `${Math.trunc(count / 1000)}.${String(count % 1000).padStart(3, "0")}`;

/** A decimal string with up to two places that matter, as whole hundredths: "12.4000" is 1240. */
export function toHundredths(text: string): number {
  const [whole = "0", part = ""] = text.split(".");
  return Number.parseInt(whole, 10) * 100 + Number.parseInt(part.padEnd(2, "0").slice(0, 2), 10);
}
