import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import { call } from "../api/call";

// Books weigh-ins without end and says each answer aloud: the test kills this process in the middle of its work.
const { slug, key, binId, keys } = JSON.parse(process.env.KILL_WORK ?? "{}") as { slug: string; key: string; binId: string; keys: string[] };

await Promise.all(
  keys.map(async (idempotencyKey) => {
    const answer = await call<{ id: string }>(
      weighIns.POST,
      { slug },
      { key, headers: { "idempotency-key": idempotencyKey }, body: { binId, gross: "3.5", tare: "1", weighedOn: "2026-01-15" } },
    );
    process.stdout.write(`${answer.status} ${idempotencyKey}\n`);
  }),
);
process.exit(0);
