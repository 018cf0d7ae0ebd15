import { randomBytes } from "node:crypto";
import { existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import path from "node:path";
import { Refusal } from "./say.mjs";

const NAMES = ["rootPassword", "appPassword", "migrationPassword", "sessionSecret"];

/** Writes a file that only its owner can read, whole or not at all. */
export function writePrivately(file, text) {
  const half = `${file}.${process.pid}`;
  writeFileSync(half, text, { mode: 0o600 });
  renameSync(half, file);
}

/** The generated passwords of a data folder, made at the first use and kept in `secrets.json`, mode 600. */
export function secretsOf(folder) {
  const file = path.join(folder, "secrets.json");
  let kept = {};
  if (existsSync(file)) {
    try {
      kept = JSON.parse(readFileSync(file, "utf8"));
    } catch (error) {
      throw new Refusal(`Could not read ${file}: ${error.message}. Put back a copy of it; the database's passwords are in there.`);
    }
  }
  const missing = NAMES.filter((name) => typeof kept[name] !== "string");
  for (const name of missing) kept[name] = randomBytes(32).toString("hex");
  if (missing.length > 0) writePrivately(file, `${JSON.stringify(kept, null, 2)}\n`);
  return kept;
}
