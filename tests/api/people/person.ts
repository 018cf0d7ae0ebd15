import { encode } from "next-auth/jwt";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { memberships, users } from "@/db/schema";
import { inTransaction } from "@/db/transaction";
import type { Role } from "@/lib/auth/permissions";
import { newId } from "@/lib/ids";
import { insertUser } from "@/lib/people/service";

export const PASSWORD = "kettle drawer pliers";

/** A person who can sign in, and belongs nowhere yet. */
export type TestPerson = { id: string; email: string };

export async function makePerson(name = "Wilhelmina Ostrander"): Promise<TestPerson> {
  const email = `${newId()}@people.example`;
  return { id: await inTransaction((tx) => insertUser(tx, { name, email, password: PASSWORD }, new Date())), email };
}

/** Seats a person in an outfit. Answers the membership's id. */
export async function seat(person: TestPerson, outfit: { id: string }, role: Role): Promise<string> {
  const id = newId();
  await database().insert(memberships).values({ outfitId: outfit.id, id, userId: person.id, role, joinedAt: new Date() });
  return id;
}

/** The session cookie that signing in now would set, as a header; `more` overrides what its token says. */
export async function sessionOf(person: TestPerson, more: Record<string, unknown> = {}): Promise<{ cookie: string }> {
  const [user] = await database().select({ version: users.sessionVersion }).from(users).where(eq(users.id, person.id));
  const token = { sub: person.id, sessionVersion: user?.version ?? 0, sessionId: newId(), ...more };
  return { cookie: `next-auth.session-token=${await encode({ token, secret: process.env.NEXTAUTH_SECRET ?? "" })}` };
}
