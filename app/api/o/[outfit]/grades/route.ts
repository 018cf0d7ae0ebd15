import { gradeInputSchema, gradeListQuery, gradeListSchema, gradeSchema } from "@/lib/catalogue/schema";
import { addGrade, seeGrades } from "@/lib/catalogue/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "catalogue.see",
  summary: "Grades in the order of lists",
  query: gradeListQuery,
  response: gradeListSchema,
  handler: ({ ctx, query }) => seeGrades(ctx, query),
});

export const POST = route({
  permission: "catalogue.change",
  summary: "Add a grade of the outfit's own",
  body: gradeInputSchema,
  response: gradeSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => addGrade(ctx, body),
});
