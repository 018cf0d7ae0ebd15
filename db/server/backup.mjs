import { createReadStream, createWriteStream, existsSync, renameSync, rmSync } from "node:fs";
import path from "node:path";
import { pipeline } from "node:stream/promises";
import { createGunzip, createGzip } from "node:zlib";
import { spawn } from "node:child_process";
import { appEnv, borrowDatabase, logsOf, migrate, openDatabase } from "./database.mjs";
import { ensureDependencies } from "./install.mjs";
import { takeDataFolder } from "./lock.mjs";
import { adminSql, DATABASE } from "./mariadb.mjs";
import { ended, findProgram } from "./processes.mjs";
import { lastLines, Refusal, say } from "./say.mjs";
import { appPort, dataFolder, makeFolder } from "./settings.mjs";

function refuseOwnServer(what) {
  if (!process.env.DATABASE_URL) return;
  throw new Refusal(
    `DATABASE_URL is set, so your data is on a server of your own. ${what} it with that server's tools, for example mariadb-dump --single-transaction.`,
  );
}

/** Runs a MariaDB program as administrator with a stream on one side, and throws a Refusal with its last words when it fails. */
async function stream(server, program, args, connect) {
  const child = spawn(findProgram(program), [`--defaults-file=${server.clientFile}`, ...args], { stdio: ["pipe", "pipe", "pipe"] });
  let complaint = "";
  child.stderr.on("data", (text) => (complaint += text));
  const code = ended(child);
  let broken = null;
  await connect(child).catch((error) => (broken = error));
  if ((await code) !== 0) throw new Refusal(`${program} failed: ${lastLines(complaint, 1)[0] ?? "no reason given"}`);
  if (broken) throw new Refusal(`The file could not be read or written: ${broken.message}`);
}

/** Writes the whole database into a compressed file: one moment of it, taken without stopping anyone. The file is there whole or not at all. */
async function dumpTo(server, file) {
  const half = `${file}.part`;
  try {
    await stream(server, "mariadb-dump", ["--single-transaction", "--quick", "--hex-blob", "--triggers", DATABASE], (child) => {
      child.stdin.end();
      return pipeline(child.stdout, createGzip(), createWriteStream(half, { mode: 0o600 }));
    });
    renameSync(half, file);
  } finally {
    rmSync(half, { force: true });
  }
}

const load = (server, file) =>
  stream(server, "mariadb", [DATABASE], (child) => {
    child.stdout.resume();
    const steps = file.endsWith(".gz") ? [createGunzip()] : [];
    return pipeline(createReadStream(file), ...steps, child.stdin);
  });

function newFile(folder, word) {
  const backups = path.join(folder, "backups");
  makeFolder(backups);
  const stamp = new Date().toISOString().replace(/[-:]/g, "").replace("T", "-").slice(0, 15);
  return path.join(backups, `${word}-${stamp}.sql.gz`);
}

/** `backup [FILE]`: writes a copy of the private database, whether the app runs or not, and prints where it is. */
export async function backup([wanted]) {
  refuseOwnServer("Back up");
  const folder = dataFolder();
  const { server, stop } = await borrowDatabase(folder, logsOf(folder), "a backup");
  try {
    const file = wanted ? path.resolve(wanted) : newFile(folder, "curbweight");
    await dumpTo(server, file);
    process.stdout.write(`${file}\n`);
    return 0;
  } finally {
    await stop();
  }
}

/**
 * `restore FILE`: puts a backup in the place of the private database. What was there is backed up first. The app must not run.
 */
export async function restore([wanted]) {
  refuseOwnServer("Restore");
  if (!wanted) throw new Refusal("Say which file to restore: npm run restore -- .data/backups/curbweight-20260131-180000.sql.gz");
  const file = path.resolve(wanted);
  if (!existsSync(file)) throw new Refusal(`There is no file ${file}.`);
  const folder = dataFolder();
  const logs = logsOf(folder);
  takeDataFolder(folder, "a restore");
  await ensureDependencies(logs);
  const { server, stop } = await openDatabase(folder, logs);
  try {
    const before = newFile(folder, "before-restore");
    await dumpTo(server, before);
    say(`What was there until now: ${before}`);
    const [made] = adminSql(server, `SELECT DEFAULT_COLLATION_NAME FROM information_schema.SCHEMATA WHERE SCHEMA_NAME = '${DATABASE}';`).split("\n");
    const empty = `DROP DATABASE ${DATABASE}; CREATE DATABASE ${DATABASE} CHARACTER SET utf8mb4 COLLATE ${made};`;
    adminSql(server, empty);
    try {
      await load(server, file);
    } catch (error) {
      adminSql(server, empty);
      await load(server, before);
      throw new Refusal(`${error.message}\n${file} could not be restored. The data is as it was before.`);
    }
    await migrate(server, appEnv(folder, server, `http://127.0.0.1:${appPort()}`));
    say(`Restored from ${file}.`);
    return 0;
  } finally {
    await stop();
  }
}
