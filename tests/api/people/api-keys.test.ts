import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import * as apiKey from "@/app/api/o/[outfit]/api-keys/[id]/route";
import * as apiKeys from "@/app/api/o/[outfit]/api-keys/route";
import * as members from "@/app/api/o/[outfit]/members/route";
import * as settings from "@/app/api/o/[outfit]/settings/route";
import { database } from "@/db/client";
import { apiKeys as rows, auditLog } from "@/db/schema";
import { hashToken } from "@/lib/auth/tokens";
import type { ApiKey } from "@/lib/people/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";

let outfit: TestOutfit;

beforeEach(async () => {
  outfit = await makeOutfit();
});

const make = (body: unknown = { name: "Scale at the gate", role: "sorter" }) =>
  call<ApiKey & { key: string }>(apiKeys.POST, outfit, { key: outfit.keys.owner, body });

describe("API keys", () => {
  it("V11.5.1: are told once, of 256 random bits, and kept hashed", async () => {
    const made = await make();
    expect(made.status).toBe(201);
    expect(made.body.key).toMatch(/^cw_[\w-]{43}$/);
    const [kept] = await database()
      .select()
      .from(rows)
      .where(and(eq(rows.outfitId, outfit.id), eq(rows.id, made.body.id)));
    expect(kept?.keyHash).toBe(hashToken(made.body.key));
    const trail = await database().select().from(auditLog).where(eq(auditLog.outfitId, outfit.id));
    expect(trail.map((one) => one.action)).toContain("make-api-key");
    const listed = await call<{ items: ApiKey[] }>(apiKeys.GET, outfit, { key: outfit.keys.owner });
    expect(listed.body.items.find((one) => one.id === made.body.id)).toMatchObject({ name: "Scale at the gate", prefix: made.body.key.slice(0, 10) });
    for (const place of [kept, trail, listed.body]) expect(JSON.stringify(place)).not.toContain(made.body.key);
  });

  it("act with their own role, not their maker's", async () => {
    const { key } = (await make()).body;
    expect((await call(members.GET, outfit, { key })).status).toBe(200);
    expect((await call(settings.PATCH, outfit, { key, method: "PATCH", headers: { "if-match": "1" }, body: { name: "Mine" } })).status).toBe(403);
    expect((await call(apiKeys.GET, outfit, { key })).status).toBe(403);
  });

  it("open no other outfit", async () => {
    const { key } = (await make({ name: "Everything", role: "owner" })).body;
    expect((await call(members.GET, await makeOutfit(), { key })).status).toBe(404);
  });

  it("stop working when they are taken out of use; another outfit's owner cannot do that", async () => {
    const { id, key } = (await make()).body;
    const other = await makeOutfit();
    expect((await call(apiKey.DELETE, other, { key: other.keys.owner, method: "DELETE", params: { id } })).status).toBe(404);
    expect((await call(members.GET, outfit, { key })).status).toBe(200);
    expect((await call(apiKey.DELETE, outfit, { key: outfit.keys.owner, method: "DELETE", params: { id } })).status).toBe(200);
    expect((await call(members.GET, outfit, { key })).status).toBe(401);
    expect((await call(apiKey.DELETE, outfit, { key: outfit.keys.owner, method: "DELETE", params: { id } })).status).toBe(404);
  });

  it("need no origin, because no browser sends them by itself", async () => {
    const answer = await call(apiKeys.POST, outfit, {
      key: outfit.keys.owner,
      headers: { origin: "https://elsewhere.example" },
      body: { name: "From a script", role: "sorter" },
    });
    expect(answer.status).toBe(201);
  });

  it.each<[string, unknown]>([
    ["name", { name: "", role: "sorter" }],
    ["name", { role: "sorter" }],
    ["role", { name: "Scale", role: "admin" }],
    ["prefix", { name: "Scale", role: "sorter", prefix: "cw_" }],
  ])("%s is named when it is wrong", async (path, body) => {
    const refused = await make(body);
    expect(refused.status).toBe(422);
    expect(refused.problem.errors?.map((error) => error.path)).toEqual([path]);
  });

  it.each(["Bearer", "Bearer x", "Bearer %E0%A4%A", "Basic b3duZXI6", `Bearer ${"x".repeat(5000)}`])("the header %j is nobody", async (authorization) => {
    expect((await call(members.GET, outfit, { headers: { authorization } })).status).toBe(401);
  });
});
