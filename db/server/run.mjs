#!/usr/bin/env node
// The project's commands. Nothing but Node is taken for granted here: the npm packages may not be installed yet.
import { stopAll } from "./processes.mjs";
import { Refusal, say } from "./say.mjs";
import { readEnvFile } from "./settings.mjs";

const COMMANDS = {
  start: () => import("./serve.mjs").then(({ serve }) => serve("start")),
  dev: () => import("./serve.mjs").then(({ serve }) => serve("dev")),
  test: () => import("./test.mjs").then(({ testAll }) => testAll()),
  "test-api": (args) => import("./test.mjs").then(({ testApi }) => testApi(args)),
  "test-e2e": (args) => import("./test.mjs").then(({ testBrowser }) => testBrowser(args)),
  migrate: () => import("./commands.mjs").then(({ migrateCommand }) => migrateCommand()),
  "books-check": () => import("./commands.mjs").then(({ booksCheck }) => booksCheck()),
  backup: (args) => import("./backup.mjs").then(({ backup }) => backup(args)),
  restore: (args) => import("./backup.mjs").then(({ restore }) => restore(args)),
  db: () => import("./commands.mjs").then(({ databaseUp }) => databaseUp()),
  "db-stop": () => import("./commands.mjs").then(({ databaseDown }) => databaseDown()),
};

const [name = "", ...args] = process.argv.slice(2);

try {
  const command = COMMANDS[name];
  if (!command) throw new Refusal(`Usage: node db/server/run.mjs ${Object.keys(COMMANDS).join(" | ")}`);
  readEnvFile();
  process.exitCode = await command(args);
} catch (error) {
  await stopAll();
  if (error instanceof Refusal) say(error.message);
  else say(`Something unexpected stopped "${name}": ${error.message}${process.env.DEBUG ? `\n${error.stack}` : " (DEBUG=1 shows where.)"}`);
  process.exitCode = 1;
}
