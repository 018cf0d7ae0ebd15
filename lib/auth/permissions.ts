import type { ROLES } from "@/db/words";

export type Role = (typeof ROLES)[number];

const ALL: readonly Role[] = ["owner", "bookkeeper", "collector", "sorter"];
const OFFICE: readonly Role[] = ["owner", "bookkeeper"];
const OWNER: readonly Role[] = ["owner"];

/**
 * Who may do what: the one table. Routes name a permission, the server looks it up here, and buttons are hidden by the same look-up.
 * "Own" in a comment means that the use case also checks who made the record.
 */
export const PERMISSIONS = {
  "outfit.see": ALL,
  "outfit.change": OWNER,
  "members.see": ALL,
  "members.change": OWNER,
  "api-keys.change": OWNER,
  "catalogue.see": ALL,
  "catalogue.change": ["owner", "sorter"],
  "bins.see": ALL,
  "bins.change": ["owner", "sorter"],
  "pickups.see": ALL,
  "pickups.make": ["owner", "collector"],
  // A collector: own, until worked.
  "pickups.change": ["owner", "collector"],
  "weigh-ins.see": ALL,
  "weigh-ins.make": ["owner", "collector", "sorter"],
  // A collector or sorter: own.
  "weigh-ins.void": ["owner", "collector", "sorter"],
  "counts.see": ALL,
  "counts.make": ["owner", "sorter"],
  // A sorter: own.
  "counts.void": ["owner", "sorter"],
  "yards.see": ALL,
  "yards.change": OFFICE,
  "prices.see": ALL,
  "prices.add": ["owner", "bookkeeper", "collector"],
  "prices.change": OFFICE,
  // A sorter: without money.
  "tickets.see": ALL,
  "tickets.check": ["owner", "bookkeeper", "collector"],
  "tickets.draft": ["owner", "bookkeeper", "collector"],
  "tickets.post": OFFICE,
  "tickets.pay": OFFICE,
  "tickets.void": OFFICE,
  // A collector or sorter: own.
  "costs.see": ALL,
  "costs.make": ALL,
  "costs.void": ALL,
  "earnings.see": OFFICE,
  "books.see": OFFICE,
  "months.close": OFFICE,
  "months.reopen": OWNER,
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof PERMISSIONS;

/** May this role do that? */
export const can = (role: Role, permission: Permission): boolean => (PERMISSIONS[permission] as readonly Role[]).includes(role);

/** Prices, values and what was paid: hidden from collectors and sorters when the owner says so. */
export const seesPrices = (role: Role, hidesMoney: boolean): boolean => !hidesMoney || OFFICE.includes(role);

/** Money on sale tickets: a sorter never sees it, a collector unless the owner hides it. */
export const seesTicketMoney = (role: Role, hidesMoney: boolean): boolean => role !== "sorter" && seesPrices(role, hidesMoney);

/** What stock cost and what was made of it: margins are for the owner and the bookkeeper. */
export const seesCost = (role: Role): boolean => OFFICE.includes(role);

/** Whether this role acts on everybody's records or only on its own. */
export const actsOnAll = (role: Role): boolean => OFFICE.includes(role);
