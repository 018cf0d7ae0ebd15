/** The closed lists of the domain: values of enum columns, inputs and pickers. No imports, so that forms can use them. */

export const ROLES = ["owner", "bookkeeper", "collector", "sorter"] as const;

export const WEIGHT_UNITS_OF_BOOKS = ["lb", "kg"] as const;

export const FAMILIES = ["copper", "wire", "brass", "aluminum", "steel", "stainless", "lead-zinc", "motors", "electronics", "precious", "other"] as const;

export const PLACES = ["outside", "pile", "bin", "load", "sold", "waste", "variance"] as const;

export const ACCOUNT_KINDS = ["asset", "liability", "equity", "income", "expense"] as const;

export const PICKUP_SOURCES = ["curb", "call-out", "drop-off", "bought"] as const;

export const PICKUP_STATES = ["open", "worked-out", "void"] as const;

export const PAID_FROM = ["cash", "bank", "card", "own-pocket"] as const;

export const PRICE_PERS = ["lb", "kg", "cwt", "short-ton", "long-ton", "tonne", "ozt", "each"] as const;

export const TICKET_STATES = ["draft", "posted", "paid", "void"] as const;

export const PAYMENT_METHODS = ["cash", "check", "transfer", "card"] as const;

export const COST_KINDS = ["fuel", "disposal", "supplies", "repairs", "other"] as const;
