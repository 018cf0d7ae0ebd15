import { readdirSync } from "node:fs";
import path from "node:path";

const ROOT = path.join(import.meta.dirname, "../../../app/api");

/** Every route file under app/api, as paths of the API: `[outfit]` is `{outfit}`. next-auth's own route is its own affair. */
export function routePathsOnDisk(): string[] {
  return readdirSync(ROOT, { recursive: true, encoding: "utf8" })
    .filter((file) => path.basename(file) === "route.ts" && !file.includes("[...nextauth]"))
    .map((file) => `/api/${path.dirname(file).replaceAll(/\[(\w+)\]/g, "{$1}")}`)
    .sort();
}
