import { count, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import * as me from "@/app/api/me/route";
import * as signUps from "@/app/api/sign-up/route";
import { database } from "@/db/client";
import { auditLog, grades, outfits, rateLimits, users } from "@/db/schema";
import { SIGN_UP } from "@/lib/auth/throttle";
import { newId } from "@/lib/ids";
import type { Me } from "@/lib/people/schema";
import { call } from "../call";
import { makePerson, PASSWORD, sessionOf } from "./person";

type Made = { slug: string; outfitId: string; userId: string };
type Json = Record<string, unknown>;

const outfit = { name: "Quarry Lane Salvage", country: "US", currency: "USD", weightUnit: "lb", timeZone: "America/Chicago" };
const input = (more: Json = {}) => ({ name: "Wilhelmina Ostrander", email: `${newId()}@people.example`, password: PASSWORD, outfit, ...more });

beforeEach(async () => {
  await database().delete(rateLimits);
});

describe("signing up", () => {
  it("makes a person, who owns an outfit with books and a catalogue", async () => {
    const body = input({ email: "  Wilhelmina@People.EXAMPLE " });
    const made = await call<Made>(signUps.POST, null, { body });
    expect(made.status).toBe(201);
    expect(made.body.slug).toMatch(/^quarry-lane-salvage/);
    const cookie = await sessionOf({ id: made.body.userId, email: "wilhelmina@people.example" });
    const who = await call<Me>(me.GET, null, { headers: cookie });
    expect(who.body).toEqual({
      id: made.body.userId,
      name: "Wilhelmina Ostrander",
      email: "wilhelmina@people.example",
      outfits: [{ slug: made.body.slug, name: "Quarry Lane Salvage", role: "owner" }],
    });
    const [kept] = await database().select().from(users).where(eq(users.id, made.body.userId));
    expect(kept?.passwordHash).toMatch(/^\$argon2id\$/);
    const [catalogue] = await database().select({ rows: count() }).from(grades).where(eq(grades.outfitId, made.body.outfitId));
    expect(catalogue?.rows).toBeGreaterThan(20);
    const trail = await database().select({ action: auditLog.action }).from(auditLog).where(eq(auditLog.outfitId, made.body.outfitId));
    expect(trail).toEqual([{ action: "sign-up" }]);
  });

  it("two outfits of one name have two addresses", async () => {
    const one = await call<Made>(signUps.POST, null, { body: input() });
    const two = await call<Made>(signUps.POST, null, { body: input() });
    expect([one.status, two.status]).toEqual([201, 201]);
    expect(one.body.slug).not.toBe(two.body.slug);
  });

  it("an email has one account, however it is typed; nothing is half made", async () => {
    const person = await makePerson();
    const name = `Outfit ${newId()}`;
    const again = await call(signUps.POST, null, { body: input({ email: person.email.toUpperCase(), outfit: { ...outfit, name } }) });
    expect(again.status).toBe(409);
    expect(again.problem.errors).toEqual([{ path: "email", message: "There is an account for this email already. Sign in with it." }]);
    expect(await database().select().from(outfits).where(eq(outfits.name, name))).toEqual([]);
  });

  it("V2.3.4: of five at once with one email, one is made", async () => {
    const email = `${newId()}@people.example`;
    const answers = await Promise.all(Array.from({ length: 5 }, () => call(signUps.POST, null, { body: input({ email }) })));
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409, 409, 409]);
  });

  it.each<[string, Json, string]>([
    ["no name", { name: " " }, "name"],
    ["no email", { email: "" }, "email"],
    ["an email that is none", { email: "wilhelmina" }, "email"],
    ["an email with a line break", { email: "a@people.example\r\nbcc: b@people.example" }, "email"],
    ["a password of 14 letters", { password: "kettle drawer!" }, "password"],
    ["a password that is no text", { password: 123_456_789_012_345 }, "password"],
    ["a country that is none", { outfit: { ...outfit, country: "XX" } }, "outfit.country"],
    ["a currency that is none", { outfit: { ...outfit, currency: "ABC" } }, "outfit.currency"],
    ["stones", { outfit: { ...outfit, weightUnit: "st" } }, "outfit.weightUnit"],
    ["a time zone that is none", { outfit: { ...outfit, timeZone: "America/Nowhere" } }, "outfit.timeZone"],
    ["a name of 1 MB", { outfit: { ...outfit, name: "x".repeat(300_000) } }, "outfit.name"],
    ["no outfit", { outfit: null }, "outfit"],
    ["a field nobody knows", { role: "owner" }, "role"],
  ])("%s is refused with the field named", async (_name, more, path) => {
    const answer = await call(signUps.POST, null, { body: input(more) });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toContain(path);
    expect(JSON.stringify(answer.problem)).not.toContain(PASSWORD);
  });

  it("an empty form names each field once", async () => {
    const answer = await call(signUps.POST, null, { body: input({ name: "", email: "", password: "" }) });
    expect(answer.problem.errors?.map((error) => error.path)).toEqual(["name", "email", "password"]);
  });

  it("V2.4.1: an address can do it so often and no more", async () => {
    for (let i = 0; i < SIGN_UP.points; i += 1) expect((await call(signUps.POST, null, { body: {} })).status).toBe(422);
    const refused = await call(signUps.POST, null, { body: input() });
    expect(refused.status).toBe(429);
    expect(refused.headers.get("retry-after")).toMatch(/^\d+$/);
  });
});
