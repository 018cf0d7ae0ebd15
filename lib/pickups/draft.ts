import * as z from "zod";
import { PAID_FROM, PICKUP_SOURCES } from "@/db/words";
import { add, multiply, type DecimalString } from "@/lib/arithmetic/decimal";
import { minorFromDecimal } from "@/lib/arithmetic/money";
import { readNumber } from "@/lib/arithmetic/read-number";
import { WEIGHT_PLACES } from "@/lib/arithmetic/weight";
import type { FieldError } from "@/lib/http/errors";
import type { PickupInput } from "./schema";

/** A haul being counted, as it is kept on the device: text as typed, counts by item kind id. */
const draftSchema = z.object({
  /** The id the pickup will have, so that one haul sent from a reopened page is still one haul. */
  id: z.string(),
  /** The visit to the page in which it was begun. */
  visit: z.string(),
  /** The day chosen. Null: today, whenever it is saved. */
  pickedUpOn: z.string().nullable(),
  source: z.enum(PICKUP_SOURCES),
  place: z.string(),
  note: z.string(),
  paid: z.string(),
  paidFrom: z.enum(PAID_FROM),
  counts: z.record(z.string(), z.int().min(0)),
});

export type HaulDraft = z.output<typeof draftSchema>;

/** A haul that nothing was done to yet. */
export const freshDraft = (id: string, visit: string): HaulDraft => ({
  id,
  visit,
  pickedUpOn: null,
  source: "curb",
  place: "",
  note: "",
  paid: "",
  paidFrom: "cash",
  counts: {},
});

/** Reads a kept draft back; null for none, or for text of another version of the app. */
export function readDraft(text: string | null): HaulDraft | null {
  if (text === null) return null;
  try {
    const parsed = draftSchema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Whether a draft holds any work that would be missed. */
export const holdsWork = (draft: HaulDraft): boolean =>
  Object.values(draft.counts).some((count) => count > 0) || [draft.place, draft.note, draft.paid].some((text) => text.trim() !== "");

type CountedKind = { id: string; typicalWeight: DecimalString };

/** How many things are counted, and what they usually weigh together. */
export function haulTotals(counts: Record<string, number>, kinds: CountedKind[]): { items: number; weight: DecimalString } {
  return kinds.reduce(
    (total, kind) => {
      const count = counts[kind.id] ?? 0;
      return { items: total.items + count, weight: add(total.weight, multiply(kind.typicalWeight, String(count), WEIGHT_PLACES)) };
    },
    { items: 0, weight: "0" },
  );
}

type Money = { exponent: number; currencySymbols: string[] };

/** What was typed as paid, in minor units; nothing typed is nothing paid. Null when it is no amount of this currency. */
function paidMinorOf(text: string, money: Money): number | null {
  if (text.trim() === "") return 0;
  const read = readNumber(text, { locale: "en-US", currencySymbols: money.currencySymbols, places: money.exponent });
  return read.ok ? minorFromDecimal(read.value, money.exponent) : null;
}

export type DraftReading = { ok: true; input: PickupInput } | { ok: false; errors: FieldError[] };

/** The draft as the API takes it, its items in the order of `kinds`. What cannot be read as typed is an error at its field. */
export function readHaul(draft: HaulDraft, kinds: { id: string }[], today: string, money: Money): DraftReading {
  const paidMinor = paidMinorOf(draft.paid, money);
  if (paidMinor === null) {
    const example = money.exponent === 0 ? "25" : "25 or 12.50";
    return { ok: false, errors: [{ path: "paidMinor", message: `Paid must be an amount, like ${example}.` }] };
  }
  return {
    ok: true,
    input: {
      // A haul that nothing was done to has no id yet.
      ...(draft.id === "" ? {} : { id: draft.id }),
      pickedUpOn: draft.pickedUpOn ?? today,
      source: draft.source,
      place: draft.place,
      items: kinds.flatMap((kind) => ((draft.counts[kind.id] ?? 0) > 0 ? [{ itemKindId: kind.id, count: draft.counts[kind.id] ?? 0 }] : [])),
      paidMinor,
      paidFrom: draft.paidFrom,
      note: draft.note,
    },
  };
}
