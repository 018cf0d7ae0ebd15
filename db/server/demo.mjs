import { readFileSync } from "node:fs";
import path from "node:path";
import { runCommand } from "./database.mjs";
import { Refusal, say } from "./say.mjs";
import { root } from "./settings.mjs";

/** The demo outfit's people and their one password: the same file that the demo is made from. */
export const demoSignIns = () => JSON.parse(readFileSync(path.join(root, "db", "seed", "demo-sign-ins.json"), "utf8"));

async function isThere(env, statement, values = []) {
  // Loaded here because the npm packages may have been installed a moment ago.
  const { default: mysql } = await import("mysql2/promise");
  const connection = await mysql.createConnection({ uri: env.DATABASE_URL });
  try {
    const [rows] = await connection.execute(statement, values);
    return rows.length > 0;
  } finally {
    await connection.end();
  }
}

/** Makes the demo outfit in a database that has no outfit yet. Left out with DEMO=0. */
export async function ensureDemo(env) {
  if (process.env.DEMO === "0" || (await isThere(env, "SELECT 1 FROM outfits LIMIT 1"))) return;
  say("Making the demo outfit: fourteen months of invented history.");
  if ((await runCommand("db/seed/demo.ts", env)) !== 0) throw new Refusal("The demo outfit could not be made. The reason stands above.");
}

/** Whether the demo outfit's people can sign in here. */
export const hasDemo = (env) => isThere(env, "SELECT 1 FROM users WHERE email = ?", [demoSignIns().people[0].email]);
