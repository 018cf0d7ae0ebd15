import { gradeChangeSchema, gradeSchema } from "@/lib/catalogue/schema";
import { changeGrade } from "@/lib/catalogue/service";
import { route } from "@/lib/http/route";

export const PATCH = route({
  permission: "catalogue.change",
  summary: "Change a grade's words, or hide it from pickers",
  body: gradeChangeSchema,
  response: gradeSchema,
  versioned: true,
  handler: ({ ctx, params, body }) => changeGrade(ctx, params.id ?? "", body),
});
