import type { COST_KINDS, PAID_FROM, PLACES } from "@/db/words";

/** The closed lists of the money pages, as people say them. */
export const COST_NAME: Record<(typeof COST_KINDS)[number], string> = {
  fuel: "Fuel",
  disposal: "Disposal",
  supplies: "Supplies",
  repairs: "Repairs",
  other: "Other",
};

export const PAID_FROM_NAME: Record<(typeof PAID_FROM)[number], string> = { cash: "Cash", bank: "Bank", card: "Card", "own-pocket": "Own pocket" };

export const PLACE_NAME: Record<(typeof PLACES)[number], string> = {
  outside: "Outside",
  pile: "Pile",
  bin: "Bin",
  load: "Load",
  sold: "Sold",
  waste: "Waste",
  variance: "Variance",
};

const KIND_NAME: Record<string, string> = {
  pickup: "Pickup",
  "weigh-in": "Weigh-in",
  count: "Count",
  ticket: "Ticket",
  payment: "Payment",
  cost: "Cost",
  "work-out": "Worked out",
};

/** What a record of either book is about: "Ticket", "Ticket, taken back". */
export const recordWords = (record: { kind: string; reversesId: string | null }): string =>
  `${KIND_NAME[record.kind] ?? record.kind}${record.reversesId === null ? "" : ", taken back"}`;

/** Where the document behind a record is shown; null when it has no page of its own. */
export function documentPath(record: { documentType: string; documentId: string }, ticketId: string | null): string | null {
  switch (record.documentType) {
    case "pickup":
      return `/pickups/${record.documentId}`;
    case "ticket":
      return `/tickets/${record.documentId}`;
    case "payment":
      return ticketId === null ? null : `/tickets/${ticketId}`;
    case "cost":
      return "/money/costs";
    default:
      return "/bins";
  }
}

/** The short sign of a currency: "$". */
export const currencySign = (currency: string): string =>
  new Intl.NumberFormat("en-US", { style: "currency", currency, currencyDisplay: "narrowSymbol" }).formatToParts(0).find((part) => part.type === "currency")
    ?.value ?? currency;
