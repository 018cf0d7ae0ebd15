import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { grades, itemKindParts, itemKinds, outfits } from "@/db/schema";
import { currencyExponent } from "@/lib/arithmetic/money";
import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import { newId } from "@/lib/ids";
import { Teller } from "./act";
import { historyUntil, type Yield } from "./history";
import { toHundredths } from "./random";

export type Stage = { outfit: typeof outfits.$inferSelect; members: Map<Role, { id: string; userId: string; name: string }>; today: string };

/** The context in which a member did something on a day: at the end of a working day, in the same form that a request makes. */
export function contextOn(stage: Stage, role: Role, on: string): Context {
  const member = stage.members.get(role);
  if (!member) throw new Error(`the demo has no ${role}`);
  const { outfit } = stage;
  return {
    outfit: { ...outfit, exponent: currencyExponent(outfit.currency) },
    actor: { memberId: member.id, userId: member.userId, name: member.name, role, apiKeyId: null },
    requestId: newId(),
    now: new Date(`${on}T20:30:00Z`),
    today: on,
    idempotency: null,
    ifMatch: null,
    replayed: false,
  };
}

/** What one item of each kind gives of each grade, from the outfit's own breakdown sheets. */
async function readYields(outfitId: string): Promise<Yield> {
  const rows = await database()
    .select({ kind: itemKinds.key, grade: itemKindParts.grade, weight: itemKindParts.typicalWeight, perItem: itemKindParts.perItem })
    .from(itemKindParts)
    .innerJoin(itemKinds, eq(itemKinds.id, itemKindParts.itemKindId))
    .where(eq(itemKindParts.outfitId, outfitId))
    .orderBy(itemKinds.position, itemKindParts.position);
  const yields: Yield = new Map();
  for (const { kind, grade, weight, perItem } of rows) {
    if (kind === null) continue;
    const grades = yields.get(kind) ?? new Map<string, number>();
    grades.set(grade, (grades.get(grade) ?? 0) + toHundredths(weight) * perItem);
    yields.set(kind, grades);
  }
  return yields;
}

async function keysOf(outfitId: string) {
  const db = database();
  const gradeRows = await db.select({ id: grades.id, key: grades.key }).from(grades).where(eq(grades.outfitId, outfitId));
  const kindRows = await db.select({ id: itemKinds.id, key: itemKinds.key }).from(itemKinds).where(eq(itemKinds.outfitId, outfitId));
  const byKey = (rows: { id: string; key: string | null }[]) => new Map(rows.flatMap(({ id, key }) => (key === null ? [] : [[key, id] as const])));
  return { gradeIds: byKey(gradeRows), kindIds: byKey(kindRows) };
}

/** Tells the outfit's fourteen months through the use cases that the API calls, so that the books are true because nothing else wrote them. */
export async function tellHistory(stage: Stage): Promise<void> {
  const yields = await readYields(stage.outfit.id);
  const teller = new Teller(stage, await keysOf(stage.outfit.id));
  await teller.setUp();
  for (const day of historyUntil(stage.today, yields)) {
    for (const happening of day.happenings) await teller.tell(day.on, happening);
    await teller.endOf(day.on);
  }
}
