import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import * as accepting from "@/app/api/invitations/[token]/accept/route";
import * as me from "@/app/api/me/route";
import * as invitation from "@/app/api/o/[outfit]/invitations/[id]/route";
import * as invitations from "@/app/api/o/[outfit]/invitations/route";
import * as member from "@/app/api/o/[outfit]/members/[id]/route";
import * as members from "@/app/api/o/[outfit]/members/route";
import { database } from "@/db/client";
import { invitations as rows, memberships, rateLimits } from "@/db/schema";
import { hashToken } from "@/lib/auth/tokens";
import { newId } from "@/lib/ids";
import { seeInvitation } from "@/lib/people/invitations";
import type { Invitation, Me, Member } from "@/lib/people/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { makePerson, PASSWORD, seat, sessionOf } from "./person";

const DAY = 86_400_000;

let outfit: TestOutfit;

beforeEach(async () => {
  await database().delete(rateLimits);
  outfit = await makeOutfit();
});

async function invite(role = "collector"): Promise<{ id: string; token: string; expiresAt: string }> {
  const made = await call<Invitation & { url: string }>(invitations.POST, outfit, { key: outfit.keys.owner, body: { role, note: "the new driver" } });
  expect(made.status).toBe(201);
  expect(made.body.url).toMatch(/^http:\/\/127\.0\.0\.1:3000\/invitation\/join_[\w-]{43}$/);
  return { id: made.body.id, token: made.body.url.split("/").at(-1) ?? "", expiresAt: made.body.expiresAt };
}

const accept = (token: string, headers: Record<string, string>, body: unknown = {}) =>
  call<{ slug: string }>(accepting.POST, null, { params: { token }, headers, body });
const newcomer = () => ({ person: { name: "Wilhelmina Ostrander", email: `${newId()}@people.example`, password: PASSWORD } });

describe("joining by a link", () => {
  it("the link is told once and kept hashed; it is good for seven days", async () => {
    const { id, token, expiresAt } = await invite();
    expect(Date.parse(expiresAt) - Date.now()).toBeGreaterThan(7 * DAY - 60_000);
    expect(Date.parse(expiresAt) - Date.now()).toBeLessThanOrEqual(7 * DAY);
    const listed = await call<{ items: Invitation[] }>(invitations.GET, outfit, { key: outfit.keys.owner });
    expect(listed.body.items.map((one) => one.id)).toEqual([id]);
    expect(JSON.stringify(listed.body)).not.toContain(token);
    const [kept] = await database()
      .select()
      .from(rows)
      .where(and(eq(rows.outfitId, outfit.id), eq(rows.id, id)));
    expect(kept?.tokenHash).toBe(hashToken(token));
    expect(JSON.stringify(kept)).not.toContain(token);
  });

  it("a person who is signed in joins with the role that was offered", async () => {
    const { token } = await invite("bookkeeper");
    const headers = await sessionOf(await makePerson());
    expect((await call(members.GET, outfit, { headers })).status).toBe(404);
    expect((await accept(token, headers)).body).toEqual({ slug: outfit.slug });
    expect((await call<Me>(me.GET, null, { headers })).body.outfits).toEqual([{ slug: outfit.slug, name: "Test outfit", role: "bookkeeper" }]);
  });

  it("a new person says who they are", async () => {
    const { token } = await invite("sorter");
    const body = newcomer();
    expect((await accept(token, {}, body)).status).toBe(201);
    const { items } = (await call<{ items: Member[] }>(members.GET, outfit, { key: outfit.keys.owner })).body;
    expect(items.find((one) => one.email === body.person.email)).toMatchObject({ role: "sorter", name: "Wilhelmina Ostrander" });
  });

  it("a new person's password is held to the same rules, and the link can still be used", async () => {
    const { token } = await invite();
    const { person } = newcomer();
    const refused = await accept(token, {}, { person: { ...person, password: "kettle drawer!" } });
    expect(refused.problem.errors?.map((error) => error.path)).toEqual(["person.password"]);
    expect((await accept(token, {}, {})).status).toBe(401);
    const taken = await accept(token, {}, { person: { ...person, email: (await makePerson()).email } });
    expect(taken.status).toBe(409);
    expect((await accept(token, {}, { person })).status).toBe(201);
  });

  it("V6.5.1: it works once, also for six at once", async () => {
    const { token } = await invite();
    const sessions = await Promise.all(Array.from({ length: 6 }, async () => sessionOf(await makePerson())));
    const answers = await Promise.all(sessions.map((headers) => accept(token, headers)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 404, 404, 404, 404, 404]);
    const { items } = (await call<{ items: Member[] }>(members.GET, outfit, { key: outfit.keys.owner })).body;
    expect(items).toHaveLength(5);
  });

  it("not after seven days", async () => {
    const { id, token } = await invite();
    await database()
      .update(rows)
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where(and(eq(rows.outfitId, outfit.id), eq(rows.id, id)));
    expect((await accept(token, await sessionOf(await makePerson()))).status).toBe(404);
    expect(await seeInvitation(token, new Date())).toBeNull();
    expect((await call<{ items: Invitation[] }>(invitations.GET, outfit, { key: outfit.keys.owner })).body.items).toEqual([]);
  });

  it("not after it was taken back", async () => {
    const { id, token } = await invite();
    expect(await seeInvitation(token, new Date())).toMatchObject({ slug: outfit.slug, role: "collector" });
    const revoke = () => call(invitation.DELETE, outfit, { key: outfit.keys.owner, method: "DELETE", params: { id } });
    expect((await revoke()).status).toBe(200);
    expect((await revoke()).status).toBe(404);
    expect((await accept(token, await sessionOf(await makePerson()))).status).toBe(404);
    expect(await seeInvitation(token, new Date())).toBeNull();
  });

  it("another outfit's owner does not take it back", async () => {
    const { id, token } = await invite();
    const other = await makeOutfit();
    expect((await call(invitation.DELETE, other, { key: other.keys.owner, method: "DELETE", params: { id } })).status).toBe(404);
    expect((await accept(token, await sessionOf(await makePerson()))).status).toBe(201);
  });

  it.each(["", "x", "join_", `join_${"a".repeat(43)}`, "../../me", "join_' or 1=1 --aaaaaaaaaaaaaaaa"])("the made-up link %j does not work", async (token) => {
    expect((await accept(token, await sessionOf(await makePerson()))).status).toBe(404);
  });

  it("a member keeps their role, and the link stays good for whom it was meant", async () => {
    const person = await makePerson();
    await seat(person, outfit, "sorter");
    const { token } = await invite("owner");
    const headers = await sessionOf(person);
    expect((await accept(token, headers)).status).toBe(409);
    expect((await call<Me>(me.GET, null, { headers })).body.outfits[0]?.role).toBe("sorter");
    expect((await accept(token, await sessionOf(await makePerson()))).status).toBe(201);
  });

  it("a removed member who is asked back has the same seat, with the new role", async () => {
    const person = await makePerson();
    const memberId = await seat(person, outfit, "sorter");
    await call(member.DELETE, outfit, { key: outfit.keys.owner, method: "DELETE", params: { id: memberId } });
    const { token } = await invite("collector");
    expect((await accept(token, await sessionOf(person))).status).toBe(201);
    const [kept] = await database()
      .select()
      .from(memberships)
      .where(and(eq(memberships.outfitId, outfit.id), eq(memberships.userId, person.id)));
    expect(kept).toMatchObject({ id: memberId, role: "collector", removedAt: null });
  });
});
