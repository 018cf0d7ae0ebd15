import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { runQuietly } from "./processes.mjs";
import { say } from "./say.mjs";
import { root } from "./settings.mjs";

/** What a build is made of. */
const SOURCES = [
  "app",
  "components",
  "lib",
  "db",
  "public",
  "instrumentation.ts",
  "proxy.ts",
  "next.config.ts",
  "postcss.config.mjs",
  "tailwind.config.ts",
  "tsconfig.json",
  "package.json",
  "package-lock.json",
];
const NOT_BUILT = new Set([path.join("db", "server")]);

export const nextProgram = path.join(root, "node_modules", "next", "dist", "bin", "next");

function addTo(hash, place) {
  const full = path.join(root, place);
  if (!existsSync(full) || NOT_BUILT.has(place)) return;
  let entries;
  try {
    entries = readdirSync(full).sort();
  } catch (error) {
    if (error.code !== "ENOTDIR") throw error;
    hash.update(`${place}\0`).update(createHash("sha256").update(readFileSync(full)).digest());
    return;
  }
  for (const entry of entries) addTo(hash, path.join(place, entry));
}

/** Builds the app for production when its sources are not those of the build that is there. */
export async function ensureBuild(logs) {
  const hash = createHash("sha256").update(process.version);
  for (const place of SOURCES) addTo(hash, place);
  const wanted = hash.digest("hex");
  const stamp = path.join(root, ".next", "built-from");
  const built = existsSync(path.join(root, ".next", "BUILD_ID")) && existsSync(stamp) ? readFileSync(stamp, "utf8") : "";
  if (built === wanted) return;
  say("Building the app. This takes about half a minute.");
  await runQuietly(process.execPath, [nextProgram, "build"], {
    logFile: path.join(logs, "next-build.log"),
    failure: "The app could not be built.",
    env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" },
  });
  writeFileSync(stamp, wanted);
}
