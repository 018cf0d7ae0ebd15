import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { grades, itemKindParts, itemKinds } from "@/db/schema";
import { Teller } from "./act";
import { historyUntil, type Yield } from "./history";
import { toHundredths } from "./random";
import type { Stage } from "./stage";

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
