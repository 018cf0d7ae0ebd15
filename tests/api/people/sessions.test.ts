import { eq } from "drizzle-orm";
import { NextRequest } from "next/server";
import { beforeEach, describe, expect, it } from "vitest";
import * as invitations from "@/app/api/o/[outfit]/invitations/route";
import * as member from "@/app/api/o/[outfit]/members/[id]/route";
import * as members from "@/app/api/o/[outfit]/members/route";
import * as me from "@/app/api/me/route";
import * as password from "@/app/api/me/password/route";
import * as everywhere from "@/app/api/me/sign-out-everywhere/route";
import { database } from "@/db/client";
import { memberships, rateLimits, users } from "@/db/schema";
import { authOptions } from "@/lib/auth/options";
import { passwordMatches } from "@/lib/auth/password";
import { newId } from "@/lib/ids";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { makePerson, PASSWORD, seat, sessionOf, type TestPerson } from "./person";

const NEXT = "lantern pliers drawer";

let outfit: TestOutfit;
let person: TestPerson;
let memberId: string;

beforeEach(async () => {
  await database().delete(rateLimits);
  outfit = await makeOutfit();
  person = await makePerson();
  memberId = await seat(person, outfit, "collector");
});

type Cookie = { cookie: string };
const statusOf = async (headers: Cookie) => [(await call(me.GET, null, { headers })).status, (await call(members.GET, outfit, { headers })).status];

describe("A-7: a session ends at the next request", () => {
  let phone: Cookie;
  let desk: Cookie;

  beforeEach(async () => {
    phone = await sessionOf(person);
    desk = await sessionOf(person);
    expect(await statusOf(phone)).toEqual([200, 200]);
    expect(await statusOf(desk)).toEqual([200, 200]);
  });

  it("on every device when the password changes", async () => {
    expect((await call(password.POST, null, { headers: phone, body: { current: PASSWORD, next: NEXT } })).status).toBe(200);
    expect(await statusOf(phone)).toEqual([401, 401]);
    expect(await statusOf(desk)).toEqual([401, 401]);
    expect(await statusOf(await sessionOf(person))).toEqual([200, 200]);
  });

  it("on every device when the person asks for it", async () => {
    expect((await call(everywhere.POST, null, { method: "POST", headers: phone })).status).toBe(200);
    expect(await statusOf(desk)).toEqual([401, 401]);
  });

  it("V7.4.1: on one device by signing out there, also for a kept copy of its cookie", async () => {
    const sessionId = newId();
    const kept = await sessionOf(person, { sessionId });
    expect(await statusOf(kept)).toEqual([200, 200]);
    await authOptions().events?.signOut?.({ token: { sub: person.id, sessionId }, session: { user: { id: person.id }, expires: "" } });
    expect(await statusOf(kept)).toEqual([401, 401]);
    expect(await statusOf(await sessionOf(person, { sessionId }))).toEqual([401, 401]);
    expect(await statusOf(desk)).toEqual([200, 200]);
  });

  it("V7.4.2: when the member is removed; signing in again does not bring the outfit back", async () => {
    const removed = await call(member.DELETE, outfit, { key: outfit.keys.owner, method: "DELETE", params: { id: memberId } });
    expect(removed.status).toBe(200);
    expect(await statusOf(phone)).toEqual([401, 401]);
    expect(await statusOf(await sessionOf(person))).toEqual([200, 404]);
  });

  it("V8.3.2: another role holds from the next request on", async () => {
    const invite = () => call(invitations.POST, outfit, { headers: phone, body: { role: "sorter" } });
    expect((await invite()).status).toBe(403);
    const change = (role: string, version: number) =>
      call(member.PATCH, outfit, {
        key: outfit.keys.owner,
        method: "PATCH",
        params: { id: memberId },
        headers: { "if-match": `"${version}"` },
        body: { role },
      });
    expect((await change("owner", 1)).status).toBe(200);
    expect((await invite()).status).toBe(201);
    expect((await change("collector", 2)).status).toBe(200);
    expect((await invite()).status).toBe(403);
  });
});

