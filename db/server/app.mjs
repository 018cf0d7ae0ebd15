import { setTimeout as pause } from "node:timers/promises";
import { nextProgram } from "./build.mjs";
import { start } from "./processes.mjs";
import { Refusal } from "./say.mjs";
import { root } from "./settings.mjs";

const PATIENCE = 60_000;

/**
 * Starts the app (`mode` is "start" for the production build, "dev" for working on it) and waits until it answers. `stdio` is where its
 * log goes. The app has a session of its own, so that Ctrl-C reaches only the command, which then stops things in order.
 */
export async function startApp({ mode, port, env, output = "inherit" }) {
  const child = start(process.execPath, ["--import", "./db/server/leave-with-parent.mjs", nextProgram, mode, "-H", "127.0.0.1", "-p", String(port)], {
    cwd: root,
    detached: true,
    stdio: ["ignore", output, output, "ipc"],
    env: { ...process.env, ...env, NODE_ENV: mode === "start" ? "production" : "development" },
  });
  const until = Date.now() + PATIENCE;
  while (!(await answersAt(port))) {
    if (child.exitCode !== null || child.signalCode !== null) throw new Refusal("The app ended while it was starting. The reason stands above.");
    if (Date.now() > until) throw new Refusal(`The app did not answer on port ${port} within ${PATIENCE / 1000} seconds.`);
    await pause(100);
  }
  return child;
}

async function answersAt(port) {
  try {
    const answer = await fetch(`http://127.0.0.1:${port}/api/health`, { redirect: "manual", signal: AbortSignal.timeout(20_000) });
    await answer.arrayBuffer();
    return true;
  } catch {
    return false;
  }
}
