import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { grades } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { seesPrices } from "@/lib/auth/permissions";
import { aliasesOf, getSheet, getYard, latestSheetId, listYards } from "./queries";
import type { Sheet, Yard } from "./schema";

/** A row of the sheet form: a grade, and what the yard pays when it is on the sheet. */
export type SheetRow = { gradeId: string; name: string; family: string; wording: string; price: string; per: string };

async function rowsFor(ctx: Context, yardId: string, sheet: Sheet | null): Promise<SheetRow[]> {
  const db = database();
  const [gradeRows, aliases] = await Promise.all([
    db
      .select({ id: grades.id, name: grades.name, family: grades.family })
      .from(grades)
      .where(and(eq(grades.outfitId, ctx.outfit.id), eq(grades.active, true)))
      .orderBy(asc(grades.position)),
    aliasesOf(db, { outfitId: ctx.outfit.id }),
  ]);
  const wordings = new Map(aliases.filter((alias) => alias.yardId === yardId).map((alias) => [alias.gradeId, alias.wording]));
  const lines = new Map(sheet?.lines.map((line) => [line.gradeId, line]));
  const rows = gradeRows.map(({ id, name, family }) => {
    const line = lines.get(id);
    return {
      gradeId: id,
      name,
      family,
      wording: line?.yardWording ?? wordings.get(id) ?? "",
      price: line?.price ?? "",
      per: line?.per ?? ctx.outfit.weightUnit,
    };
  });
  // What the yard priced last time comes first; the rest of the catalogue follows.
  return [...rows.filter((row) => row.price !== ""), ...rows.filter((row) => row.price === "")];
}

/** What the form for a new sheet starts with: the yard's last sheet, to be changed where it changed. */
export async function sheetToType(ctx: Context, asked: string | undefined) {
  const db = database();
  const yards = (await listYards(db, { outfitId: ctx.outfit.id })).filter((yard) => yard.active).map(({ id, name }) => ({ id, name }));
  const yardId = yards.find((yard) => yard.id === asked)?.id ?? yards[0]?.id ?? "";
  const latest = seesPrices(ctx.actor.role, ctx.outfit.hidesMoney) ? await latestSheetId(db, { outfitId: ctx.outfit.id, yardId }) : null;
  const sheet = latest === null ? null : await getSheet(db, { outfitId: ctx.outfit.id, id: latest });
  return { yards, yardId, rows: await rowsFor(ctx, yardId, sheet), copiedFrom: sheet?.inForceFrom ?? null };
}

/** A kept sheet with the rows of its form, or null. */
export async function sheetToChange(ctx: Context, id: string): Promise<{ sheet: Sheet; rows: SheetRow[] } | null> {
  const sheet = await getSheet(database(), { outfitId: ctx.outfit.id, id });
  return sheet === null ? null : { sheet, rows: await rowsFor(ctx, sheet.yardId, sheet) };
}

/** One yard, or null. */
export const findYard = (ctx: Context, id: string): Promise<Yard | null> => getYard(database(), { outfitId: ctx.outfit.id, id });

/** One price sheet, or null. Whether the member sees prices is for the page. */
export const findSheet = (ctx: Context, id: string): Promise<Sheet | null> => getSheet(database(), { outfitId: ctx.outfit.id, id });
