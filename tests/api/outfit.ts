import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { apiKeys, grades, itemKinds, memberships, users } from "@/db/schema";
import { inTransaction } from "@/db/transaction";
import type { Role } from "@/lib/auth/permissions";
import { hashToken, makeToken } from "@/lib/auth/tokens";
import { newId } from "@/lib/ids";
import { createOutfit, type NewOutfit } from "@/lib/people/create-outfit";

/** An outfit made for a test: one person and one API key a role, and short cuts to its grades and item kinds by catalogue key. */
export type TestOutfit = {
  id: string;
  slug: string;
  keys: Record<Role, string>;
  members: Record<Role, string>;
  grade: (key: string) => string;
  kind: (key: string) => string;
};

const ROLES: Role[] = ["owner", "bookkeeper", "collector", "sorter"];

async function makeUser(name: string): Promise<string> {
  const id = newId();
  // Nobody signs in with these: tests that need a password sign up through the API.
  await database()
    .insert(users)
    .values({ id, email: `${id}@test.example`, name, passwordHash: "not a hash", createdAt: new Date() });
  return id;
}

/** Makes an outfit directly in the database, because sign-up has tests of its own and is slow on purpose. */
export async function makeOutfit(more: Partial<NewOutfit> = {}): Promise<TestOutfit> {
  const ownerId = await makeUser("Owner");
  const now = new Date();
  const outfit = await inTransaction((tx) =>
    createOutfit(
      tx,
      { name: "Test outfit", country: "US", currency: "USD", weightUnit: "lb", timeZone: "America/New_York", ...more },
      { userId: ownerId },
      now,
    ),
  );
  const members = { owner: outfit.memberId } as Record<Role, string>;
  const keys = {} as Record<Role, string>;
  for (const role of ROLES) {
    if (role !== "owner") {
      members[role] = newId();
      await database()
        .insert(memberships)
        .values({ outfitId: outfit.id, id: members[role], userId: await makeUser(role), role, joinedAt: now });
    }
    keys[role] = makeToken("cw");
    await database()
      .insert(apiKeys)
      .values({
        outfitId: outfit.id,
        id: newId(),
        name: role,
        role,
        prefix: keys[role].slice(0, 10),
        keyHash: hashToken(keys[role]),
        createdBy: members[role],
        createdAt: now,
      });
  }
  const gradeIds = new Map(
    (await database().select({ id: grades.id, key: grades.key }).from(grades).where(eq(grades.outfitId, outfit.id))).map((g) => [g.key, g.id]),
  );
  const kindIds = new Map(
    (await database().select({ id: itemKinds.id, key: itemKinds.key }).from(itemKinds).where(eq(itemKinds.outfitId, outfit.id))).map((k) => [k.key, k.id]),
  );
  const need = (ids: Map<string | null, string>, key: string) => {
    const id = ids.get(key);
    if (id === undefined) throw new Error(`no ${key} in the catalogue`);
    return id;
  };
  return { id: outfit.id, slug: outfit.slug, keys, members, grade: (key) => need(gradeIds, key), kind: (key) => need(kindIds, key) };
}
