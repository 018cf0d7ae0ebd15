import "server-only";
import { and, asc, count, desc, eq, gte, inArray, isNull, lt, lte, ne, or, sql } from "drizzle-orm";
import type { Reader } from "@/db/client";
import {
  bins,
  entries,
  grades,
  itemKinds,
  lots,
  memberships,
  movementLines,
  movements,
  pickupItems,
  pickups,
  postings,
  users,
  weighIns,
  accounts,
} from "@/db/schema";
import { add, trim } from "@/lib/arithmetic/decimal";
import type { Actor, Outfit } from "@/lib/auth/context";
import { seesCost } from "@/lib/auth/permissions";
import { totalsBy } from "@/lib/books/booking";
import { isRealDate } from "@/lib/clock";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, toPage } from "@/lib/http/page";
import { isId } from "@/lib/ids";
import { seesPaid } from "./rules";
import type { Pickup, PickupListQuery, PickupRecord } from "./schema";

/** Whose eyes a pickup is read for: money is left out where the role does not see it. */
export type Viewer = { outfit: Outfit; actor: Actor };

const headColumns = {
  id: pickups.id,
  number: pickups.number,
  pickedUpOn: pickups.pickedUpOn,
  source: pickups.source,
  place: pickups.place,
  note: pickups.note,
  state: pickups.state,
  estimatedWeight: pickups.estimatedWeight,
  paidMinor: pickups.paidMinor,
  paidFrom: pickups.paidFrom,
  version: pickups.version,
  madeAt: pickups.madeAt,
  voidedAt: pickups.voidedAt,
  makerId: pickups.madeBy,
  makerName: users.name,
  remainingWeight: lots.remainingWeight,
  remainingCostMinor: lots.remainingCostMinor,
};

