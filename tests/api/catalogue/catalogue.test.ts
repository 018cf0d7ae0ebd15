import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import * as grades from "@/app/api/o/[outfit]/grades/route";
import * as oneGrade from "@/app/api/o/[outfit]/grades/[id]/route";
import * as kinds from "@/app/api/o/[outfit]/item-kinds/route";
import * as oneKind from "@/app/api/o/[outfit]/item-kinds/[id]/route";
import { database } from "@/db/client";
import { auditLog } from "@/db/schema";
import seedGrades from "@/db/seed/catalogue/grades.json";
import first from "@/db/seed/catalogue/item-kinds-1.json";
import second from "@/db/seed/catalogue/item-kinds-2.json";
import type { Grade, ItemKind, ItemKindSheet } from "@/lib/catalogue/schema";
import { newId } from "@/lib/ids";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";

type Page<T> = { items: T[]; nextCursor: string | null };

let outfit: TestOutfit;
let other: TestOutfit;

beforeAll(async () => {
  outfit = await makeOutfit();
  other = await makeOutfit();
});

const seeGrades = (query: Record<string, string> = {}, of = outfit) => call<Page<Grade>>(grades.GET, of, { key: of.keys.collector, query });
const add = (body: unknown, role: "owner" | "bookkeeper" | "collector" | "sorter" = "sorter", headers: Record<string, string> = {}) =>
  call<Grade>(grades.POST, outfit, { key: outfit.keys[role], body, headers });
const change = (id: string, version: number, body: unknown, role: "owner" | "collector" = "owner") =>
  call<Grade>(oneGrade.PATCH, outfit, { method: "PATCH", key: outfit.keys[role], params: { id }, body, headers: { "if-match": `"${version}"` } });

describe("grades", () => {
  it("a new outfit has the whole catalogue on one page, in its order", async () => {
    const { body } = await seeGrades({}, other);
    expect(body.items.map((grade) => grade.key)).toEqual(seedGrades.map((grade) => grade.key));
    expect(body.nextCursor).toBeNull();
  });

  it("come in pages that miss and repeat nothing, by family, and without the hidden ones", async () => {
    const seen: (string | null)[] = [];
    let cursor: string | null = null;
    do {
      const page: Page<Grade> = (await seeGrades({ limit: "17", ...(cursor === null ? {} : { cursor }) }, other)).body;
      seen.push(...page.items.map((grade) => grade.key));
      cursor = page.nextCursor;
    } while (cursor !== null);
    expect(seen).toEqual(seedGrades.map((grade) => grade.key));
    expect(new Set((await seeGrades({ family: "copper" })).body.items.map((grade) => grade.family))).toEqual(new Set(["copper"]));
    expect((await seeGrades({ active: "false" }, other)).body.items).toEqual([]);
  });

  it("of the outfit's own are added last, once for one key, and not twice by one name", async () => {
    const headers = { "idempotency-key": newId() };
    const body = { name: "Lamp bases", family: "brass", what: "Bases of lamps", typicalRecovery: "0.8" };
    const made = await add(body, "sorter", headers);
    expect(made.status, JSON.stringify(made.body)).toBe(201);
    expect(made.body).toMatchObject({ key: null, name: "Lamp bases", family: "brass", typicalRecovery: "0.8", notThis: "", active: true, version: 1 });
    expect((await add(body, "sorter", headers)).body).toEqual(made.body);
    const twice = await add({ ...body, name: "lamp bases" });
    expect(twice.status).toBe(409);
    expect(twice.problem.errors?.[0]?.path).toBe("name");
    expect((await seeGrades()).body.items.at(-1)?.id).toBe(made.body.id);
    expect((await seeGrades({}, other)).body.items.map((grade) => grade.name)).not.toContain("Lamp bases");
  });

  it("are changed by whoever saw them last, and the books of changes say so", async () => {
    const { id } = (await add({ name: "Test grade", family: "copper", what: "words" })).body;
    const hidden = await change(id, 1, { active: false, what: "" });
    expect(hidden.body, JSON.stringify(hidden.body)).toMatchObject({ active: false, what: "", version: 2, name: "Test grade" });
    expect(hidden.headers.get("etag")).toBe('"2"');
    const stale = await change(id, 1, { active: true });
    expect(stale.status).toBe(412);
    expect(stale.problem.current).toMatchObject({ id, version: 2 });
    const logged = await database().select().from(auditLog).where(eq(auditLog.subjectId, id));
    expect(logged.map((row) => row.action).toSorted()).toEqual(["add-grade", "change-grade"]);
  });

  it("cannot take another grade's name, and need a version and a change", async () => {
    const id = outfit.grade("no2-copper");
    const [bright] = (await seeGrades()).body.items;
    const taken = await change(id, 1, { name: bright?.name });
    expect([taken.status, taken.problem.errors?.[0]?.path]).toEqual([409, "name"]);
    expect((await change(id, 1, {})).status).toBe(422);
    const bare = await call(oneGrade.PATCH, outfit, { method: "PATCH", key: outfit.keys.owner, params: { id }, body: { active: false } });
    expect([bare.status, bare.problem.errors?.[0]?.path]).toEqual([422, "If-Match"]);
  });

  it.each([
    [{ family: "copper" }, "name"],
    [{ name: "  ", family: "copper" }, "name"],
    [{ name: "x".repeat(121), family: "copper" }, "name"],
    [{ name: "two\nlines", family: "copper" }, "name"],
    [{ name: "A grade" }, "family"],
    [{ name: "A grade", family: "gold" }, "family"],
    [{ name: "A grade", family: "copper", typicalRecovery: "1.2" }, "typicalRecovery"],
    [{ name: "A grade", family: "copper", typicalRecovery: 0.5 }, "typicalRecovery"],
    [{ name: "A grade", family: "copper", typicalRecovery: "NaN" }, "typicalRecovery"],
    [{ name: "A grade", family: "copper", what: "x".repeat(2001) }, "what"],
    [{ name: "A grade", family: "copper", color: "red" }, "color"],
    [{ id: "7", name: "A grade", family: "copper" }, "id"],
  ])("are refused as %j with the field named", async (body, path) => {
    const answer = await add(body);
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toContain(path);
  });

  it("are changed by owner and sorter only, and only in their own outfit", async () => {
    expect((await add({ name: "B grade", family: "copper" }, "collector")).status).toBe(403);
    expect((await add({ name: "B grade", family: "copper" }, "bookkeeper")).status).toBe(403);
    expect((await change(outfit.grade("shred"), 1, { active: false }, "collector")).status).toBe(403);
    for (const id of [other.grade("shred"), newId(), "🪙"]) expect((await change(id, 1, { active: false })).status).toBe(404);
  });
});

