import { eq, sql } from "drizzle-orm";
import { closeDatabase, database } from "@/db/client";
import { memberships, outfits, users } from "@/db/schema";
import { inTransaction } from "@/db/transaction";
import { normalEmail } from "@/lib/auth/email";
import { hashPassword } from "@/lib/auth/password";
import type { Role } from "@/lib/auth/permissions";
import { dateIn, now } from "@/lib/clock";
import { newId } from "@/lib/ids";
import { createOutfit } from "@/lib/people/create-outfit";
import signIns from "./demo-sign-ins.json" with { type: "json" };
import { OUTFIT } from "./demo/figures";
import { tellHistory } from "./demo/tell";

type Member = { id: string; userId: string; name: string };

async function makePeople(moment: Date): Promise<Map<Role, { userId: string; name: string }>> {
  const passwordHash = await hashPassword(signIns.password);
  const people = new Map<Role, { userId: string; name: string }>();
  for (const { role, name, email } of signIns.people) {
    const id = newId();
    await database()
      .insert(users)
      .values({ id, email: normalEmail(email), name, passwordHash, createdAt: moment });
    people.set(role as Role, { userId: id, name });
  }
  return people;
}

/** Makes the demo outfit with its four members. Its history comes afterwards, through the same use cases that the API calls. */
async function makeOutfit(moment: Date) {
  const people = await makePeople(moment);
  const owner = people.get("owner");
  if (!owner) throw new Error("the demo needs an owner");
  const made = await inTransaction((tx) => createOutfit(tx, OUTFIT, owner, moment));
  const members = new Map<Role, Member>([["owner", { id: made.memberId, ...owner }]]);
  for (const [role, person] of people) {
    if (role === "owner") continue;
    const id = newId();
    await database().insert(memberships).values({ outfitId: made.id, id, userId: person.userId, role, joinedAt: moment });
    members.set(role, { id, ...person });
  }
  return { ...made, members };
}

/** Makes the demo outfit in a database that has no outfit yet, and does nothing in any other. */
async function makeDemo(): Promise<void> {
  const db = database();
  const [any] = await db.select({ n: sql<number>`count(*)` }).from(outfits);
  if (Number.parseInt(String(any?.n ?? 0), 10) > 0) return;
  const moment = now();
  const made = await makeOutfit(moment);
  const [outfit] = await db.select().from(outfits).where(eq(outfits.id, made.id));
  if (!outfit) throw new Error("the demo outfit was not made");
  await tellHistory({ outfit, members: made.members, today: dateIn(OUTFIT.timeZone, moment) });
}

await makeDemo();
await closeDatabase();
