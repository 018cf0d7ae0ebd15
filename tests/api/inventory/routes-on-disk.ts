import { readdirSync } from "node:fs";
import path from "node:path";

const ROOT = path.join(import.meta.dirname, "../../../app/api");

/** Every route file under app/api, as paths of the API: `[outfit]` is `{outfit}`. next-auth's routes and the document itself are left out. */
export function routePathsOnDisk(): string[] {
  return readdirSync(ROOT, { recursive: true, encoding: "utf8" })
    .filter((file) => path.basename(file) === "route.ts" && !file.includes("[...nextauth]") && !file.startsWith("openapi.json"))
    .map((file) => `/api/${path.dirname(file).replaceAll(/\[(\w+)\]/g, "{$1}")}`)
    .sort();
}
