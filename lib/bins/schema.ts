import * as z from "zod";
import { FAMILIES } from "@/db/words";
import { dateField, idField, nameField, noteField, optionalNameField, pageFields, pageOf, weightField, weightUnitField } from "@/lib/http/fields";

/** A container as it is entered. Weights in the outfit's weight unit. */
export const binInputSchema = z.strictObject({
  id: idField().optional(),
  label: nameField("Label", 30),
  gradeId: idField("grade"),
  tare: weightField("Tare").default("0"),
  place: optionalNameField("Place", 120),
  sellPoint: weightField("Sell point").optional(),
});

/** What may be changed of a bin. The grade only while nothing was ever put in it. */
export const binChangeSchema = z.strictObject({
  label: nameField("Label", 30).optional(),
  gradeId: idField("grade").optional(),
  tare: weightField("Tare").optional(),
  place: optionalNameField("Place", 120).nullable(),
  sellPoint: weightField("Sell point").nullable().optional(),
  /** True: out of use, which only an empty bin can be. */
  putAway: z.boolean("Put away must be true or false.").optional(),
});

export const binSchema = z.object({
  id: z.string(),
  label: z.string(),
  gradeId: z.string(),
  gradeName: z.string(),
  family: z.enum(FAMILIES),
  place: z.string().nullable(),
  tare: z.string(),
  sellPoint: z.string().nullable(),
  balance: z.string(),
  /** Day on which it was last filled from empty; null while empty. */
  heldSince: z.string().nullable(),
  putAwayAt: z.string().nullable(),
  version: z.int(),
});
export const binListSchema = pageOf(binSchema);
export const binListQuery = z.strictObject({
  ...pageFields,
  all: z.enum(["true", "false"], "All must be true or false.").default("false"),
  gradeId: idField("grade").optional(),
});

const drawSchema = z.strictObject({ gross: weightField("Gross"), tare: weightField("Tare") });

/** Weighed metal on its way into a bin: one gross and tare, or several draws. */
export const weighInInputSchema = z
  .strictObject({
    id: idField().optional(),
    binId: idField("bin"),
    gross: weightField("Gross").optional(),
    tare: weightField("Tare").optional(),
    draws: z.array(drawSchema, "Draws must be a list.").min(1, "Enter one draw or more.").max(50, "A weigh-in can have 50 draws or fewer.").optional(),
    unit: weightUnitField.optional(),
    /** The pickup it came from. Left out: from outside, at no cost, unless it comes from the pile. */
    pickupId: idField("pickup").optional(),
    /** True: from the oldest hauls of the pile. */
    fromPile: z.boolean("From the pile must be true or false.").default(false),
    weighedOn: dateField("Date"),
    note: noteField,
  })
  .superRefine((input, ctx) => {
    if (input.draws !== undefined) return;
    if (input.gross === undefined) ctx.addIssue({ code: "custom", path: ["gross"], message: "Enter gross." });
    if (input.tare === undefined) ctx.addIssue({ code: "custom", path: ["tare"], message: "Enter tare, 0 when there is none." });
  })
  .refine((input) => !(input.fromPile && input.pickupId !== undefined), { path: ["fromPile"], error: "Choose one pickup or the whole pile." });

export const weighInSchema = z.object({
  id: z.string(),
  binId: z.string(),
  binLabel: z.string(),
  gradeId: z.string(),
  gradeName: z.string(),
  family: z.enum(FAMILIES),
  weighedOn: z.string(),
  pickupId: z.string().nullable(),
  pickupNumber: z.int().nullable(),
  fromPile: z.boolean(),
  gross: z.string(),
  tare: z.string(),
  net: z.string(),
  /** As typed, with the unit as typed. */
  draws: z.array(z.object({ gross: z.string(), tare: z.string() })),
  unit: z.string(),
  note: z.string().nullable(),
  madeBy: z.object({ id: z.string(), name: z.string() }),
  madeAt: z.string(),
  voidedAt: z.string().nullable(),
  /** What the bin holds now. */
  binBalance: z.string(),
});
export const weighInListSchema = pageOf(weighInSchema);
export const weighInListQuery = z.strictObject({
  ...pageFields,
  binId: idField("bin").optional(),
  pickupId: idField("pickup").optional(),
  from: dateField("From").optional(),
  to: dateField("To").optional(),
});

/** A bin put on the scale to correct the book. */
export const countInputSchema = z.strictObject({
  id: idField().optional(),
  binId: idField("bin"),
  gross: weightField("Gross"),
  /** Left out: the bin's own tare. */
  tare: weightField("Tare").optional(),
  countedOn: dateField("Date"),
  note: noteField,
});

export const countSchema = z.object({
  id: z.string(),
  binId: z.string(),
  binLabel: z.string(),
  gradeId: z.string(),
  gradeName: z.string(),
  family: z.enum(FAMILIES),
  countedOn: z.string(),
  gross: z.string(),
  tare: z.string(),
  net: z.string(),
  bookQuantity: z.string(),
  /** net - book; negative is a loss. */
  difference: z.string(),
  note: z.string().nullable(),
  madeBy: z.object({ id: z.string(), name: z.string() }),
  madeAt: z.string(),
  voidedAt: z.string().nullable(),
});
export const countListSchema = pageOf(countSchema);
export const countListQuery = z.strictObject({
  ...pageFields,
  binId: idField("bin").optional(),
  from: dateField("From").optional(),
  to: dateField("To").optional(),
});

export const nothingSchema = z.strictObject({});

export type BinInput = z.output<typeof binInputSchema>;
export type BinChange = z.output<typeof binChangeSchema>;
export type Bin = z.output<typeof binSchema>;
export type BinListQuery = z.output<typeof binListQuery>;
export type WeighInInput = z.output<typeof weighInInputSchema>;
export type WeighIn = z.output<typeof weighInSchema>;
export type WeighInListQuery = z.output<typeof weighInListQuery>;
export type CountInput = z.output<typeof countInputSchema>;
export type Count = z.output<typeof countSchema>;
export type CountListQuery = z.output<typeof countListQuery>;
