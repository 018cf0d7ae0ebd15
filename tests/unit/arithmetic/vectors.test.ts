import { describe, expect, it } from "vitest";
import { allocate, jointCost } from "@/lib/arithmetic/allocate";
import { issue, receive, type StockState } from "@/lib/arithmetic/average";
import { fixed } from "@/lib/arithmetic/decimal";
import { lineAmount } from "@/lib/arithmetic/price";
import { scaleTolerance } from "@/lib/arithmetic/tolerance";
import { whyItChanged, type SalesByGrade } from "@/lib/arithmetic/why";
import allocation from "../../vectors/allocation.json";
import extension from "../../vectors/extension.json";
import joint from "../../vectors/joint-cost.json";
import average from "../../vectors/moving-average.json";
import tolerance from "../../vectors/scale-tolerance.json";
import why from "../../vectors/why-it-changed.json";

type AverageStep = { receive?: string; issue?: string; costMinor: number; after: { quantity: string; costMinor: number } };
type WhyMonth = Record<string, [quantity: string, salesMinor: number]>;

const numbered = <T>(cases: T[]) => cases.map((given, index) => [index + 1, given] as const);
const month = (grades: WhyMonth): SalesByGrade =>
  Object.fromEntries(Object.entries(grades).map(([grade, [quantity, salesMinor]]) => [grade, { quantity, salesMinor }]));

describe("the arithmetic vectors hold", () => {
  it("have cases to check", () => {
    const counts = [allocation, extension, joint, average, tolerance, why].map((file) => file.cases.length);
    expect(Math.min(...counts)).toBeGreaterThan(10);
  });

  it.each(numbered(extension.cases))("line amount %i", (_number, given) => {
    const line = { quantity: given.quantity, unit: "lb", price: given.price, per: "lb", exponent: given.exponent } as const;
    expect(lineAmount(line)).toBe(given.amountMinor);
  });

  it.each(numbered(allocation.cases))("split %i", (_number, given) => {
    expect(allocate(given.totalMinor, given.weights)).toEqual(given.partsMinor);
  });

  it.each(numbered(joint.cases))("joint cost %i", (_number, given) => {
    expect(jointCost(given.costMinor, given.outputs)).toEqual(given.partsMinor);
  });

  it.each(numbered(average.cases))("moving average %i", (_number, given) => {
    let state: StockState = { quantity: "0", costMinor: 0 };
    for (const step of given.steps as AverageStep[]) {
      if (step.receive !== undefined) {
        state = receive(state, step.receive, step.costMinor);
      } else {
        const issued = issue(state, step.issue ?? "");
        expect(issued.costMinor).toBe(step.costMinor);
        state = issued.state;
      }
      expect({ quantity: fixed(state.quantity, 4), costMinor: state.costMinor }).toEqual(step.after);
    }
  });

  it.each(numbered(tolerance.cases))("class III tolerance %i", (_number, given) => {
    expect(scaleTolerance({ load: given.load, division: given.division, scaleClass: "III" })).toBe(given.tolerance);
  });

  it.each(numbered(why.cases))("why it changed %i", (_number, given) => {
    const found = whyItChanged(month(given.before as unknown as WhyMonth), month(given.now as unknown as WhyMonth));
    expect({ price: found.priceMinor, mix: found.mixMinor, volume: found.volumeMinor, change: found.changeMinor }).toEqual(given.effectsMinor);
  });
});
