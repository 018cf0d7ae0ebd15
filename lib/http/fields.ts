import * as z from "zod";
import { compare, isDecimalString, isNegative, isPositive } from "@/lib/arithmetic/decimal";
import { BOOK_UNITS, WEIGHT_UNITS } from "@/lib/arithmetic/weight";
import { PRICE_UNITS } from "@/lib/arithmetic/price";
import { isRealDate } from "@/lib/clock";

/** Bounds and words of the fields that many inputs share. Client-safe: the forms use the same. */

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;
/** Control characters have no place in names and notes, except line breaks and tabs in notes. */
const CONTROLS = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/;
const CONTROLS_OR_BREAKS = /[\u0000-\u001f\u007f]/;

/** A UUID in lower case. */
export const idField = (thing = "id") => z.string(`Enter the ${thing}.`).max(36, `That is not the ${thing}.`).regex(UUID, `That is not the ${thing}.`);

const decimalWithin = (label: string, places: number, limit: string) =>
  z
    .string(`${label} must be a number in quotes, like "12.5".`)
    .max(24, `${label} has too many digits.`)
    .refine((text) => text !== "", `Enter ${label.toLowerCase()}.`)
    .refine(isDecimalString, { error: `${label} must be a number, like 12.5.`, abort: true })
    .refine((text) => (text.split(".")[1] ?? "").length <= places, `${label} must have ${places} decimals or fewer.`)
    .refine((text) => compare(text, limit) < 0, `${label} must be less than ${limit}.`);

/** A weight of zero or more, at most four decimals, under ten million. */
export const weightField = (label: string) => decimalWithin(label, 4, "10000000").refine((text) => !isNegative(text), `${label} must be 0 or more.`);

/** A weight above zero. */
export const positiveWeightField = (label: string) => decimalWithin(label, 4, "10000000").refine(isPositive, `${label} must be more than 0.`);

/** A price of zero or more, at most six decimals, under a million. */
export const priceField = (label = "Price") => decimalWithin(label, 6, "1000000").refine((text) => !isNegative(text), `${label} must be 0 or more.`);

/** Money in minor units, zero or more, at most ten billion. */
export const minorField = (label: string) =>
  z.int(`${label} must be a whole number of the smallest coin.`).min(0, `${label} must be 0 or more.`).max(10_000_000_000, `${label} is too large.`);

/** Money in minor units, more than zero. */
export const positiveMinorField = (label: string) =>
  z.int(`${label} must be a whole number of the smallest coin.`).min(1, `${label} must be more than 0.`).max(10_000_000_000, `${label} is too large.`);

/** A whole number of things. */
export const countField = (label: string, most = 10_000) =>
  z.int(`${label} must be a whole number, like 2.`).min(1, `${label} must be 1 or more.`).max(most, `${label} must be ${most} or fewer.`);

/** A real calendar date from 2000 on. Whether it may lie ahead is for the use case, which knows today. */
export const dateField = (label = "Date") =>
  z
    .string(`Enter ${label.toLowerCase()}, like 2026-03-05.`)
    .refine((text) => /^\d{4}-\d{2}-\d{2}$/.test(text) && isRealDate(text), { error: `${label} must be a real date, like 2026-03-05.`, abort: true })
    .refine((text) => text >= "2000-01-01" && text < "2100-01-01", `${label} must be between 2000 and 2099.`);

/** A month, `YYYY-MM`. */
export const monthField = z.string("Enter the month, like 2026-03.").regex(/^20\d{2}-(0[1-9]|1[0-2])$/, "Month must be like 2026-03.");

/** One line of words, trimmed, at least one letter. */
export const nameField = (label: string, most = 120) =>
  z
    .string(`Enter ${label.toLowerCase()}.`)
    .trim()
    .min(1, `Enter ${label.toLowerCase()}.`)
    .max(most, `${label} must be ${most} letters or fewer.`)
    .refine((text) => !CONTROLS_OR_BREAKS.test(text), `${label} must be on one line.`);

/** One line of words that may be missing; an empty one counts as missing. */
export const optionalNameField = (label: string, most = 200) =>
  z
    .string(`${label} must be words.`)
    .trim()
    .max(most, `${label} must be ${most} letters or fewer.`)
    .refine((text) => !CONTROLS_OR_BREAKS.test(text), `${label} must be on one line.`)
    .transform((text) => (text === "" ? undefined : text))
    .optional();

/** Free words over several lines that may be missing. */
export const noteField = z
  .string("Note must be words.")
  .trim()
  .max(2000, "Note must be 2,000 letters or fewer.")
  .refine((text) => !CONTROLS.test(text), "Note has characters that cannot be kept.")
  .transform((text) => (text === "" ? undefined : text))
  .optional();

export const weightUnitField = z.enum(WEIGHT_UNITS, "Unit must be one of lb, kg, oz, g, cwt, short-ton, long-ton, tonne, ozt.");
export const bookUnitField = z.enum(BOOK_UNITS, "Weight unit must be lb or kg.");
export const perField = z.enum(PRICE_UNITS, "Per must be one of lb, kg, cwt, short-ton, long-ton, tonne, ozt, each.");

/** Query of a list: how many, and where the page starts. */
export const pageFields = {
  limit: z.coerce
    .number("Limit must be a number.")
    .int("Limit must be a whole number.")
    .min(1, "Limit must be 1 or more.")
    .max(200, "Limit must be 200 or fewer.")
    .default(50),
  cursor: z.string().max(200, "That is not a cursor of this list.").optional(),
};

/** A page of a list. */
export const pageOf = <T extends z.ZodType>(item: T) => z.object({ items: z.array(item), nextCursor: z.string().nullable() });