describe("what is no session", () => {
  it.each<[string, Record<string, unknown>]>([
    ["a token of an older version", { sessionVersion: 0 }],
    ["a token of a newer version", { sessionVersion: 9 }],
    ["a token without a version", { sessionVersion: undefined }],
    ["a token without a session", { sessionId: undefined }],
    ["a token of nobody", { sub: newId() }],
  ])("%s", async (_name, more) => {
    expect(await statusOf(await sessionOf(person, more))).toEqual([401, 401]);
  });

  it.each(["", "x", "eyJhbGciOiJub25lIn0.e30.", "a.b.c.d.e"])("the cookie %j", async (value) => {
    expect(await statusOf({ cookie: `next-auth.session-token=${value}` })).toEqual([401, 401]);
  });
});

it("a path without brackets is called without parameters", async () => {
  const request = new NextRequest("http://127.0.0.1:3000/api/me", { headers: await sessionOf(person) });
  const answer = await me.GET(request, { params: Promise.resolve(undefined) });
  expect(answer.status).toBe(200);
});

describe("changing the password", () => {
  const change = async (body: unknown, more: Record<string, string> = {}) =>
    call(password.POST, null, { headers: { ...(await sessionOf(person)), ...more }, body });

  it("keeps the new one and not the old one", async () => {
    expect((await change({ current: PASSWORD, next: NEXT })).status).toBe(200);
    const [kept] = await database().select().from(users).where(eq(users.id, person.id));
    expect(await passwordMatches(kept?.passwordHash ?? null, NEXT)).toBe(true);
    expect(await passwordMatches(kept?.passwordHash ?? null, PASSWORD)).toBe(false);
  });

  it.each([
    ["the present one wrong", { current: "not the password at all", next: NEXT }, "current"],
    ["the present one missing", { next: NEXT }, "current"],
    ["a short one", { current: PASSWORD, next: "kettle drawer!" }, "next"],
    ["a common one", { current: PASSWORD, next: "passwordpassword" }, "next"],
    ["the person's own name", { current: PASSWORD, next: "Wilhelmina Ostrander" }, "next"],
  ])("%s: is refused with the field named, and the session goes on", async (_name, body, path) => {
    const session = await sessionOf(person);
    const answer = await call(password.POST, null, { headers: session, body });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
    expect(await statusOf(session)).toEqual([200, 200]);
  });

  it("nobody guesses the present one from an open session", async () => {
    for (let i = 0; i < 10; i += 1) expect((await change({ current: `guess number ${i}`, next: NEXT })).status).toBe(422);
    expect((await change({ current: PASSWORD, next: NEXT })).status).toBe(429);
  });
});

describe("A-8: another site's page does nothing with the cookie", () => {
  it.each<[string, Record<string, string>]>([
    ["its origin", { origin: "https://elsewhere.example" }],
    ["no origin to tell", { origin: "null" }],
    ["a cross-site fetch", { "sec-fetch-site": "cross-site" }],
    ["a neighbor's fetch", { "sec-fetch-site": "same-site" }],
  ])("%s is refused for changes", async (_name, foreign) => {
    const headers = { ...(await sessionOf(person)), ...foreign };
    await database().update(memberships).set({ role: "owner" }).where(eq(memberships.userId, person.id));
    expect((await call(password.POST, null, { headers, body: { current: PASSWORD, next: NEXT } })).status).toBe(403);
    expect((await call(everywhere.POST, null, { method: "POST", headers })).status).toBe(403);
    expect((await call(invitations.POST, outfit, { headers, body: { role: "sorter" } })).status).toBe(403);
    expect((await call(member.DELETE, outfit, { headers, method: "DELETE", params: { id: outfit.members.sorter } })).status).toBe(403);
  });

  it("our own page may", async () => {
    const headers = { ...(await sessionOf(person)), origin: "http://127.0.0.1:3000", "sec-fetch-site": "same-origin" };
    expect((await call(everywhere.POST, null, { method: "POST", headers })).status).toBe(200);
  });
});
