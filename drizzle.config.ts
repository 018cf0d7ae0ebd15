import { defineConfig } from "drizzle-kit";

// Only `generate` is used: migrations are applied by db/migrate.ts, because drizzle-kit push and
// pull misread MariaDB's column types.
export default defineConfig({ dialect: "mysql", schema: "./db/schema/index.ts", out: "./drizzle" });
