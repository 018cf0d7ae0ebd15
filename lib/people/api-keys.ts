import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { apiKeys } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import { hashToken, makeToken } from "@/lib/auth/tokens";
import { audit, transact } from "@/lib/books/transact";
import { notFound } from "@/lib/http/errors";
import { isId, newId } from "@/lib/ids";
import { listApiKeys } from "./queries";
import type { ApiKey } from "./schema";

const SHOWN_LETTERS = 10;

type Row = Awaited<ReturnType<typeof listApiKeys>>[number];

const keyOf = (row: Row): ApiKey => ({ ...row, createdAt: row.createdAt.toISOString(), lastUsedAt: row.lastUsedAt?.toISOString() ?? null });

/** API keys in use; the keys themselves are not shown again. */
export async function seeApiKeys(ctx: Context): Promise<{ items: ApiKey[]; nextCursor: null }> {
  return { items: (await listApiKeys(database(), { outfitId: ctx.outfit.id })).map(keyOf), nextCursor: null };
}

/** Makes an API key. The answer has the key; only its hash is kept. */
export async function makeApiKey(ctx: Context, input: { name: string; role: Role }): Promise<ApiKey & { key: string }> {
  return transact(ctx, async (tx) => {
    const key = makeToken("cw");
    const row = { id: newId(), ...input, prefix: key.slice(0, SHOWN_LETTERS), createdAt: ctx.now };
    await tx.insert(apiKeys).values({ ...row, outfitId: ctx.outfit.id, keyHash: hashToken(key), createdBy: ctx.actor.memberId });
    await audit(tx, ctx, "make-api-key", { type: "api-key", id: row.id }, { name: input.name, role: input.role });
    return { ...keyOf({ ...row, lastUsedAt: null }), key };
  });
}

/** Takes an API key out of use, from the next request on. */
export async function revokeApiKey(ctx: Context, id: string): Promise<{ done: true }> {
  return transact(ctx, async (tx) => {
    const [result] = isId(id)
      ? await tx
          .update(apiKeys)
          .set({ revokedAt: ctx.now })
          .where(and(eq(apiKeys.outfitId, ctx.outfit.id), eq(apiKeys.id, id), isNull(apiKeys.revokedAt)))
      : [{ affectedRows: 0 }];
    if (result.affectedRows === 0) throw notFound("API key");
    await audit(tx, ctx, "revoke-api-key", { type: "api-key", id });
    return { done: true };
  });
}
