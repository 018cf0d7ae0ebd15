import path from "node:path";
import { fileURLToPath } from "node:url";
import { drizzle } from "drizzle-orm/mysql2";
import { migrate as applyMigrations } from "drizzle-orm/mysql2/migrator";
import mysql from "mysql2/promise";
import { migrationUrl } from "@/lib/env";

const folder = path.join(path.dirname(fileURLToPath(import.meta.url)), "..", "drizzle");

/** Brings the database at `url` to the newest schema. Does nothing when it is there already. */
export async function migrate(url: string): Promise<void> {
  const connection = await mysql.createConnection({ uri: url, timezone: "Z", charset: "utf8mb4" });
  try {
    await applyMigrations(drizzle(connection), { migrationsFolder: folder });
  } finally {
    await connection.end();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await migrate(migrationUrl());
