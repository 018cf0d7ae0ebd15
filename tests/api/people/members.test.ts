import { beforeEach, describe, expect, it } from "vitest";
import * as me from "@/app/api/me/route";
import * as member from "@/app/api/o/[outfit]/members/[id]/route";
import * as members from "@/app/api/o/[outfit]/members/route";
import * as settings from "@/app/api/o/[outfit]/settings/route";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import { newId } from "@/lib/ids";
import type { Me, Member, Settings } from "@/lib/people/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { makePerson, seat, sessionOf } from "./person";

let outfit: TestOutfit;
let other: TestOutfit;

beforeEach(async () => {
  outfit = await makeOutfit();
  other = await makeOutfit();
});

type List = { items: Member[] };
const change = (id: string, role: string, version = 1, where = outfit) =>
  call<Member>(member.PATCH, where, { key: where.keys.owner, method: "PATCH", params: { id }, headers: { "if-match": `"${version}"` }, body: { role } });
const remove = (id: string, key = outfit.keys.owner) => call(member.DELETE, outfit, { key, method: "DELETE", params: { id } });

describe("members", () => {
  it("everybody sees the crew; only the owner sees emails", async () => {
    const owner = await call<List>(members.GET, outfit, { key: outfit.keys.owner });
    expect(owner.body.items.map((one) => one.role).sort()).toEqual(["bookkeeper", "collector", "owner", "sorter"]);
    expect(owner.body.items.every((one) => one.email?.includes("@"))).toBe(true);
    const sorter = await call<List>(members.GET, outfit, { key: outfit.keys.sorter });
    expect(sorter.body.items.map((one) => one.email)).toEqual([null, null, null, null]);
  });

  it("a role changes once a version", async () => {
    const changed = await change(outfit.members.sorter, "bookkeeper");
    expect(changed.body).toMatchObject({ role: "bookkeeper", version: 2 });
    expect(changed.headers.get("etag")).toBe('"2"');
    const stale = await change(outfit.members.sorter, "collector");
    expect(stale.status).toBe(412);
    expect(stale.problem).toMatchObject({ current: { role: "bookkeeper", version: 2 } });
  });

  it("the last owner is neither removed nor given another role", async () => {
    expect((await change(outfit.members.owner, "sorter")).status).toBe(409);
    const refused = await remove(outfit.members.owner);
    expect(refused.status).toBe(409);
    expect(refused.problem.detail).toBe("Owner is the only owner. Make somebody else an owner first.");
  });

  it("V2.3.4: of two owners who step down at once, one stays", async () => {
    await change(outfit.members.bookkeeper, "owner");
    const answers = await Promise.all([change(outfit.members.owner, "sorter"), change(outfit.members.bookkeeper, "sorter", 2)]);
    // The second may also find that it is no owner any more.
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1);
    const { items } = (await call<List>(members.GET, outfit, { key: outfit.keys.collector })).body;
    expect(items.filter((one) => one.role === "owner")).toHaveLength(1);
  });

  it("a removed member's API keys stop working; nobody is removed twice", async () => {
    expect((await call(members.GET, outfit, { key: outfit.keys.collector })).status).toBe(200);
    expect((await remove(outfit.members.collector)).status).toBe(200);
    expect((await call(members.GET, outfit, { key: outfit.keys.collector })).status).toBe(401);
    expect((await remove(outfit.members.collector)).status).toBe(404);
    expect((await call<List>(members.GET, outfit, { key: outfit.keys.owner })).body.items).toHaveLength(3);
  });

  it.each(["", "captain", null, ["owner"]])("the role %j is refused with the field named", async (role) => {
    const answer = await call(member.PATCH, outfit, {
      key: outfit.keys.owner,
      method: "PATCH",
      params: { id: outfit.members.sorter },
      headers: { "if-match": "1" },
      body: { role },
    });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual(["role"]);
  });
});

