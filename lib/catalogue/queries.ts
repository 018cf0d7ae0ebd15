import "server-only";
import { and, asc, eq, gt, or } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { grades, itemKindParts, itemKinds } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, toPage } from "@/lib/http/page";
import { isId } from "@/lib/ids";
import type { Grade, GradeListQuery, ItemKind, ItemKindSheet, SheetPart } from "./schema";

type Page<T> = { items: T[]; nextCursor: string | null };
type Scope = { outfitId: string };

/** Where a page of the catalogue starts: after this position and id. */
function startAfter(cursor: string | undefined): { position: number; id: string } | null {
  const at = decodeCursor(cursor);
  if (at === null) return null;
  if (!/^\d{1,9}$/.test(at.at) || !isId(at.id)) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  return { position: Number.parseInt(at.at, 10), id: at.id };
}

function gradeOf(row: typeof grades.$inferSelect): Grade {
  const { outfitId: _outfitId, ...rest } = row;
  return { ...rest, typicalRecovery: row.typicalRecovery === null ? null : trim(row.typicalRecovery) };
}

/** The outfit's grades in the order of lists, hidden ones too unless asked otherwise. */
export async function listGrades(db: Reader, { outfitId, ...query }: Scope & GradeListQuery): Promise<Page<Grade>> {
  const start = startAfter(query.cursor);
  const rows = await db
    .select()
    .from(grades)
    .where(
      and(
        eq(grades.outfitId, outfitId),
        query.family ? eq(grades.family, query.family) : undefined,
        query.active ? eq(grades.active, query.active === "true") : undefined,
        start ? or(gt(grades.position, start.position), and(eq(grades.position, start.position), gt(grades.id, start.id))) : undefined,
      ),
    )
    .orderBy(asc(grades.position), asc(grades.id))
    .limit(query.limit + 1);
  return toPage(rows.map(gradeOf), query.limit, (grade) => ({ at: String(grade.position), id: grade.id }));
}

/** One grade, or null. */
export async function getGrade(db: Reader, { outfitId, id }: Scope & { id: string }): Promise<Grade | null> {
  if (!isId(id)) return null;
  const [row] = await db
    .select()
    .from(grades)
    .where(and(eq(grades.outfitId, outfitId), eq(grades.id, id)));
  return row ? gradeOf(row) : null;
}

function itemKindOf(row: typeof itemKinds.$inferSelect): ItemKind {
  const { outfitId: _outfitId, groupName, ...rest } = row;
  // MariaDB keeps JSON as text; the driver hands it over read or unread, depending on its version.
  const hazards = typeof row.hazards === "string" ? (JSON.parse(row.hazards) as string[]) : row.hazards;
  return { ...rest, group: groupName, hazards, typicalWeight: trim(row.typicalWeight), minutes: row.minutes === null ? null : trim(row.minutes) };
}

/** The outfit's item kinds in the order of the catalogue. */
export async function listItemKinds(db: Reader, { outfitId, limit, cursor }: Scope & { limit: number; cursor?: string }): Promise<Page<ItemKind>> {
  const start = startAfter(cursor);
  const rows = await db
    .select()
    .from(itemKinds)
    .where(
      and(
        eq(itemKinds.outfitId, outfitId),
        start ? or(gt(itemKinds.position, start.position), and(eq(itemKinds.position, start.position), gt(itemKinds.id, start.id))) : undefined,
      ),
    )
    .orderBy(asc(itemKinds.position), asc(itemKinds.id))
    .limit(limit + 1);
  return toPage(rows.map(itemKindOf), limit, (kind) => ({ at: String(kind.position), id: kind.id }));
}

/** Every item kind that may be counted, in the order of the catalogue. */
export async function activeItemKinds(db: Reader, { outfitId }: Scope): Promise<ItemKind[]> {
  const rows = await db
    .select()
    .from(itemKinds)
    .where(and(eq(itemKinds.outfitId, outfitId), eq(itemKinds.active, true)))
    .orderBy(asc(itemKinds.position), asc(itemKinds.id));
  return rows.map(itemKindOf);
}

type GradeName = { id: string; key: string | null; name: string; family: string };

/** The outfit's own name for a grade that a sheet knows by its catalogue key. */
function namedGrade(names: Map<string | null, GradeName>, key: string): SheetPart["grade"] {
  const grade = names.get(key);
  return { key, id: grade?.id ?? null, name: grade?.name ?? key.replaceAll("-", " "), family: grade?.family ?? "other" };
}

/** An item kind with its breakdown sheet, or null. */
export async function getItemKind(db: Reader, { outfitId, id }: Scope & { id: string }): Promise<ItemKindSheet | null> {
  if (!isId(id)) return null;
  const [kind] = await db
    .select()
    .from(itemKinds)
    .where(and(eq(itemKinds.outfitId, outfitId), eq(itemKinds.id, id)));
  if (!kind) return null;
  const parts = await db
    .select()
    .from(itemKindParts)
    .where(and(eq(itemKindParts.outfitId, outfitId), eq(itemKindParts.itemKindId, id)))
    .orderBy(asc(itemKindParts.position));
  const named = await db.select({ id: grades.id, key: grades.key, name: grades.name, family: grades.family }).from(grades).where(eq(grades.outfitId, outfitId));
  const names = new Map<string | null, GradeName>(named.map((grade) => [grade.key, grade]));
  return {
    ...itemKindOf(kind),
    parts: parts.map(({ outfitId: _outfitId, itemKindId: _itemKindId, whereItSits, ...part }) => ({
      ...part,
      where: whereItSits,
      grade: namedGrade(names, part.grade),
      altGrade: part.altGrade === null ? null : namedGrade(names, part.altGrade),
      leaveAs: part.leaveAs === null ? null : namedGrade(names, part.leaveAs),
      typicalWeight: trim(part.typicalWeight),
      minutes: part.minutes === null ? null : trim(part.minutes),
    })),
  };
}
