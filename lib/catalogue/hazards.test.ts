import { describe, expect, it } from "vitest";
import first from "@/db/seed/catalogue/item-kinds-1.json";
import second from "@/db/seed/catalogue/item-kinds-2.json";
import { hazardsOf, markedHazards, recordName, stoppingHazards, workCautions } from "./hazards";

const kinds = [...first, ...second];
const kind = (key: string) => {
  const found = kinds.find((one) => one.key === key);
  if (!found) throw new Error(`no ${key}`);
  return found;
};

describe("hazards of the catalogue", () => {
  it("knows every hazard that an item kind or a part names", () => {
    const named = kinds.flatMap((one) => [...one.hazards, ...one.parts.flatMap((part) => (part.hazard === null ? [] : [part.hazard]))]);
    expect(named.length).toBeGreaterThan(50);
    expect(named.filter((key) => hazardsOf([key]).length !== 1)).toEqual([]);
  });

  it("marks what can kill and leaves out what all scrap has", () => {
    expect(markedHazards(kind("microwave-oven").hazards).map((hazard) => hazard.key)).toEqual(["stored-charge", "beryllium", "pcb"]);
    expect(markedHazards(kind("box-fan").hazards)).toEqual([]);
  });

  it("names the record that a held kind waits for", () => {
    for (const one of kinds.filter((each) => each.holdUntil !== null)) {
      expect(stoppingHazards(one.hazards).map((hazard) => hazard.record)).toContain(one.holdUntil);
      expect(recordName(one.holdUntil ?? "")).not.toBe("Record");
    }
  });

  it("says each sentence once before the cover comes off, the worst first", () => {
    const lines = workCautions(kind("microwave-oven").hazards, null);
    expect(lines[0]).toContain("can hold a charge that kills");
    expect(new Set(lines).size).toBe(lines.length);
    expect(workCautions(kind("refrigerator").hazards, "refrigerant-statement").join(" ")).not.toContain("recovers the refrigerant");
  });
});
