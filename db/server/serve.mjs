import { startApp } from "./app.mjs";
import { ensureBuild } from "./build.mjs";
import { appEnv, logsOf, migrate, openDatabase } from "./database.mjs";
import { demoSignIns, ensureDemo, hasDemo } from "./demo.mjs";
import { ensureDependencies } from "./install.mjs";
import { takeDataFolder } from "./lock.mjs";
import { serverGone } from "./mariadb.mjs";
import { isPortFree } from "./ports.mjs";
import { askedToStop, stop, stopAll } from "./processes.mjs";
import { Refusal, say } from "./say.mjs";
import { appPort, dataFolder } from "./settings.mjs";

async function announce(url, env) {
  say("");
  say(`Curbweight is at ${url}`);
  if (env.NEXTAUTH_URL !== url) say(`NEXTAUTH_URL says that people open ${env.NEXTAUTH_URL}: sign-in works there.`);
  if (await hasDemo(env)) {
    const { outfit, password, people } = demoSignIns();
    say(`${outfit} is the demo outfit. Everyone and everything in it is invented. Sign in as:`);
    for (const { role, email } of people) say(`  ${role.padEnd(11)} ${email}`);
    say(`  password    ${password}`);
  }
  say("Ctrl-C stops it.");
  say("");
}

async function setUpAndServe(mode, folder, port, opened) {
  const logs = logsOf(folder);
  await ensureDependencies(logs);
  const database = await openDatabase(folder, logs);
  opened.push(database);
  const url = `http://127.0.0.1:${port}`;
  const env = appEnv(folder, database.server, url);
  await migrate(database.server, env);
  await ensureDemo(env);
  if (mode === "start") await ensureBuild(logs);
  const app = await startApp({ mode, port, env });
  await announce(url, env);
  return { app, database };
}

const never = new Promise(() => {});

/**
 * `start` and `dev`: sets everything up, serves until asked to stop, then stops the app and after it the database. Gives the exit code:
 * 0 when it was asked to stop.
 */
export async function serve(mode) {
  const port = appPort();
  const folder = dataFolder();
  takeDataFolder(folder, `the app on http://127.0.0.1:${port}`);
  if (!(await isPortFree(port))) {
    throw new Refusal(
      `Port ${port} is taken by another program. Stop that one, or choose another port: PORT=${port === 65535 ? 3000 : port + 1} npm ${mode === "start" ? "start" : "run dev"}`,
    );
  }
  const asked = askedToStop();
  const opened = [];
  let code = 0;
  const setUp = setUpAndServe(mode, folder, port, opened);
  try {
    const served = await Promise.race([setUp, asked]);
    if (served !== "asked") {
      const appEnded = new Promise((resolve) => served.app.once("exit", () => resolve("The app ended on its own. The reason stands above.")));
      const { server } = served.database;
      const databaseEnded = server ? serverGone(server).then(() => "The database ended on its own, so the app stops too.") : never;
      const reason = await Promise.race([asked, appEnded, databaseEnded]);
      if (reason !== "asked") {
        say(reason);
        code = 1;
      }
      say("Stopping.");
      await stop(served.app);
    }
  } finally {
    await stopAll();
    // A set-up that was interrupted gives up at its next step; the database it may just have started is stopped as well.
    await setUp.catch(() => {});
    for (const database of opened) await database.stop();
  }
  say("Stopped. Everything that was saved is kept.");
  return code;
}
