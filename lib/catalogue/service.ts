import "server-only";
import { and, eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { grades } from "@/db/schema";
import { databaseErrorText, isDuplicateKey, type Transaction } from "@/db/transaction";
import type { Context } from "@/lib/auth/context";
import { audit, transact } from "@/lib/books/transact";
import { AppError, notFound } from "@/lib/http/errors";
import { isId, newId } from "@/lib/ids";
import { getGrade, getItemKind, listGrades, listItemKinds } from "./queries";
import type { Grade, GradeChange, GradeInput, GradeListQuery, ItemKindSheet } from "./schema";

/** A page of the outfit's grades. */
export const seeGrades = (ctx: Context, query: GradeListQuery) => listGrades(database(), { outfitId: ctx.outfit.id, ...query });

/** A page of the outfit's item kinds. */
export const seeItemKinds = (ctx: Context, query: { limit: number; cursor?: string }) => listItemKinds(database(), { outfitId: ctx.outfit.id, ...query });

/** An item kind with its breakdown sheet. Throws `not-found`. */
export async function requireItemKind(ctx: Context, id: string): Promise<ItemKindSheet> {
  const kind = await getItemKind(database(), { outfitId: ctx.outfit.id, id });
  if (!kind) throw notFound("item kind");
  return kind;
}

function nameTaken(error: unknown, name: string): unknown {
  if (!isDuplicateKey(error) || !databaseErrorText(error).includes("grades_name")) return error;
  const message = `There is a grade called ${name} already. Take another name.`;
  return new AppError("conflict", message, { errors: [{ path: "name", message }], cause: error });
}

async function requireGrade(tx: Transaction, ctx: Context, id: string): Promise<Grade> {
  const grade = await getGrade(tx, { outfitId: ctx.outfit.id, id });
  if (!grade) throw notFound("grade");
  return grade;
}

/** Adds a grade of the outfit's own, last in the list. Throws `conflict` when the name is taken. */
export async function addGrade(ctx: Context, input: GradeInput): Promise<Grade> {
  return transact(ctx, async (tx) => {
    const id = input.id ?? newId();
    const [last] = await tx
      .select({ position: sql<number | null>`max(${grades.position})` })
      .from(grades)
      .where(eq(grades.outfitId, ctx.outfit.id));
    try {
      await tx.insert(grades).values({
        outfitId: ctx.outfit.id,
        id,
        name: input.name,
        family: input.family,
        tradeCode: input.tradeCode ?? null,
        what: input.what ?? "",
        notThis: input.notThis ?? "",
        typicalRecovery: input.typicalRecovery ?? null,
        regulated: input.regulated ?? null,
        position: (last?.position ?? 0) + 1,
      });
    } catch (error) {
      throw nameTaken(error, input.name);
    }
    await audit(tx, ctx, "add-grade", { type: "grade", id });
    return requireGrade(tx, ctx, id);
  });
}

/** Changes a grade's words, or hides it. Throws `not-found`, `stale` with the grade as it is now, or `conflict` when the name is taken. */
export async function changeGrade(ctx: Context, id: string, change: GradeChange): Promise<Grade> {
  if (!isId(id)) throw notFound("grade");
  return transact(ctx, async (tx) => {
    const where = and(eq(grades.outfitId, ctx.outfit.id), eq(grades.id, id));
    await tx.select({ id: grades.id }).from(grades).where(where).for("update");
    const before = await requireGrade(tx, ctx, id);
    if (before.version !== ctx.ifMatch)
      throw new AppError("stale", "Somebody changed this grade first. Look at it again, then change it.", { current: before });
    try {
      await tx
        .update(grades)
        .set({ ...change, version: before.version + 1 })
        .where(where);
    } catch (error) {
      throw nameTaken(error, change.name ?? before.name);
    }
    await audit(tx, ctx, "change-grade", { type: "grade", id }, change);
    return requireGrade(tx, ctx, id);
  });
}
