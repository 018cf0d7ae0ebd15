import { route } from "@/lib/http/route";
import { nothingSchema, pickupRecordSchema } from "@/lib/pickups/schema";
import { workOutPickup } from "@/lib/pickups/service";

export const POST = route({
  permission: "weigh-ins.make",
  summary: "Mark a haul worked out: nothing more comes of it",
  body: nothingSchema,
  response: pickupRecordSchema,
  idempotent: true,
  handler: ({ ctx, params }) => workOutPickup(ctx, params.id ?? ""),
});
