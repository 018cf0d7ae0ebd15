import { existsSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { grantTables } from "./grants.mjs";
import { ensureMariadb } from "./install.mjs";
import { takeDataFolder } from "./lock.mjs";
import { findServer, startServer, stopServer } from "./mariadb.mjs";
import { run } from "./processes.mjs";
import { Refusal } from "./say.mjs";
import { secretsOf } from "./secrets.mjs";
import { makeFolder, root } from "./settings.mjs";

/** Where the logs of set-up steps go. */
export function logsOf(folder) {
  const logs = path.join(folder, "logs");
  makeFolder(logs);
  return logs;
}

/** Runs one of the project's own TypeScript commands and gives its exit code. */
export const runCommand = (file, env, args = []) =>
  run(process.execPath, ["--import", "./db/server/typescript.mjs", file, ...args], { cwd: root, env: { ...process.env, ...env } });

/** The environment that the application needs. What the person set keeps its value. */
export function appEnv(folder, server, appUrl) {
  const own = server ?? { appUrl: process.env.DATABASE_URL, migrationUrl: process.env.MIGRATION_DATABASE_URL || process.env.DATABASE_URL };
  return {
    DATABASE_URL: own.appUrl,
    MIGRATION_DATABASE_URL: own.migrationUrl,
    NEXTAUTH_SECRET: process.env.NEXTAUTH_SECRET || secretsOf(folder).sessionSecret,
    NEXTAUTH_URL: process.env.NEXTAUTH_URL || appUrl,
    NEXT_TELEMETRY_DISABLED: "1",
  };
}

/** Brings the database to the newest schema. */
export async function migrate(server, env) {
  if ((await runCommand("db/migrate.ts", env)) !== 0) throw new Refusal("The database could not be brought to the newest schema. The reason stands above.");
  if (server) grantTables(server);
}

/**
 * Gives the database to work with: the person's own server when DATABASE_URL is set (`server` is then null), otherwise the private one,
 * started when it does not run. `stop` leaves a server alone that was started to stay up.
 */
export async function openDatabase(folder, logs) {
  if (process.env.DATABASE_URL) return { server: null, stop: async () => {} };
  await ensureMariadb(logs);
  const server = await startServer(folder, logs);
  return { server, stop: async () => (existsSync(server.keepFile) ? undefined : stopServer(server)) };
}

/** Like openDatabase for a short command: uses the server that runs, or starts one and takes the data folder for as long. */
export async function borrowDatabase(folder, logs, doing) {
  const server = process.env.DATABASE_URL ? null : findServer(folder);
  if (server) return { server: await startServer(folder, logs), stop: async () => {} };
  if (!process.env.DATABASE_URL) takeDataFolder(folder, doing);
  return openDatabase(folder, logs);
}

/** Marks the server as one that stays up when the command that started it ends. */
export const keepUp = (server) => writeFileSync(server.keepFile, "");

/** Removes a throwaway data folder. */
export const removeFolder = (folder) => rmSync(folder, { recursive: true, force: true });
