import * as z from "zod";
import { PAID_FROM, PICKUP_SOURCES, PICKUP_STATES } from "@/db/words";
import { countField, dateField, idField, minorField, noteField, optionalNameField, pageFields, pageOf, positiveWeightField } from "@/lib/http/fields";

/** The most items of one kind on a line. */
export const MOST_OF_A_KIND = 1000;

const itemInputSchema = z.strictObject({
  itemKindId: idField("item kind"),
  count: countField("Count", MOST_OF_A_KIND),
  /** Weight of the whole line as a scale says, in the outfit's weight unit. Left out: count x the kind's typical weight. */
  weight: positiveWeightField("Weight").optional(),
});

/** One stop's haul as it is logged. */
export const pickupInputSchema = z.strictObject({
  id: idField().optional(),
  pickedUpOn: dateField("Date"),
  source: z.enum(PICKUP_SOURCES, "Choose where it came from: curb, call-out, drop-off or bought."),
  place: optionalNameField("Place"),
  items: z.array(itemInputSchema, "Count one item or more.").min(1, "Count one item or more.").max(100, "A haul can have 100 lines or fewer."),
  paidMinor: minorField("Paid").default(0),
  paidFrom: z.enum(PAID_FROM, "Choose what it was paid from: cash, bank, card or own-pocket.").default("cash"),
  note: noteField,
});

/** A body that says nothing, for what is done to a thing by its address alone. */
export const nothingSchema = z.strictObject({});

export const pickupListQuery = z
  .strictObject({
    ...pageFields,
    state: z.enum(PICKUP_STATES, "State must be open, worked-out or void.").optional(),
    from: dateField("From").optional(),
    to: dateField("To").optional(),
  })
  .refine((query) => query.from === undefined || query.to === undefined || query.from <= query.to, {
    path: ["to"],
    error: "To must be the same day as From, or later.",
  });

const personSchema = z.object({ id: z.string(), name: z.string() });

/** A pickup in a list. */
export const pickupSchema = z.object({
  id: z.string(),
  /** The running number that people say aloud. */
  number: z.int(),
  pickedUpOn: z.string(),
  source: z.enum(PICKUP_SOURCES),
  place: z.string().nullable(),
  state: z.enum(PICKUP_STATES),
  /** How many things were taken. */
  itemCount: z.int(),
  kinds: z.array(z.object({ itemKindId: z.string(), name: z.string(), plural: z.string(), count: z.int() })),
  estimatedWeight: z.string(),
  /** What is left of the estimate on the pile. */
  remainingWeight: z.string(),
  /** Null for those who may not see what was paid. */
  paidMinor: z.int().nullable(),
  paidFrom: z.enum(PAID_FROM).nullable(),
  madeBy: personSchema,
  madeAt: z.string(),
  version: z.int(),
});
export const pickupListSchema = pageOf(pickupSchema);

const pickupItemSchema = z.object({
  line: z.int(),
  itemKindId: z.string(),
  key: z.string().nullable(),
  name: z.string(),
  group: z.string(),
  count: z.int(),
  /** Weight of the whole line as a scale said; null when estimated. */
  weighed: z.string().nullable(),
  estimatedWeight: z.string(),
  hazards: z.array(z.string()),
  holdUntil: z.string().nullable(),
});

const pickupWeighInSchema = z.object({
  id: z.string(),
  weighedOn: z.string(),
  binId: z.string(),
  binLabel: z.string(),
  gradeId: z.string(),
  gradeName: z.string(),
  family: z.string(),
  net: z.string(),
  voidedAt: z.string().nullable(),
});

/** A pickup with all that belongs to it. */
export const pickupRecordSchema = pickupSchema.extend({
  note: z.string().nullable(),
  items: z.array(pickupItemSchema),
  weighIns: z.array(pickupWeighInSchema),
  /** What is left of the cost; null for those who may not see costs. */
  remainingCostMinor: z.int().nullable(),
  voidedAt: z.string().nullable(),
});

export type PickupInput = z.output<typeof pickupInputSchema>;
export type PickupListQuery = z.output<typeof pickupListQuery>;
export type Pickup = z.output<typeof pickupSchema>;
export type PickupRecord = z.output<typeof pickupRecordSchema>;
