import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { compare } from "./decimal";
import { SCALE_CLASSES, scaleTolerance } from "./tolerance";

describe("a scale's tolerance", () => {
  it("never shrinks as the load grows, and is at least one division", () => {
    fc.assert(
      fc.property(fc.nat(20_000), fc.nat(20_000), fc.constantFrom(...SCALE_CLASSES), (a, b, scaleClass) => {
        const [light, heavy] = a < b ? [a, b] : [b, a];
        const at = (load: number) => scaleTolerance({ load: String(load), division: "0.5", scaleClass });
        expect(compare(at(light), at(heavy))).toBeLessThanOrEqual(0);
        expect(compare(at(light), "0.5")).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it("is refused for a scale without divisions, and for a negative load", () => {
    expect(() => scaleTolerance({ load: "1", division: "0", scaleClass: "III" })).toThrow(RangeError);
    expect(() => scaleTolerance({ load: "-1", division: "1", scaleClass: "III" })).toThrow(RangeError);
  });
});
