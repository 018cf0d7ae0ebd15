/** The accounts every outfit starts with, in the order of a trial balance. The code posts by `code`; the name may be changed. */
export const ACCOUNTS = [
  { code: "cash", name: "Cash", kind: "asset" },
  { code: "bank", name: "Bank", kind: "asset" },
  { code: "card-processor", name: "Card processor", kind: "asset" },
  { code: "owed-by-yards", name: "Owed by yards", kind: "asset" },
  { code: "fees-owed", name: "Fees owed", kind: "asset" },
  { code: "scrap-stock", name: "Scrap stock", kind: "asset" },
  { code: "wages-owed", name: "Wages owed", kind: "liability" },
  { code: "sales-tax", name: "Sales tax", kind: "liability" },
  { code: "card", name: "Card", kind: "liability" },
  { code: "owed-to-members", name: "Owed to members", kind: "liability" },
  { code: "owner-money", name: "Owner's money in and out", kind: "equity" },
  { code: "scrap-sales", name: "Scrap sales", kind: "income" },
  { code: "haul-away-fees", name: "Haul-away fees", kind: "income" },
  { code: "cost-of-scrap-sold", name: "Cost of scrap sold", kind: "expense" },
  { code: "fuel", name: "Fuel", kind: "expense" },
  { code: "mileage", name: "Mileage", kind: "expense" },
  { code: "disposal", name: "Disposal", kind: "expense" },
  { code: "supplies", name: "Supplies", kind: "expense" },
  { code: "wages", name: "Wages", kind: "expense" },
  { code: "repairs", name: "Repairs", kind: "expense" },
  { code: "yard-fees", name: "Yard fees", kind: "expense" },
  { code: "other", name: "Other costs", kind: "expense" },
  { code: "stock-loss", name: "Stock loss", kind: "expense" },
  { code: "rounding", name: "Rounding", kind: "expense" },
] as const;

export type Account = (typeof ACCOUNTS)[number]["code"];

/** Where money for a haul or a cost comes from, as an account. Own-pocket money is owed back to the member. */
export const PAYING_ACCOUNT = { cash: "cash", bank: "bank", card: "card", "own-pocket": "owed-to-members" } as const satisfies Record<string, Account>;
