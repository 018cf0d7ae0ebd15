import { existsSync } from "node:fs";
import { appEnv, borrowDatabase, keepUp, logsOf, migrate, openDatabase, runCommand } from "./database.mjs";
import { ensureDependencies } from "./install.mjs";
import { takeDataFolder } from "./lock.mjs";
import { findServer, stopServer } from "./mariadb.mjs";
import { Refusal, say } from "./say.mjs";
import { appPort, dataFolder } from "./settings.mjs";

const appUrl = () => `http://127.0.0.1:${appPort()}`;

/** `migrate`: brings the database to the newest schema, whether the app runs or not. */
export async function migrateCommand() {
  const folder = dataFolder();
  const logs = logsOf(folder);
  await ensureDependencies(logs);
  const { server, stop } = await borrowDatabase(folder, logs, "migrations");
  try {
    await migrate(server, appEnv(folder, server, appUrl()));
    say("The database has the newest schema.");
    return 0;
  } finally {
    await stop();
  }
}

/** `books-check`: the always-true list of every outfit. Ends with 1 when a rule does not hold. */
export async function booksCheck() {
  const folder = dataFolder();
  const logs = logsOf(folder);
  await ensureDependencies(logs);
  const { server, stop } = await borrowDatabase(folder, logs, "a check of the books");
  try {
    return await runCommand("db/books-check.ts", appEnv(folder, server, appUrl()));
  } finally {
    await stop();
  }
}

/** `db`: the private server alone, left running, for working on the code. Prints the environment as lines for a shell. */
export async function databaseUp() {
  if (process.env.DATABASE_URL) throw new Refusal("DATABASE_URL is set, so there is no private server to start. Unset it first.");
  const folder = dataFolder();
  const logs = logsOf(folder);
  await ensureDependencies(logs);
  if (!findServer(folder)) takeDataFolder(folder, "the start of its database");
  const { server } = await openDatabase(folder, logs);
  const env = appEnv(folder, server, appUrl());
  await migrate(server, env);
  keepUp(server);
  for (const [name, value] of Object.entries(env)) process.stdout.write(`export ${name}='${value.replaceAll("'", `'\\''`)}'\n`);
  return 0;
}

/** `db-stop`: stops what `db` started. */
export async function databaseDown() {
  const server = findServer(dataFolder());
  if (!server) say("No private database runs from this data folder.");
  else if (!existsSync(server.keepFile)) throw new Refusal("This database belongs to a running app. Stop the app instead (Ctrl-C where it runs).");
  else {
    await stopServer(server);
    say("The private database is stopped.");
  }
  return 0;
}
