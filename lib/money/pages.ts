import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { accounts, grades } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { listEntries, listMovements, totalOfLines, totalOfPostings } from "./book-queries";
import type { EntryListQuery, MovementListQuery } from "./schema";

async function gradeName(ctx: Context, gradeId: string | undefined): Promise<string | null> {
  if (gradeId === undefined) return null;
  const [row] = await database()
    .select({ name: grades.name })
    .from(grades)
    .where(and(eq(grades.outfitId, ctx.outfit.id), eq(grades.id, gradeId)));
  return row?.name ?? null;
}

/** A page of the money book with what its filter comes to, and the accounts to choose from. */
export async function getEntriesPage(ctx: Context, query: EntryListQuery) {
  const outfitId = ctx.outfit.id;
  const [page, totalMinor, accountRows, grade] = await Promise.all([
    listEntries(database(), { outfitId, ...query }),
    totalOfPostings(database(), { outfitId, ...query }),
    database().select({ code: accounts.code, name: accounts.name }).from(accounts).where(eq(accounts.outfitId, outfitId)).orderBy(asc(accounts.position)),
    gradeName(ctx, query.gradeId),
  ]);
  return { ...page, totalMinor, accounts: accountRows, grade };
}

/** A page of the weight book with what its filter weighs together. */
export async function getMovementsPage(ctx: Context, query: MovementListQuery) {
  const outfitId = ctx.outfit.id;
  const [page, total, grade] = await Promise.all([
    listMovements(database(), { outfitId, ...query }),
    totalOfLines(database(), { outfitId, ...query }),
    gradeName(ctx, query.gradeId),
  ]);
  return { ...page, total, grade };
}
