import { route } from "@/lib/http/route";
import { nothingSchema, pickupRecordSchema } from "@/lib/pickups/schema";
import { voidPickup } from "@/lib/pickups/service";

export const POST = route({
  permission: "pickups.change",
  summary: "Take a haul back out of both books",
  body: nothingSchema,
  response: pickupRecordSchema,
  idempotent: true,
  handler: ({ ctx, params }) => voidPickup(ctx, params.id ?? ""),
});
