import "server-only";
import { database } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { can } from "@/lib/auth/permissions";
import { activeItemKinds } from "@/lib/catalogue/queries";
import type { ItemKind } from "@/lib/catalogue/schema";
import { addDays } from "@/lib/clock";
import { countsByKind, getPickup, moneyRecordsOf, weightRecordsOf, type MoneyLine, type WeightLine } from "./queries";
import type { PickupRecord } from "./schema";

/** How far back the tiles look for what this outfit picks up most. */
const DAYS_LOOKED_BACK = 180;

/** The item kinds to count, the ones in most hauls of late first; those never taken follow in the catalogue's order. */
export async function kindsToCount(ctx: Context): Promise<ItemKind[]> {
  const outfitId = ctx.outfit.id;
  const [kinds, hauls] = await Promise.all([
    activeItemKinds(database(), { outfitId }),
    countsByKind(database(), { outfitId, since: addDays(ctx.today, -DAYS_LOOKED_BACK) }),
  ]);
  return kinds.toSorted((a, b) => (hauls.get(b.id) ?? 0) - (hauls.get(a.id) ?? 0) || a.position - b.position);
}

export type PickupPage = {
  pickup: PickupRecord;
  weight: WeightLine[];
  /** Null for those who may not see the books. */
  money: MoneyLine[] | null;
};

/** A pickup with its records in both books, or null. */
export async function getPickupPage(ctx: Context, id: string): Promise<PickupPage | null> {
  const outfitId = ctx.outfit.id;
  const pickup = await getPickup(database(), { outfitId, id, viewer: ctx });
  if (!pickup) return null;
  const [weight, money] = await Promise.all([
    weightRecordsOf(database(), { outfitId, pickupId: id }),
    can(ctx.actor.role, "books.see") ? moneyRecordsOf(database(), { outfitId, pickupId: id }) : null,
  ]);
  return { pickup, weight, money };
}
