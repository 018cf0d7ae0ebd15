import { adminSql, DATABASE } from "./mariadb.mjs";

/** Tables whose rows are never changed or removed. Triggers refuse it for everyone; the application is not even allowed to try. */
const APPEND_ONLY = ["movements", "movement_lines", "entries", "postings", "audit_log", "__drizzle_migrations"];

/** Lets the application change rows in every table but the append-only ones. Run after migrations, which may have brought new tables. */
export function grantTables(server) {
  const kept = APPEND_ONLY.map((name) => `'${name}'`).join(", ");
  const tables = adminSql(
    server,
    `SELECT table_name FROM information_schema.tables WHERE table_schema = '${DATABASE}' AND table_type = 'BASE TABLE' AND table_name NOT IN (${kept});`,
  )
    .split("\n")
    .filter((name) => name !== "");
  adminSql(server, tables.map((name) => `GRANT UPDATE, DELETE ON ${DATABASE}.\`${name}\` TO 'curbweight_app'@'127.0.0.1';`).join("\n"));
}
