import { createHash } from "node:crypto";
import { mkdirSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { Refusal } from "./say.mjs";

/** The project's folder. */
export const root = path.join(path.dirname(fileURLToPath(import.meta.url)), "..", "..");

/** Unix sockets take at most 107 bytes of path on Linux. */
const LONGEST_SOCKET_PATH = 100;

/** Reads `.env` when there is one. A variable that is set already keeps its value. */
export function readEnvFile() {
  try {
    process.loadEnvFile(path.join(root, ".env"));
  } catch (error) {
    if (error.code !== "ENOENT") throw new Refusal(`Could not read .env: ${error.message}`);
  }
}

/** The data folder as the person chose it, made when it is not there. */
export function dataFolder() {
  const folder = path.resolve(root, process.env.DATA_DIR || ".data");
  makeFolder(folder);
  return folder;
}

/** Makes a folder that only its owner can open. */
export function makeFolder(folder) {
  try {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
  } catch (error) {
    throw new Refusal(`Could not make the folder ${folder} (${error.code}). Choose another one with DATA_DIR.`);
  }
}

/** The port to serve on. */
export function appPort() {
  const text = process.env.PORT || "3000";
  const port = Number.parseInt(text, 10);
  if (!/^\d+$/.test(text) || port < 1 || port > 65535) {
    throw new Refusal(`PORT is "${text}", and a port is a whole number from 1 to 65535. Example: PORT=3001 npm start`);
  }
  return port;
}

/** Where the database listens: inside its data folder, or in the system's folder for temporary files when that path is too long. */
export function socketPath(folder) {
  const near = path.join(folder, "mariadb.sock");
  if (Buffer.byteLength(near) <= LONGEST_SOCKET_PATH) return near;
  const short = path.join(os.tmpdir(), `curbweight-${createHash("sha256").update(folder).digest("hex").slice(0, 12)}`);
  makeFolder(short);
  return path.join(short, "mariadb.sock");
}