describe("V8.4.1: two outfits", () => {
  it("a person in both has a role in each", async () => {
    const person = await makePerson();
    await seat(person, outfit, "owner");
    await seat(person, other, "sorter");
    const headers = await sessionOf(person);
    const { body } = await call<Me>(me.GET, null, { headers });
    expect(body.outfits.map(({ slug, role }) => [slug, role]).sort()).toEqual(
      [
        [outfit.slug, "owner"],
        [other.slug, "sorter"],
      ].sort(),
    );
    const rename = (where: TestOutfit) => call(settings.PATCH, where, { headers: { ...headers, "if-match": "1" }, method: "PATCH", body: { name: "Renamed" } });
    expect((await rename(outfit)).status).toBe(200);
    expect((await rename(other)).status).toBe(403);
  });

  it("somebody else's outfit is not there, and neither are its members", async () => {
    const person = await makePerson();
    await seat(person, outfit, "owner");
    const headers = await sessionOf(person);
    const foreign = await call(members.GET, other, { headers });
    const absent = await call(members.GET, { slug: `no-${newId()}` }, { headers });
    expect([foreign.status, absent.status]).toEqual([404, 404]);
    expect(foreign.problem.detail).toBe(absent.problem.detail);
    expect((await change(other.members.sorter, "owner")).status).toBe(404);
    expect((await remove(other.members.sorter)).status).toBe(404);
    expect((await call<List>(members.GET, other, { key: other.keys.owner })).body.items).toHaveLength(4);
  });
});

describe("settings", () => {
  const patch = (body: unknown, version: number) =>
    call<Settings>(settings.PATCH, outfit, { key: outfit.keys.owner, method: "PATCH", headers: { "if-match": `"${version}"` }, body });

  it("change once a version", async () => {
    const changed = await patch({ name: "Mill Race", place: "Calder Falls", staleAfterDays: 10, hidesMoney: true, weightUnit: "kg" }, 1);
    expect(changed.body).toMatchObject({ name: "Mill Race", place: "Calder Falls", staleAfterDays: 10, hidesMoney: true, weightUnit: "kg", version: 2 });
    expect((await patch({ place: null }, 1)).status).toBe(412);
    expect((await patch({ place: null }, 2)).body).toMatchObject({ place: null, slug: outfit.slug });
  });

  it("currency, weight unit and time zone are fixed once the books hold something", async () => {
    const bin = await call<{ id: string }>(bins.POST, outfit, {
      key: outfit.keys.owner,
      body: { label: "A1", gradeId: outfit.grade("yellow-brass"), tare: "2" },
    });
    const weighed = await call(weighIns.POST, outfit, {
      key: outfit.keys.owner,
      body: { binId: bin.body.id, gross: "12", tare: "2", weighedOn: "2026-01-15" },
    });
    expect(weighed.status, JSON.stringify(weighed.problem)).toBe(201);
    for (const [path, value] of Object.entries({ currency: "CAD", weightUnit: "kg", timeZone: "America/Denver" })) {
      const refused = await patch({ [path]: value }, 1);
      expect(refused.status, path).toBe(409);
      expect(refused.problem.errors?.map((error) => error.path)).toEqual([path]);
    }
    expect((await patch({ currency: "USD", name: "Still the same money" }, 1)).status).toBe(200);
    expect((await call<Settings>(settings.GET, outfit, { key: outfit.keys.sorter })).body.fixed).toBe(true);
  });

  it.each<[string, unknown]>([
    ["name", ""],
    ["currency", "ABC"],
    ["timeZone", "Mars/Olympus"],
    ["country", "XX"],
    ["staleAfterDays", 0],
    ["staleAfterDays", 1.5],
    ["hidesMoney", "yes"],
    ["slug", "another"],
  ])("%s cannot be %j", async (path, value) => {
    const refused = await patch({ [path]: value }, 1);
    expect(refused.status).toBe(422);
    expect(refused.problem.errors?.map((error) => error.path)).toEqual([path]);
  });
});
