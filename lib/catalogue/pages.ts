import "server-only";
import { database } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { activeItemKinds, getItemKind, listGrades } from "./queries";
import type { ItemKind, ItemKindSheet } from "./schema";

/** Every item kind whose name or group has these words in it; all of them for no words. */
export async function findItemKinds(ctx: Context, words: string): Promise<ItemKind[]> {
  const kinds = await activeItemKinds(database(), { outfitId: ctx.outfit.id });
  const wanted = words.trim().toLowerCase();
  return kinds.filter((kind) => `${kind.name} ${kind.plural} ${kind.tileName} ${kind.group}`.toLowerCase().includes(wanted));
}

/** An item kind with its breakdown sheet, or null. */
export const getSheetPage = (ctx: Context, id: string): Promise<ItemKindSheet | null> => getItemKind(database(), { outfitId: ctx.outfit.id, id });

/** The grades in use, for the picker of a new bin. */
export async function gradesToHold(ctx: Context): Promise<{ id: string; name: string }[]> {
  const { items } = await listGrades(database(), { outfitId: ctx.outfit.id, limit: 200, active: "true" });
  return items.map(({ id, name }) => ({ id, name }));
}