describe("item kinds", () => {
  it("come with their tile, group, weight, hazards and what they are held for", async () => {
    const { body } = await call<Page<ItemKind>>(kinds.GET, outfit, { key: outfit.keys.sorter });
    const catalogue = [...first, ...second];
    expect(body.items.map((kind) => kind.key)).toEqual(catalogue.map((kind) => kind.key));
    expect(body.items.find((kind) => kind.key === "refrigerator")).toMatchObject({
      tileName: "Refrigerator",
      group: "cooling & heating",
      typicalWeight: "185",
      holdUntil: "refrigerant-statement",
    });
    expect(body.items.map((kind) => kind.hazards)).toEqual(catalogue.map((kind) => kind.hazards));
  });

  it("open their breakdown sheet, parts in order and grades by the outfit's own names", async () => {
    const id = outfit.kind("upright-vacuum");
    const { body } = await call<ItemKindSheet>(oneKind.GET, outfit, { key: outfit.keys.sorter, params: { id } });
    const seed = first.find((kind) => kind.key === "upright-vacuum");
    expect(body.parts.map((part) => part.key)).toEqual(seed?.parts.map((part) => part.key));
    expect(body.parts[0]).toMatchObject({
      where: seed?.parts[0]?.where,
      grade: { key: seed?.parts[0]?.grade, id: outfit.grade(seed?.parts[0]?.grade ?? "") },
      oftenMissed: seed?.parts[0]?.oftenMissed,
    });
    expect(body.parts.every((part) => part.grade.id !== null)).toBe(true);
  });

  it("of another outfit do not exist", async () => {
    for (const id of [other.kind("printer"), newId(), "🪙"]) {
      expect((await call(oneKind.GET, outfit, { key: outfit.keys.owner, params: { id } })).status).toBe(404);
    }
  });
});
