import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { spawnSync } from "node:child_process";
import path from "node:path";
import { findProgram, runQuietly } from "./processes.mjs";
import { Refusal, say } from "./say.mjs";
import { root } from "./settings.mjs";

const POLICY = "/usr/sbin/policy-rc.d";
const POLICY_ASIDE = "/usr/sbin/policy-rc.d.before-curbweight";
const OUR_POLICY = "#!/bin/sh\n# Put here by Curbweight while it installs a package; removed right after.\nexit 101\n";

const readJson = (file) => JSON.parse(readFileSync(file, "utf8"));

/** Whether node_modules holds exactly what package-lock.json names. npm writes the list of what it installed beside the packages. */
export function dependenciesMatch() {
  const installedList = path.join(root, "node_modules", ".package-lock.json");
  if (!existsSync(installedList)) return false;
  const wanted = readJson(path.join(root, "package-lock.json")).packages;
  const installed = readJson(installedList).packages;
  const missing = Object.entries(wanted).some(
    ([place, entry]) => place !== "" && !entry.optional && !entry.devOptional && installed[place]?.version !== entry.version,
  );
  return !missing && Object.entries(installed).every(([place, entry]) => wanted[place]?.version === entry.version);
}

/** Installs the npm packages when they are missing or no longer the ones that package-lock.json names. */
export async function ensureDependencies(logs) {
  if (dependenciesMatch()) return;
  const npm = findProgram("npm");
  if (!npm) throw new Refusal("npm is not installed. It comes with Node 20: install Node 20 or newer, then try again.");
  say("Installing the npm packages. This takes a minute or two the first time.");
  await runQuietly(npm, ["ci", "--include=dev", "--no-audit", "--no-fund"], {
    logFile: path.join(logs, "npm-ci.log"),
    failure: "npm could not install the packages. Check that this machine reaches the npm registry, then try again.",
    env: { ...process.env, NODE_ENV: "development", PATH: `${path.dirname(process.execPath)}${path.delimiter}${process.env.PATH ?? ""}` },
  });
}

/** Keeps Debian from starting a system-wide server while a package is installed. Answers how to put things back. */
function holdServices() {
  const current = existsSync(POLICY) ? readFileSync(POLICY, "utf8") : null;
  if (current !== null && current !== OUR_POLICY) {
    if (spawnSync(POLICY, ["mariadb", "start"], { stdio: "ignore" }).status === 101) return () => {};
    renameSync(POLICY, POLICY_ASIDE);
  }
  writeFileSync(POLICY, OUR_POLICY, { mode: 0o755 });
  return () => {
    rmSync(POLICY, { force: true });
    if (existsSync(POLICY_ASIDE)) renameSync(POLICY_ASIDE, POLICY);
  };
}

/**
 * Makes sure that a Debian package's program is there and gives its path. As root it is installed through apt-get; anyone else is told
 * what to run. No service of the package is started, now or at the next boot.
 */
export async function ensurePackage({ program, packageName, service, logs }) {
  const found = findProgram(program);
  if (found) return found;
  const byHand = `apt-get update && apt-get install -y --no-install-recommends ${packageName}`;
  const apt = findProgram("apt-get");
  if (!apt) throw new Refusal(`${program} is not installed, and this system has no apt-get. Install the package "${packageName}", then try again.`);
  if (process.getuid() !== 0) {
    throw new Refusal(
      `${program} is not installed, and installing it takes root. Run this once as root, then try again:\n  ${byHand}` +
        (service ? `\nCurbweight starts a server of its own. To keep Debian's from running beside it:\n  systemctl disable --now ${service}` : ""),
    );
  }
  say(`Installing Debian's ${packageName}.`);
  const release = holdServices();
  process.once("exit", release);
  try {
    const options = { env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" } };
    const failure = `apt-get could not install ${packageName}. Check that this machine reaches its Debian mirror, or run this yourself: ${byHand}`;
    await runQuietly(apt, ["update"], { ...options, failure, logFile: path.join(logs, "apt-update.log") });
    await runQuietly(apt, ["install", "-y", "--no-install-recommends", packageName], {
      ...options,
      failure,
      logFile: path.join(logs, `apt-${packageName}.log`),
    });
  } finally {
    release();
    process.off("exit", release);
  }
  const systemctl = findProgram("systemctl");
  if (service && systemctl) spawnSync(systemctl, ["disable", service], { stdio: "ignore" });
  const installed = findProgram(program);
  if (!installed) throw new Refusal(`${packageName} was installed, but ${program} is still not there. Look at ${logs}.`);
  return installed;
}

/** The MariaDB server program, installed when missing. */
export const ensureMariadb = (logs) => ensurePackage({ program: "mariadbd", packageName: "mariadb-server", service: "mariadb.service", logs });

/** The Chromium that the browser tests drive, installed when missing. */
export const ensureChromium = (logs) => ensurePackage({ program: "chromium", packageName: "chromium", logs });
