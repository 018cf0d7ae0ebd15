import { database, type Database } from "./client";

/** A running transaction. Writers take one; there is no way to write without. */
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

/** Deadlock, lock wait timeout, and a row changed since the snapshot: in each case the whole unit runs again. */
const RETRIED = new Set([1213, 1205, 1020]);
const ATTEMPTS = 6;

/** MariaDB's error number behind a driver or Drizzle error, or null. */
export function databaseErrorNumber(error: unknown): number | null {
  for (let at = error; at instanceof Error; at = at.cause) {
    if ("errno" in at && typeof at.errno === "number") return at.errno;
  }
  return null;
}

/** MariaDB's error text behind a driver or Drizzle error, or an empty string. */
export function databaseErrorText(error: unknown): string {
  for (let at = error; at instanceof Error; at = at.cause) {
    if ("sqlMessage" in at && typeof at.sqlMessage === "string") return at.sqlMessage;
  }
  return "";
}

/** A row with this key was there already. */
export const isDuplicateKey = (error: unknown): boolean => databaseErrorNumber(error) === 1062;

/** A row pointed at something that is not there (or not in this outfit). */
export const isMissingReference = (error: unknown): boolean => databaseErrorNumber(error) === 1452;

const pause = (milliseconds: number) => new Promise((resolve) => setTimeout(resolve, milliseconds));

/**
 * Runs `work` in one transaction and commits it. When MariaDB asks for another try, everything runs again from the start, at most six
 * times, so `work` must not touch anything outside the transaction.
 */
export async function inTransaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await database().transaction(work, { isolationLevel: "read committed" });
    } catch (error) {
      const number = databaseErrorNumber(error);
      if (number === null || !RETRIED.has(number) || attempt === ATTEMPTS) throw error;
      await pause(2 ** attempt * 3 * (0.5 + Math.random()));
    }
  }
}
