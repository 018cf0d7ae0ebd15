import { spawn } from "node:child_process";
import { once } from "node:events";
import { describe, expect, it } from "vitest";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import { database } from "@/db/client";
import { fixed } from "@/lib/arithmetic/decimal";
import { checkBooks } from "@/lib/books/always-true";
import { newId } from "@/lib/ids";
import { call } from "../api/call";
import { makeOutfit, type TestOutfit } from "../api/outfit";

const PER_CYCLE = 60;
const CYCLES = 4;

/** Starts the worker, kills it without warning once some answers have come, and gives back the keys it answered. */
async function workAndKill(outfit: TestOutfit, binId: string, keys: string[], killAfter: number): Promise<Set<string>> {
  const worker = spawn(process.execPath, ["--import", "./db/server/typescript.mjs", "tests/books/kill-worker.ts"], {
    env: { ...process.env, KILL_WORK: JSON.stringify({ slug: outfit.slug, key: outfit.keys.owner, binId, keys }) },
    stdio: ["ignore", "pipe", "inherit"],
  });
  const answered = new Set<string>();
  let text = "";
  worker.stdout.setEncoding("utf8").on("data", (part: string) => {
    text += part;
    const lines = text.split("\n");
    text = lines.pop() ?? "";
    for (const line of lines) {
      const [status, key] = line.split(" ");
      expect(status).toBe("201");
      if (key !== undefined) answered.add(key);
    }
    if (answered.size >= killAfter) worker.kill("SIGKILL");
  });
  await once(worker, "close");
  return answered;
}

describe("A-16: killing the app in mid-request", () => {
  it("loses nothing that was answered, leaves nothing half done, and sending the rest again books each once", async () => {
    const outfit = await makeOutfit();
    const bin = await call<{ id: string }>(bins.POST, outfit, { key: outfit.keys.owner, body: { label: "K-1", gradeId: outfit.grade("shred"), tare: "1" } });
    const binId = bin.body.id;
    const all: string[] = [];
    for (let cycle = 1; cycle <= CYCLES; cycle += 1) {
      const keys = Array.from({ length: PER_CYCLE }, () => newId());
      all.push(...keys);
      const answered = await workAndKill(outfit, binId, keys, cycle * 9);
      expect(answered.size).toBeGreaterThan(0);
      expect((await checkBooks(database(), { outfitId: outfit.id })).filter((rule) => !rule.holds)).toEqual([]);
      for (const key of answered) {
        const again = await call(weighIns.POST, outfit, {
          key: outfit.keys.owner,
          headers: { "idempotency-key": key },
          body: { binId, gross: "3.5", tare: "1", weighedOn: "2026-01-15" },
        });
        expect([again.status, again.headers.get("idempotency-replayed")]).toEqual([201, "true"]);
      }
      for (const key of keys) {
        const again = await call(weighIns.POST, outfit, {
          key: outfit.keys.owner,
          headers: { "idempotency-key": key },
          body: { binId, gross: "3.5", tare: "1", weighedOn: "2026-01-15" },
        });
        expect(again.status).toBe(201);
      }
    }
    const answer = await call<{ items: { id: string; balance: string }[] }>(bins.GET, outfit, { key: outfit.keys.owner });
    expect(fixed(answer.body.items.find((one) => one.id === binId)?.balance ?? "", 4)).toBe(`${(all.length * 5) / 2}.0000`);
  });
});
