import * as z from "zod";
import { FAMILIES, PRICE_PERS } from "@/db/words";
import { dateField, idField, nameField, noteField, optionalNameField, pageFields, pageOf, perField, priceField } from "@/lib/http/fields";

/** A buyer as it is entered. */
export const yardInputSchema = z.strictObject({
  id: idField().optional(),
  name: nameField("Name"),
  place: optionalNameField("Place"),
  phone: optionalNameField("Phone", 40),
  hours: optionalNameField("Hours"),
  note: noteField,
});

/** Words that may be taken away by sending null. */
const clearable = <T extends z.ZodType>(field: T) => field.nullable().optional();

/** What may be changed of a yard. */
export const yardChangeSchema = z.strictObject({
  name: nameField("Name").optional(),
  place: clearable(optionalNameField("Place")),
  phone: clearable(optionalNameField("Phone", 40)),
  hours: clearable(optionalNameField("Hours")),
  note: clearable(noteField),
  active: z.boolean("Active must be true or false.").optional(),
});

export const yardSchema = z.object({
  id: z.string(),
  name: z.string(),
  place: z.string().nullable(),
  phone: z.string().nullable(),
  hours: z.string().nullable(),
  note: z.string().nullable(),
  active: z.boolean(),
  version: z.int(),
});
export const yardListSchema = pageOf(yardSchema);
export const yardListQuery = z.strictObject({ ...pageFields, limit: pageFields.limit.unwrap().default(200) });

const sheetLineInput = z.strictObject({
  gradeId: idField("grade"),
  price: priceField(),
  per: perField,
  yardWording: optionalNameField("Yard's wording", 120),
});

const linesField = z
  .array(sheetLineInput, "Enter one price or more.")
  .min(1, "Enter one price or more.")
  .max(500, "A sheet can have 500 prices or fewer.")
  .superRefine((lines, ctx) => {
    const seen = new Set<string>();
    lines.forEach((line, index) => {
      if (seen.has(line.gradeId))
        ctx.addIssue({ code: "custom", path: [index, "gradeId"], message: "This grade is on the sheet already. Keep one price a grade." });
      seen.add(line.gradeId);
    });
  });

const lastDayAfterStart = (sheet: { inForceFrom: string; lastDay?: string | undefined }) => sheet.lastDay === undefined || sheet.lastDay >= sheet.inForceFrom;
const LAST_DAY_WORDS = { path: ["lastDay"], error: "Last day must be the first day or later." };

/** A yard's prices from a date on, as typed in. */
export const sheetInputSchema = z
  .strictObject({
    id: idField().optional(),
    yardId: idField("yard"),
    inForceFrom: dateField("In force from"),
    lastDay: dateField("Last day").optional(),
    lines: linesField,
  })
  .refine(lastDayAfterStart, LAST_DAY_WORDS);

/** A sheet typed again: its lines replace the old ones. */
export const sheetChangeSchema = z
  .strictObject({ inForceFrom: dateField("In force from"), lastDay: dateField("Last day").optional(), lines: linesField })
  .refine(lastDayAfterStart, LAST_DAY_WORDS);

const sheetHead = {
  id: z.string(),
  yardId: z.string(),
  yardName: z.string(),
  inForceFrom: z.string(),
  lastDay: z.string().nullable(),
  lineCount: z.int(),
  madeBy: z.object({ id: z.string(), name: z.string() }),
  madeAt: z.string(),
  version: z.int(),
};

export const sheetSchema = z.object({
  ...sheetHead,
  lines: z.array(
    z.object({
      gradeId: z.string(),
      gradeName: z.string(),
      family: z.enum(FAMILIES),
      price: z.string(),
      per: z.enum(PRICE_PERS),
      /** Money per book unit, for comparing; null for prices per piece. */
      normalised: z.string().nullable(),
      yardWording: z.string().nullable(),
    }),
  ),
});
export const sheetListSchema = pageOf(z.object(sheetHead));
export const sheetListQuery = z.strictObject({ ...pageFields, yardId: idField("yard").optional() });

const quoteSchema = z.object({
  yardId: z.string(),
  yardName: z.string(),
  sheetId: z.string(),
  price: z.string(),
  per: z.enum(PRICE_PERS),
  normalised: z.string().nullable(),
  yardWording: z.string().nullable(),
  inForceFrom: z.string(),
  ageDays: z.int(),
  /** Older than the outfit's limit. */
  stale: z.boolean(),
});

export const pricesQuery = z.strictObject({ on: dateField("Date").optional() });
export const pricesSchema = z.object({
  on: z.string(),
  grades: z.array(
    z.object({ gradeId: z.string(), gradeName: z.string(), family: z.enum(FAMILIES), best: quoteSchema.nullable(), yards: z.array(quoteSchema) }),
  ),
});

export type YardInput = z.output<typeof yardInputSchema>;
export type YardChange = z.output<typeof yardChangeSchema>;
export type Yard = z.output<typeof yardSchema>;
export type SheetInput = z.output<typeof sheetInputSchema>;
export type SheetChange = z.output<typeof sheetChangeSchema>;
export type Sheet = z.output<typeof sheetSchema>;
export type SheetListQuery = z.output<typeof sheetListQuery>;
export type Prices = z.output<typeof pricesSchema>;
export type Quote = z.output<typeof quoteSchema>;
