import { spawn } from "node:child_process";
import { accessSync, closeSync, constants, mkdirSync, openSync, readFileSync } from "node:fs";
import path from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { lastLines, Refusal } from "./say.mjs";
import { root } from "./settings.mjs";

/** Debian keeps servers in folders that a plain user's PATH leaves out. */
const MORE_FOLDERS = ["/usr/local/sbin", "/usr/sbin", "/sbin", "/usr/local/bin", "/usr/bin", "/bin"];

/** The full path of a program, or null when it is not installed. */
export function findProgram(name) {
  for (const folder of [...(process.env.PATH ?? "").split(path.delimiter), ...MORE_FOLDERS]) {
    const file = path.join(folder || ".", name);
    try {
      accessSync(file, constants.X_OK);
      return file;
    } catch {
      continue;
    }
  }
  return null;
}

const started = new Set();
let closing = false;

/** Starts a program and keeps it in mind, so that an interrupted command leaves nothing running. Once stopping began, nothing starts. */
export function start(program, args, options = {}) {
  if (closing) throw new Refusal("Stopping.");
  const child = spawn(program, args, { cwd: root, stdio: "inherit", ...options });
  started.add(child);
  child.once("exit", () => started.delete(child));
  child.once("error", () => started.delete(child));
  return child;
}

/** Ends with the child's exit code; a child ended by a signal counts as 1. */
export const ended = (child) =>
  new Promise((resolve, reject) => {
    if (child.exitCode !== null || child.signalCode !== null) resolve(child.exitCode ?? 1);
    child.once("error", reject);
    child.once("exit", (code) => resolve(code ?? 1));
  });

/** Runs a program to its end, showing what it prints, and gives its exit code. */
export const run = (program, args, options) => ended(start(program, args, options));

/**
 * Runs a program quietly: what it prints goes to `logFile`. When it fails, throws a Refusal that starts with `failure` and carries the
 * last lines of the log.
 */
export async function runQuietly(program, args, { logFile, failure, ...options }) {
  mkdirSync(path.dirname(logFile), { recursive: true });
  const output = openSync(logFile, "w");
  let code;
  try {
    code = await run(program, args, { ...options, stdio: ["ignore", output, output] });
  } finally {
    closeSync(output);
  }
  if (code === 0) return;
  const tail = lastLines(readFileSync(logFile, "utf8"), 12).map((line) => `  ${line}`);
  throw new Refusal([failure, ...tail, `The whole log: ${logFile}`].join("\n"));
}

/** Whether a process with this id is there. */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === "EPERM";
  }
}

/** Asks a child to end, waits, and ends it by force when it has not gone after `patience` milliseconds. */
export async function stop(child, patience = 10_000) {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = ended(child);
  child.kill("SIGTERM");
  await Promise.race([gone, pause(patience, undefined, { ref: false })]);
  if (child.exitCode === null && child.signalCode === null) child.kill("SIGKILL");
  await gone;
}

/** Stops everything that this command started and that still runs, and lets nothing new start. */
export function stopAll() {
  closing = true;
  return Promise.all([...started].map((child) => stop(child)));
}

/** Resolves with "asked" at the first signal that asks this command to end. Later ones change nothing: stopping is under way. */
export function askedToStop() {
  return new Promise((resolve) => {
    for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => resolve("asked"));
  });
}