const selectHeads = (db: Reader) =>
  db
    .select(headColumns)
    .from(pickups)
    .innerJoin(memberships, and(eq(memberships.outfitId, pickups.outfitId), eq(memberships.id, pickups.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId))
    .leftJoin(lots, and(eq(lots.outfitId, pickups.outfitId), eq(lots.pickupId, pickups.id)));

type Head = Awaited<ReturnType<ReturnType<typeof selectHeads>["execute"]>>[number];

async function itemsOf(db: Reader, { outfitId, pickupIds }: { outfitId: string; pickupIds: string[] }) {
  if (pickupIds.length === 0) return [];
  return db
    .select({
      pickupId: pickupItems.pickupId,
      line: pickupItems.line,
      itemKindId: pickupItems.itemKindId,
      key: itemKinds.key,
      name: itemKinds.name,
      plural: itemKinds.plural,
      group: itemKinds.groupName,
      count: pickupItems.count,
      weighed: pickupItems.weighed,
      estimatedWeight: pickupItems.estimatedWeight,
      hazards: itemKinds.hazards,
      holdUntil: itemKinds.holdUntil,
    })
    .from(pickupItems)
    .innerJoin(itemKinds, and(eq(itemKinds.outfitId, pickupItems.outfitId), eq(itemKinds.id, pickupItems.itemKindId)))
    .where(and(eq(pickupItems.outfitId, outfitId), inArray(pickupItems.pickupId, pickupIds)))
    .orderBy(asc(pickupItems.pickupId), asc(pickupItems.line));
}

type Item = Awaited<ReturnType<typeof itemsOf>>[number];

/** Lines of the same kind are one kind in a list. */
function kindsOf(items: Item[]): Pickup["kinds"] {
  const kinds = new Map<string, Pickup["kinds"][number]>();
  for (const { itemKindId, name, plural, count: counted } of items) {
    kinds.set(itemKindId, { itemKindId, name, plural, count: (kinds.get(itemKindId)?.count ?? 0) + counted });
  }
  return [...kinds.values()];
}

function pickupOf(viewer: Viewer, head: Head, items: Item[]): Pickup {
  const paid = seesPaid({ id: viewer.actor.memberId, role: viewer.actor.role }, viewer.outfit, head.makerId);
  return {
    id: head.id,
    number: head.number,
    pickedUpOn: head.pickedUpOn,
    source: head.source,
    place: head.place,
    state: head.state,
    itemCount: items.reduce((total, item) => total + item.count, 0),
    kinds: kindsOf(items),
    estimatedWeight: trim(head.estimatedWeight),
    remainingWeight: trim(head.remainingWeight ?? "0"),
    paidMinor: paid ? head.paidMinor : null,
    paidFrom: paid ? head.paidFrom : null,
    madeBy: { id: head.makerId, name: head.makerName },
    madeAt: head.madeAt.toISOString(),
    version: head.version,
  };
}

/** A page of the outfit's pickups, newest first. */
export async function listPickups(db: Reader, { outfitId, viewer, ...query }: { outfitId: string; viewer: Viewer } & PickupListQuery) {
  const after = decodeCursor(query.cursor);
  if (after && (!isRealDate(after.at) || !isId(after.id))) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  const heads = await selectHeads(db)
    .where(
      and(
        eq(pickups.outfitId, outfitId),
        query.state ? eq(pickups.state, query.state) : undefined,
        query.from ? gte(pickups.pickedUpOn, query.from) : undefined,
        query.to ? lte(pickups.pickedUpOn, query.to) : undefined,
        after ? or(lt(pickups.pickedUpOn, after.at), and(eq(pickups.pickedUpOn, after.at), lt(pickups.id, after.id))) : undefined,
      ),
    )
    .orderBy(desc(pickups.pickedUpOn), desc(pickups.id))
    .limit(query.limit + 1);
  const page = toPage(heads, query.limit, (head) => ({ at: head.pickedUpOn, id: head.id }));
  const items = await itemsOf(db, { outfitId, pickupIds: page.items.map((head) => head.id) });
  const byPickup = new Map<string, Item[]>();
  for (const item of items) byPickup.set(item.pickupId, [...(byPickup.get(item.pickupId) ?? []), item]);
  return { items: page.items.map((head) => pickupOf(viewer, head, byPickup.get(head.id) ?? [])), nextCursor: page.nextCursor };
}

const hazardsRead = (hazards: string[] | string): string[] => (typeof hazards === "string" ? (JSON.parse(hazards) as string[]) : hazards);

async function weighInsOf(db: Reader, { outfitId, pickupId }: { outfitId: string; pickupId: string }): Promise<PickupRecord["weighIns"]> {
  const rows = await db
    .select({
      id: weighIns.id,
      weighedOn: weighIns.weighedOn,
      binId: weighIns.binId,
      binLabel: bins.label,
      gradeId: weighIns.gradeId,
      gradeName: grades.name,
      family: grades.family,
      net: weighIns.net,
      voidedAt: weighIns.voidedAt,
    })
    .from(weighIns)
    .innerJoin(bins, and(eq(bins.outfitId, weighIns.outfitId), eq(bins.id, weighIns.binId)))
    .innerJoin(grades, and(eq(grades.outfitId, weighIns.outfitId), eq(grades.id, weighIns.gradeId)))
    .where(and(eq(weighIns.outfitId, outfitId), eq(weighIns.pickupId, pickupId)))
    .orderBy(asc(weighIns.weighedOn), asc(weighIns.madeAt), asc(weighIns.id));
  return rows.map((row) => ({ ...row, net: trim(row.net), voidedAt: row.voidedAt?.toISOString() ?? null }));
}

/** One pickup with its items and weigh-ins, or null. */
export async function getPickup(db: Reader, { outfitId, id, viewer }: { outfitId: string; id: string; viewer: Viewer }): Promise<PickupRecord | null> {
  if (!isId(id)) return null;
  const [head] = await selectHeads(db).where(and(eq(pickups.outfitId, outfitId), eq(pickups.id, id)));
  if (!head) return null;
  const items = await itemsOf(db, { outfitId, pickupIds: [id] });
  return {
    ...pickupOf(viewer, head, items),
    note: head.note,
    items: items.map(({ pickupId: _pickupId, plural: _plural, ...item }) => ({
      ...item,
      weighed: item.weighed === null ? null : trim(item.weighed),
      estimatedWeight: trim(item.estimatedWeight),
      hazards: hazardsRead(item.hazards),
    })),
    weighIns: await weighInsOf(db, { outfitId, pickupId: id }),
    remainingCostMinor: seesCost(viewer.actor.role) ? (head.remainingCostMinor ?? 0) : null,
    voidedAt: head.voidedAt?.toISOString() ?? null,
  };
}

/** Net weight of each grade that came of a pickup and still stands: weighed from it, or drawn from its share of the pile. */
export async function outputsOf(db: Reader, { outfitId, pickupId }: { outfitId: string; pickupId: string }): Promise<{ gradeId: string; net: string }[]> {
  const weighed = await db
    .select({ gradeId: weighIns.gradeId, net: weighIns.net })
    .from(weighIns)
    .where(and(eq(weighIns.outfitId, outfitId), eq(weighIns.pickupId, pickupId), isNull(weighIns.voidedAt)))
    .orderBy(asc(weighIns.id));
  const drawn = await db
    .select({ gradeId: weighIns.gradeId, net: sql<string>`-${movementLines.quantity}` })
    .from(movementLines)
    .innerJoin(movements, and(eq(movements.outfitId, movementLines.outfitId), eq(movements.id, movementLines.movementId)))
    .innerJoin(weighIns, and(eq(weighIns.outfitId, movements.outfitId), eq(weighIns.id, movements.documentId)))
    .where(
      and(
        eq(movementLines.outfitId, outfitId),
        eq(movementLines.pickupId, pickupId),
        eq(movementLines.place, "pile"),
        eq(movements.documentType, "weigh-in"),
        isNull(movements.reversesId),
        isNull(weighIns.pickupId),
        isNull(weighIns.voidedAt),
      ),
    )
    .orderBy(asc(weighIns.id));
  const byGrade = totalsBy(
    [...weighed, ...drawn],
    (row) => row.gradeId,
    (row) => row.net,
    add,
  );
  return [...byGrade].map(([gradeId, net]) => ({ gradeId, net }));
}

/** How many of each item kind were taken since a day, by item kind id: what the tiles are ordered by. */
export async function countsByKind(db: Reader, { outfitId, since }: { outfitId: string; since: string }): Promise<Map<string, number>> {
  const rows = await db
    .select({ itemKindId: pickupItems.itemKindId, hauls: count() })
    .from(pickupItems)
    .innerJoin(pickups, and(eq(pickups.outfitId, pickupItems.outfitId), eq(pickups.id, pickupItems.pickupId)))
    .where(and(eq(pickupItems.outfitId, outfitId), gte(pickups.pickedUpOn, since), ne(pickups.state, "void")))
    .groupBy(pickupItems.itemKindId);
  return new Map(rows.map((row) => [row.itemKindId, row.hauls]));
}

/** A line of either book about a pickup, in the order it was written. */
export type WeightLine = { movementId: string; occurredOn: string; kind: string; reversal: boolean; place: string; quantity: string };
export type MoneyLine = { entryId: string; occurredOn: string; kind: string; reversal: boolean; account: string; amountMinor: number };

/** What the weight book has of a pickup itself: logging it, working it out, taking either back. */
export async function weightRecordsOf(db: Reader, { outfitId, pickupId }: { outfitId: string; pickupId: string }): Promise<WeightLine[]> {
  const rows = await db
    .select({
      movementId: movements.id,
      occurredOn: movements.occurredOn,
      kind: movements.kind,
      reversesId: movements.reversesId,
      place: movementLines.place,
      quantity: movementLines.quantity,
    })
    .from(movements)
    .innerJoin(movementLines, and(eq(movementLines.outfitId, movements.outfitId), eq(movementLines.movementId, movements.id)))
    .where(and(eq(movements.outfitId, outfitId), eq(movements.documentType, "pickup"), eq(movements.documentId, pickupId)))
    .orderBy(asc(movements.sequence), asc(movementLines.line));
  return rows.map(({ reversesId, ...row }) => ({ ...row, quantity: trim(row.quantity), reversal: reversesId !== null }));
}

/** What the money book has of a pickup itself. For those who may see the books. */
export async function moneyRecordsOf(db: Reader, { outfitId, pickupId }: { outfitId: string; pickupId: string }): Promise<MoneyLine[]> {
  const rows = await db
    .select({
      entryId: entries.id,
      occurredOn: entries.occurredOn,
      kind: entries.kind,
      reversesId: entries.reversesId,
      account: accounts.name,
      amountMinor: postings.amountMinor,
    })
    .from(entries)
    .innerJoin(postings, and(eq(postings.outfitId, entries.outfitId), eq(postings.entryId, entries.id)))
    .innerJoin(accounts, and(eq(accounts.outfitId, postings.outfitId), eq(accounts.code, postings.account)))
    .where(and(eq(entries.outfitId, outfitId), eq(entries.documentType, "pickup"), eq(entries.documentId, pickupId)))
    .orderBy(asc(entries.sequence), asc(postings.line));
  return rows.map(({ reversesId, ...row }) => ({ ...row, reversal: reversesId !== null }));
}
