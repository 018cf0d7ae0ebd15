import { describe, expect, it } from "vitest";
import { addDraw, drawsOf, fieldOf, readDraws, typedTare } from "./typed-draws";

describe("weights typed at the bench", () => {
  it("a comma decimal is read as a decimal, not as ten times the weight", () => {
    expect(readDraws([{ gross: "14,25", tare: "1.85 lb" }], "lb").net).toBe("12.4");
  });

  it("several draws make one weigh-in, and a last one left empty is left out", () => {
    const draws = [
      { gross: "10", tare: "2" },
      { gross: "9.5", tare: "2" },
      { gross: "", tare: "2" },
    ];
    expect(readDraws(draws, "lb").net).toBe("15.5");
    expect(drawsOf(draws, "lb")).toEqual({
      draws: [
        { gross: "10", tare: "2" },
        { gross: "9.5", tare: "2" },
      ],
    });
  });

  it("text that is no weight is sent as it is, so that the check can name the field", () => {
    expect(drawsOf([{ gross: "abc", tare: "" }], "lb")).toEqual({ gross: "abc", tare: "0" });
  });

  it("a bin's tare is typed to the last decimal, so that it is the one that is booked", () => {
    expect(["0", "4.5", "1.8500", "1.8567", "1250"].map(typedTare)).toEqual(["0.00", "4.50", "1.85", "1.8567", "1250.00"]);
  });

  it("no draw is put under one that puts nothing in", () => {
    expect(addDraw([{ gross: "", tare: "2" }], "2", "lb")).toHaveLength(1);
    expect(addDraw([{ gross: "1", tare: "2" }], "2", "lb")).toHaveLength(1);
    expect(addDraw([{ gross: "5", tare: "2" }], "2", "lb")).toHaveLength(2);
  });

  it("a message about an earlier draw leads to its row, one about the last draw to the readout", () => {
    expect(fieldOf("draws.0.tare", 2)).toBe("draw-0");
    expect(fieldOf("draws.1.tare", 2)).toBe("tare");
    expect(fieldOf("gross", 1)).toBe("gross");
    expect(fieldOf("binId", 1)).toBe("binId");
  });
});
