import { fieldError } from "./errors";

/** Where a page of a list ends: the sort value and id of its last row, opaque to the caller. */
export type Cursor = { at: string; id: string };

export const encodeCursor = (cursor: Cursor): string => Buffer.from(JSON.stringify([cursor.at, cursor.id])).toString("base64url");

/** Reads a cursor back. Throws `input` for text that is none. */
export function decodeCursor(text: string | undefined): Cursor | null {
  if (text === undefined) return null;
  try {
    const parsed: unknown = JSON.parse(Buffer.from(text, "base64url").toString("utf8"));
    if (Array.isArray(parsed) && parsed.length === 2 && parsed.every((part) => typeof part === "string" && part.length <= 64)) {
      return { at: parsed[0] as string, id: parsed[1] as string };
    }
  } catch {
    // Falls through to the one answer for every unreadable cursor.
  }
  throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
}

/** Cuts `limit + 1` rows to a page and says where the next one starts. */
export function toPage<T>(rows: T[], limit: number, cursorOf: (row: T) => Cursor): { items: T[]; nextCursor: string | null } {
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last !== undefined ? encodeCursor(cursorOf(last)) : null };
}
