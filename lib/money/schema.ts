import * as z from "zod";
import { COST_KINDS, PAID_FROM, PLACES } from "@/db/words";
import { dateField, idField, monthField, noteField, optionalNameField, pageFields, pageOf, positiveMinorField } from "@/lib/http/fields";

const personSchema = z.object({ id: z.string(), name: z.string() });

/** Money spent on running the work, as it is typed in. */
export const costInputSchema = z.strictObject({
  id: idField().optional(),
  spentOn: dateField("Date"),
  kind: z.enum(COST_KINDS, "Choose what it was for: fuel, disposal, supplies, repairs or other."),
  amountMinor: positiveMinorField("Amount"),
  paidFrom: z.enum(PAID_FROM, "Choose what it was paid from: cash, bank, card or own-pocket.").default("cash"),
  note: noteField,
});

/** A body that says nothing, for what is done to a thing by its address alone. */
export const nothingSchema = z.strictObject({});

type Days = { from?: string | undefined; to?: string | undefined };
const inOrder = ({ from, to }: Days) => from === undefined || to === undefined || from <= to;
const outOfOrder = { path: ["to"], error: "To must be the same day as From, or later." };

export const costListQuery = z
  .strictObject({
    ...pageFields,
    from: dateField("From").optional(),
    to: dateField("To").optional(),
    kind: z.enum(COST_KINDS, "Kind must be fuel, disposal, supplies, repairs or other.").optional(),
  })
  .refine(inOrder, outOfOrder);

export const costSchema = z.object({
  id: z.string(),
  spentOn: z.string(),
  kind: z.enum(COST_KINDS),
  amountMinor: z.int(),
  paidFrom: z.enum(PAID_FROM),
  note: z.string().nullable(),
  madeBy: personSchema,
  madeAt: z.string(),
  /** Null while it stands. */
  voidedAt: z.string().nullable(),
  version: z.int(),
});
export const costListSchema = pageOf(costSchema);

export const earningsQuery = z.strictObject({ month: monthField });

const gradeEarningsSchema = z.object({
  gradeId: z.string(),
  gradeName: z.string(),
  family: z.string(),
  /** Sold, by the yards' nets, in the outfit's weight unit. */
  quantity: z.string(),
  salesMinor: z.int(),
  costMinor: z.int(),
  marginMinor: z.int(),
  /** Money per weight unit; null when no weight is left of the sales. */
  averagePrice: z.string().nullable(),
  /** The same grade in the month before; null when it was not sold then. */
  before: z.object({ quantity: z.string(), salesMinor: z.int(), averagePrice: z.string().nullable() }).nullable(),
});

/** A month: what was sold, what it cost, what was left, and why that changed. */
export const earningsSchema = z.object({
  month: z.string(),
  /** When the month was closed; null while it is open. */
  closedAt: z.string().nullable(),
  salesMinor: z.int(),
  quantity: z.string(),
  byGrade: z.array(gradeEarningsSchema),
  costOfScrapMinor: z.int(),
  /** Running costs: every expense but the cost of scrap, stock loss and rounding. */
  costsMinor: z.int(),
  costsByKind: z.array(z.object({ account: z.string(), name: z.string(), amountMinor: z.int() })),
  haulAwayFeesMinor: z.int(),
  stockLossMinor: z.int(),
  roundingMinor: z.int(),
  netMinor: z.int(),
  /** Hauls picked up in the month that are not void. */
  pickups: z.int(),
  /** Why sales changed against the month before; the three sum to the change. */
  why: z.object({ priceMinor: z.int(), volumeMinor: z.int(), mixMinor: z.int(), changeMinor: z.int() }),
  before: z.object({
    month: z.string(),
    netMinor: z.int(),
    salesMinor: z.int(),
    quantity: z.string(),
    costOfScrapMinor: z.int(),
    costsMinor: z.int(),
  }),
});

const DOCUMENT_TYPES = ["pickup", "weigh-in", "count", "ticket", "payment", "cost"] as const;

