import path from "node:path";
import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = path.dirname(fileURLToPath(import.meta.url));
const resolve = {
  alias: {
    "@": root,
    // Next brings this package along for its own builds; the tests are the server, so they get its empty half.
    "server-only": path.join(root, "node_modules/next/dist/compiled/server-only/empty.js"),
  },
};

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      {
        resolve,
        oxc: { jsx: { runtime: "automatic" } },
        test: {
          name: "unit",
          environment: "node",
          include: ["{app,components,db,lib,tests/unit}/**/*.test.{ts,tsx}", "tests/*.test.ts"],
        },
      },
      {
        resolve,
        test: {
          name: "api",
          environment: "node",
          include: ["tests/{api,books}/**/*.test.ts"],
          globalSetup: "tests/api/setup/global.ts",
          setupFiles: "tests/api/setup/worker.ts",
          pool: "forks",
          // Each worker keeps its database and its loaded modules from file to file; a test makes an outfit of its own.
          isolate: false,
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
