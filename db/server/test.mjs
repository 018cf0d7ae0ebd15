import { closeSync, mkdirSync, openSync, readFileSync, rmSync } from "node:fs";
import path from "node:path";
import { startApp } from "./app.mjs";
import { ensureBuild } from "./build.mjs";
import { appEnv, logsOf, migrate } from "./database.mjs";
import { ensureDemo } from "./demo.mjs";
import { ensureChromium, ensureDependencies } from "./install.mjs";
import { freePort } from "./ports.mjs";
import { askedToStop, findProgram, run, stop, stopAll } from "./processes.mjs";
import { Refusal, say } from "./say.mjs";
import { root } from "./settings.mjs";
import { startThrowaway } from "./throwaway.mjs";

/** Reports and logs of test runs; nothing here is anyone's data. */
const home = path.join(root, ".data", "tests");

/** Variables of a person's own set-up that a test run must not see. */
const NOT_FOR_TESTS = ["DATABASE_URL", "MIGRATION_DATABASE_URL", "NEXTAUTH_URL", "NEXTAUTH_SECRET", "TRUST_PROXY", "LOG_LEVEL", "DEMO", "NODE_ENV"];

const node = (args, env = {}) => run(process.execPath, args, { cwd: root, env: { ...process.env, ...env } });

function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return null;
  }
}

/** What a part of the run came to. A part that ended badly without a failed test, or ran no test at all, counts as one failure. */
function tally(name, code, passed, failed) {
  const broken = failed === 0 && (code !== 0 || passed === 0);
  if (broken) say(code === 0 ? `${name}: no test ran.` : `${name}: did not pass.`);
  return { passed, failed: broken ? 1 : failed };
}

async function vitest(project, env, args) {
  const report = path.join(home, `${project}.json`);
  rmSync(report, { force: true });
  const code = await node(
    ["node_modules/vitest/vitest.mjs", "run", "--project", project, "--reporter=default", "--reporter=json", `--outputFile.json=${report}`, ...args],
    env,
  );
  const counts = readReport(report);
  return tally(`The ${project} tests`, code, counts?.numPassedTests ?? 0, counts?.numFailedTests ?? 0);
}

/** Format, lint, types and arrows: no tests to count, so all that shows is when one does not pass. */
async function checks() {
  const code = await run(findProgram("npm"), ["run", "--silent", "static"], { cwd: root });
  if (code !== 0) say("The checks before the tests: did not pass.");
  return { passed: 0, failed: code === 0 ? 0 : 1 };
}

const api = (throwaway, args) => vitest("api", { TEST_DATABASE_ADMIN_URL: throwaway.adminUrl }, args);

/** The browser tests: the production build on a port of its own, with a fresh database and the demo outfit. */
async function browser(throwaway, args) {
  const logs = logsOf(home);
  const chromium = await ensureChromium(logs);
  await ensureBuild(logs);
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const env = appEnv(throwaway.folder, throwaway.server, url);
  await migrate(throwaway.server, env);
  await ensureDemo(env);
  const log = path.join(logs, "app.log");
  const output = openSync(log, "w");
  const app = await startApp({ mode: "start", port, env, output });
  try {
    const report = path.join(home, "browser.json");
    rmSync(report, { force: true });
    const code = await node(["node_modules/@playwright/test/cli.js", "test", ...args], {
      E2E_BASE_URL: url,
      E2E_CHROMIUM: chromium,
      PLAYWRIGHT_JSON_OUTPUT_NAME: report,
    });
    const stats = readReport(report)?.stats;
    if (code !== 0) say(`The app's log during the browser tests: ${log}`);
    return tally("The browser tests", code, stats?.expected ?? 0, (stats?.unexpected ?? 0) + (stats?.flaky ?? 0));
  } finally {
    await stop(app);
    closeSync(output);
  }
}

/** Runs one part. A part that cannot even be set up counts as one failure, and the others still run. */
async function attempt(part) {
  try {
    return await part();
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    say(error.message);
    return { passed: 0, failed: 1 };
  }
}

/** Sets up, runs the parts one after the other, clears up, and closes with one line: how many tests passed and failed. */
async function runParts(parts) {
  for (const name of NOT_FOR_TESTS) delete process.env[name];
  mkdirSync(home, { recursive: true });
  const asked = askedToStop();
  let throwaway;
  const work = (async () => {
    await ensureDependencies(logsOf(home));
    const total = { passed: 0, failed: 0 };
    for (const part of parts) {
      const { passed, failed } = await attempt(async () => {
        if (part.needsDatabase) throwaway ??= await startThrowaway();
        return part.run(throwaway);
      });
      total.passed += passed;
      total.failed += failed;
    }
    return total;
  })();
  try {
    const total = await Promise.race([work, asked]);
    if (total === "asked") return 1;
    process.stdout.write(`\n${total.passed} passed, ${total.failed} failed\n`);
    return total.failed === 0 && total.passed > 0 ? 0 : 1;
  } finally {
    await stopAll();
    await work.catch(() => {});
    await throwaway?.remove();
  }
}

/** `test`: everything. */
export const testAll = () =>
  runParts([
    { run: checks },
    { run: () => vitest("unit", {}, []) },
    { needsDatabase: true, run: (throwaway) => api(throwaway, []) },
    { needsDatabase: true, run: (throwaway) => browser(throwaway, []) },
  ]);

/** `test-api`: the API tests, or those that `args` name. */
export const testApi = (args) => runParts([{ needsDatabase: true, run: (throwaway) => api(throwaway, args) }]);

/** `test-e2e`: the browser tests, or those that `args` name. */
export const testBrowser = (args) => runParts([{ needsDatabase: true, run: (throwaway) => browser(throwaway, args) }]);