const bookFields = {
  ...pageFields,
  from: dateField("From").optional(),
  to: dateField("To").optional(),
  month: monthField.optional(),
  gradeId: idField("grade").optional(),
  pickupId: idField("pickup").optional(),
  documentType: z.enum(DOCUMENT_TYPES, "Document type must be pickup, weigh-in, count, ticket, payment or cost.").optional(),
  documentId: idField("document").optional(),
};

const typed = (query: { documentType?: unknown; documentId?: unknown }) => query.documentId === undefined || query.documentType !== undefined;
const untyped = { path: ["documentType"], error: "Say what type of document it is." };

/** Which entries of the money book: those with a posting that fits all of it. */
export const entryListQuery = z
  .strictObject({
    ...bookFields,
    account: optionalNameField("Account", 40),
    yardId: idField("yard").optional(),
    ticketId: idField("ticket").optional(),
  })
  .refine(inOrder, outOfOrder)
  .refine(typed, untyped);

/** Which movements of the weight book: those with a line that fits all of it. */
export const movementListQuery = z
  .strictObject({
    ...bookFields,
    place: z.enum(PLACES, "Place must be outside, pile, bin, load, sold, waste or variance.").optional(),
    binId: idField("bin").optional(),
  })
  .refine(inOrder, outOfOrder)
  .refine(typed, untyped);

const recordFields = {
  id: z.string(),
  /** One running order over both books. */
  sequence: z.int(),
  occurredOn: z.string(),
  kind: z.string(),
  documentType: z.string(),
  documentId: z.string(),
  /** The record this one takes back; null for a first booking. */
  reversesId: z.string().nullable(),
  madeBy: personSchema,
  madeAt: z.string(),
};

const postingSchema = z.object({
  line: z.int(),
  account: z.string(),
  accountName: z.string(),
  /** Debit when positive. */
  amountMinor: z.int(),
  gradeId: z.string().nullable(),
  gradeName: z.string().nullable(),
  yardId: z.string().nullable(),
  yardName: z.string().nullable(),
  pickupId: z.string().nullable(),
  pickupNumber: z.int().nullable(),
  ticketId: z.string().nullable(),
  ticketNumber: z.string().nullable(),
  memberId: z.string().nullable(),
  memberName: z.string().nullable(),
});

const movementLineSchema = z.object({
  line: z.int(),
  place: z.enum(PLACES),
  /** Into the place when positive. */
  quantity: z.string(),
  binId: z.string().nullable(),
  binLabel: z.string().nullable(),
  gradeId: z.string().nullable(),
  gradeName: z.string().nullable(),
  pickupId: z.string().nullable(),
  pickupNumber: z.int().nullable(),
});

export const entrySchema = z.object({ ...recordFields, postings: z.array(postingSchema) });
export const entryListSchema = pageOf(entrySchema);
export const movementSchema = z.object({ ...recordFields, lines: z.array(movementLineSchema) });
export const movementListSchema = pageOf(movementSchema);

/** The always-true list, and whether all of it holds. */
export const booksCheckSchema = z.object({
  items: z.array(z.object({ rule: z.string(), holds: z.boolean(), detail: z.string() })),
  holds: z.boolean(),
});

export const monthSchema = z.object({
  month: z.string(),
  /** Null while the month is open. */
  closedAt: z.string().nullable(),
  closedBy: personSchema.nullable(),
  /** When it was last opened again; null when it never was. */
  reopenedAt: z.string().nullable(),
});

export type CostInput = z.output<typeof costInputSchema>;
export type CostListQuery = z.output<typeof costListQuery>;
export type Cost = z.output<typeof costSchema>;
export type Earnings = z.output<typeof earningsSchema>;
export type GradeEarnings = Earnings["byGrade"][number];
export type EntryListQuery = z.output<typeof entryListQuery>;
export type MovementListQuery = z.output<typeof movementListQuery>;
export type Entry = z.output<typeof entrySchema>;
export type Movement = z.output<typeof movementSchema>;
export type Month = z.output<typeof monthSchema>;
