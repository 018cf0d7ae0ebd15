import mysql from "mysql2/promise";
import { afterAll, afterEach, beforeEach, expect, vi, type MockInstance } from "vitest";

const admin = new URL(process.env.TEST_DATABASE_ADMIN_URL ?? "");
const name = `curbweight_test_${process.env.VITEST_POOL_ID ?? "1"}`;
const own = new URL(admin);
own.pathname = `/${name}`;

// Set before any of the app's modules is loaded: the tests import those after this file has run.
Object.assign(process.env, {
  DATABASE_URL: own.href,
  MIGRATION_DATABASE_URL: own.href,
  NEXTAUTH_SECRET: "a secret that only the tests use, long enough",
  NEXTAUTH_URL: "http://127.0.0.1:3000",
  LOG_LEVEL: "silent",
});

const connection = await mysql.createConnection({ uri: admin.href });
const collation = "utf8mb4_uca1400_ai_ci";
const [known] = await connection.query<mysql.RowDataPacket[]>(
  "SELECT 1 FROM information_schema.COLLATION_CHARACTER_SET_APPLICABILITY WHERE FULL_COLLATION_NAME = ?",
  [collation],
);
await connection.query(`CREATE DATABASE IF NOT EXISTS ${name} CHARACTER SET utf8mb4 COLLATE ${known.length > 0 ? collation : "utf8mb4_unicode_ci"}`);
await connection.end();
const { migrate } = await import("@/db/migrate");
await migrate(own.href);

let complaints: MockInstance<typeof console.error>;

beforeEach(() => {
  complaints = vi.spyOn(console, "error");
});

afterEach(() => {
  const said = complaints.mock.calls;
  complaints.mockRestore();
  expect(said, "nothing may be written to console.error").toEqual([]);
});

afterAll(async () => {
  const { closeDatabase } = await import("@/db/client");
  await closeDatabase();
});
