import { beforeAll, describe, expect, it } from "vitest";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as voiding from "@/app/api/o/[outfit]/pickups/[id]/void/route";
import type { Pickup } from "@/lib/pickups/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";

type Page = { items: Pickup[]; nextCursor: string | null };

let outfit: TestOutfit;

const list = (query: Record<string, string> = {}, of = outfit) => call<Page>(pickups.GET, of, { key: of.keys.sorter, query });
const days = (page: Page) => page.items.map((pickup) => pickup.pickedUpOn);

beforeAll(async () => {
  outfit = await makeOutfit();
  for (const pickedUpOn of ["2026-01-03", "2026-01-01", "2026-01-02", "2026-01-02", "2026-01-05"]) {
    const made = await call<Pickup>(pickups.POST, outfit, {
      key: outfit.keys.owner,
      body: { pickedUpOn, source: "call-out", items: [{ itemKindId: outfit.kind("printer"), count: 1 }], paidMinor: 100 },
    });
    expect(made.status).toBe(201);
    if (pickedUpOn === "2026-01-05") await call(voiding.POST, outfit, { key: outfit.keys.owner, params: { id: made.body.id }, body: {} });
  }
});

describe("the list of pickups", () => {
  it("is newest first and says what each holds, without money for those who may not see it", async () => {
    const { body } = await list();
    expect(days(body)).toEqual(["2026-01-05", "2026-01-03", "2026-01-02", "2026-01-02", "2026-01-01"]);
    expect(body.items[1]).toMatchObject({
      state: "open",
      kinds: [{ name: "Printer", count: 1 }],
      estimatedWeight: "22.75",
      remainingWeight: "22.75",
      paidMinor: null,
      paidFrom: null,
    });
    expect(body.items[0]).toMatchObject({ state: "void", remainingWeight: "0" });
  });

  it("comes in pages that miss and repeat nothing, also within one day", async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Page = (await list({ limit: "2", ...(cursor === null ? {} : { cursor }) })).body;
      seen.push(...page.items.map((pickup) => pickup.id));
      cursor = page.nextCursor;
    } while (cursor !== null);
    expect(seen).toEqual((await list()).body.items.map((pickup) => pickup.id));
    expect(new Set(seen).size).toBe(5);
  });

  it("is filtered by state and by days, both days counted", async () => {
    expect(days((await list({ state: "void" })).body)).toEqual(["2026-01-05"]);
    expect(days((await list({ state: "open", from: "2026-01-02", to: "2026-01-03" })).body)).toEqual(["2026-01-03", "2026-01-02", "2026-01-02"]);
    expect((await list({ state: "worked-out" })).body).toEqual({ items: [], nextCursor: null });
  });

  it("holds nothing of another outfit", async () => {
    expect((await list({}, await makeOutfit())).body.items).toEqual([]);
  });

  it.each([
    [{ limit: "0" }, "limit"],
    [{ limit: "201" }, "limit"],
    [{ limit: "many" }, "limit"],
    [{ state: "shut" }, "state"],
    [{ from: "2026-02-30" }, "from"],
    [{ from: "2026-02-02", to: "2026-02-01" }, "to"],
    [{ cursor: "nonsense" }, "cursor"],
    [{ cursor: Buffer.from(JSON.stringify(["🪙", "🪙"])).toString("base64url") }, "cursor"],
    [{ sort: "place" }, "sort"],
  ])("answers 422 to %j and names the field", async (query, path) => {
    const answer = await list(query as unknown as Record<string, string>);
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toContain(path);
  });
});
