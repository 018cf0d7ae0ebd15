import * as z from "zod";
import { FAMILIES, PAYMENT_METHODS, PRICE_PERS, TICKET_STATES } from "@/db/words";
import {
  countField,
  dateField,
  idField,
  minorField,
  nameField,
  noteField,
  optionalNameField,
  pageFields,
  pageOf,
  perField,
  positiveMinorField,
  positiveWeightField,
  priceField,
  weightField,
} from "@/lib/http/fields";

const methodField = z.enum(PAYMENT_METHODS, "Choose how it pays: cash, check, transfer or card.");

/** A line of the paper, as printed. Weights in the outfit's weight unit. */
const lineInputSchema = z.strictObject({
  gradeId: idField("grade"),
  /** The grade the yard bought it as, when another. */
  soldAsGradeId: idField("grade").optional(),
  /** Left out: the grade's bins, fullest first. */
  binId: idField("bin").optional(),
  gross: weightField("Gross").optional(),
  tare: weightField("Tare").optional(),
  deduction: weightField("Deduction").optional(),
  net: positiveWeightField("Net"),
  /** Number of pieces, for a price per piece. */
  pieces: countField("Pieces", 1_000_000).optional(),
  price: priceField(),
  per: perField,
  amountMinor: minorField("Amount"),
  yardWording: optionalNameField("Yard's wording", 120),
});

/** The yard's paper as it is copied. */
export const ticketInputSchema = z.strictObject({
  id: idField().optional(),
  yardId: idField("yard"),
  number: nameField("Ticket number", 60),
  ticketOn: dateField("Date"),
  lines: z.array(lineInputSchema, "Enter one line or more.").min(1, "Enter one line or more.").max(100, "A ticket can have 100 lines or fewer."),
  taxMinor: minorField("Tax").default(0),
  feeMinor: minorField("Fees").default(0),
  totalMinor: minorField("Total"),
  paymentMethod: methodField.optional(),
  /** The person looked: the sum that does not add up stands so on the paper. */
  paperSaysSo: z.boolean("Say true when the paper says so.").default(false),
  note: noteField,
});

/** Money that the yard paid. */
export const paymentInputSchema = z.strictObject({
  id: idField().optional(),
  paidOn: dateField("Date"),
  amountMinor: positiveMinorField("Amount"),
  method: methodField,
});

export const nothingSchema = z.strictObject({});

export const ticketListQuery = z.strictObject({
  ...pageFields,
  state: z.enum([...TICKET_STATES, "unpaid"], "State must be draft, posted, paid, void or unpaid.").optional(),
  yardId: idField("yard").optional(),
  from: dateField("From").optional(),
  to: dateField("To").optional(),
});

/** Money fields are null for those who may not see them. */
const headShape = {
  id: z.string(),
  yardId: z.string(),
  yardName: z.string(),
  number: z.string(),
  ticketOn: z.string(),
  state: z.enum(TICKET_STATES),
  quantity: z.string(),
  lineCount: z.int(),
  totalMinor: z.int().nullable(),
  paidMinor: z.int().nullable(),
  leftMinor: z.int().nullable(),
  paymentMethod: z.enum(PAYMENT_METHODS).nullable(),
  paperSaysSo: z.boolean(),
  madeBy: z.object({ id: z.string(), name: z.string() }),
  madeAt: z.string(),
  version: z.int(),
};

export const ticketHeadSchema = z.object(headShape);
export const ticketListSchema = pageOf(ticketHeadSchema);

const ticketLineSchema = z.object({
  line: z.int(),
  gradeId: z.string(),
  gradeName: z.string(),
  family: z.enum(FAMILIES),
  soldAsGradeId: z.string().nullable(),
  soldAsGradeName: z.string().nullable(),
  binId: z.string().nullable(),
  binLabel: z.string().nullable(),
  gross: z.string().nullable(),
  tare: z.string().nullable(),
  deduction: z.string().nullable(),
  net: z.string(),
  pieces: z.int().nullable(),
  price: z.string().nullable(),
  per: z.enum(PRICE_PERS),
  amountMinor: z.int().nullable(),
  yardWording: z.string().nullable(),
});

const paymentSchema = z.object({
  id: z.string(),
  paidOn: z.string(),
  amountMinor: z.int().nullable(),
  method: z.enum(PAYMENT_METHODS),
  madeBy: z.object({ id: z.string(), name: z.string() }),
  voidedAt: z.string().nullable(),
});

export const ticketSchema = z.object({
  ...headShape,
  taxMinor: z.int().nullable(),
  feeMinor: z.int().nullable(),
  differenceMinor: z.int().nullable(),
  note: z.string().nullable(),
  postedAt: z.string().nullable(),
  voidedAt: z.string().nullable(),
  lines: z.array(ticketLineSchema),
  payments: z.array(paymentSchema),
});

const wrongSumSchema = z.object({
  path: z.string(),
  message: z.string(),
  /** What the sum gives: a weight for net, minor units as text for amounts. */
  expected: z.string(),
});

export const ticketCheckSchema = z.object({
  /** Sums of the paper that do not add up. */
  sums: z.array(wrongSumSchema),
  /** Each line's price against the yard's sheet in force on the ticket's date. */
  lines: z.array(
    z.object({
      line: z.int(),
      gradeName: z.string(),
      price: z.string(),
      per: z.enum(PRICE_PERS),
      sheetPrice: z.string().nullable(),
      sheetPer: z.enum(PRICE_PERS).nullable(),
      sheetFrom: z.string().nullable(),
      /** What the line pays more (or less, negative) than the sheet; null without a sheet price to compare. */
      differenceMinor: z.int().nullable(),
    }),
  ),
  /** What the lines pay under the sheet, summed over those that pay less. */
  underSheetMinor: z.int(),
});

export type TicketInput = z.output<typeof ticketInputSchema>;
export type PaymentInput = z.output<typeof paymentInputSchema>;
export type TicketListQuery = z.output<typeof ticketListQuery>;
export type Ticket = z.output<typeof ticketSchema>;
export type TicketHead = z.output<typeof ticketHeadSchema>;
export type TicketCheck = z.output<typeof ticketCheckSchema>;
