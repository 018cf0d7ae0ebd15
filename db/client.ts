import { drizzle, type MySql2Database } from "drizzle-orm/mysql2";
import mysql, { type Pool } from "mysql2/promise";
import * as schema from "./schema";
import { env } from "@/lib/env";

export type Database = MySql2Database<typeof schema>;
/** What reads take: the pool, or the transaction they belong to. */
export type Reader = Pick<Database, "select" | "selectDistinct" | "execute" | "$with" | "with">;

/**
 * A pool whose connections all speak alike: UTC, strict mode, READ COMMITTED (every statement sees the latest commit, which the books'
 * lock relies on), exact decimals and integers as strings where JavaScript could round them.
 */
export function makePool(url: string, connectionLimit = 16): Pool {
  const pool = mysql.createPool({
    uri: url,
    connectionLimit,
    timezone: "Z",
    charset: "utf8mb4",
    decimalNumbers: false,
    supportBigNumbers: true,
    dateStrings: ["DATE"],
  });
  pool.pool.on("connection", (connection) => {
    connection.query(
      "SET SESSION time_zone = '+00:00', sql_mode = 'STRICT_ALL_TABLES,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION', tx_isolation = 'READ-COMMITTED', innodb_lock_wait_timeout = 10",
    );
  });
  return pool;
}

type Held = { pool: Pool; db: Database };
const holder = globalThis as typeof globalThis & { curbweightDatabase?: Held };

function held(): Held {
  // Kept on globalThis because the development server loads this module again after each change.
  holder.curbweightDatabase ??= (() => {
    const pool = makePool(env().DATABASE_URL);
    return { pool, db: drizzle(pool, { schema, mode: "default" }) };
  })();
  return holder.curbweightDatabase;
}

/** The application's database. Opens its pool at the first use. */
export const database = (): Database => held().db;

/** The pool itself, for libraries that bring their own statements. */
export const databasePool = (): Pool => held().pool;

/** Closes the pool: at the end of a command or a test run. */
export async function closeDatabase(): Promise<void> {
  const open = holder.curbweightDatabase;
  delete holder.curbweightDatabase;
  await open?.pool.end();
}
