import { linkSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { isAlive } from "./processes.mjs";
import { Refusal } from "./say.mjs";

/** When a process started, in clock ticks since the machine did. With its id it names one process for good; ids alone are used again. */
function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    return stat.slice(stat.lastIndexOf(")") + 2).split(" ")[19] ?? null;
  } catch {
    return null;
  }
}

/** Who holds the lock, or null when nobody does or the holder is gone. */
function holderOf(file) {
  try {
    const holder = JSON.parse(readFileSync(file, "utf8"));
    return isAlive(holder.pid) && startOf(holder.pid) === holder.startedAt ? holder : null;
  } catch {
    return null;
  }
}

/**
 * Takes the data folder for this command, or throws a Refusal that names the command that has it. A lock left by a command that was
 * killed does not count. Released when the process ends.
 */
export function takeDataFolder(folder, doing) {
  const file = path.join(folder, "in-use.json");
  const own = `${file}.${process.pid}`;
  writeFileSync(own, JSON.stringify({ pid: process.pid, startedAt: startOf(process.pid), doing }));
  try {
    for (;;) {
      try {
        // A hard link appears whole or not at all, so two commands cannot both believe that they were first.
        linkSync(own, file);
        break;
      } catch (error) {
        if (error.code !== "EEXIST") throw error;
        const holder = holderOf(file);
        if (holder) {
          throw new Refusal(
            `The data folder ${folder} is in use: ${holder.doing} (process ${holder.pid}). Stop that first, or choose another folder: DATA_DIR=other-folder`,
          );
        }
        rmSync(file, { force: true });
      }
    }
  } finally {
    rmSync(own, { force: true });
  }
  process.once("exit", () => rmSync(file, { force: true }));
}
