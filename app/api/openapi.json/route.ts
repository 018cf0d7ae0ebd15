import * as z from "zod";
import { PUBLIC_READ } from "@/lib/auth/throttle";
import { openApiDocument } from "@/lib/http/openapi";
import { publicRoute } from "@/lib/http/route";
import { listedRoutes } from "./routes";

export const GET = publicRoute({
  permission: "public",
  limit: PUBLIC_READ,
  summary: "This document",
  response: z.record(z.string(), z.unknown()),
  handler: async () => openApiDocument(listedRoutes()),
});
