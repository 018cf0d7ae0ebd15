import { sql } from "drizzle-orm";
import { check, foreignKey, index, int, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { businessDate, id, instant, minor, weight, word } from "./columns";
import { grades } from "./catalogue";
import { memberships, outfits } from "./people";
import { bins } from "./bins";
import { pickups } from "./pickups";
import { yards } from "./prices";
import { tickets } from "./tickets";
import { PLACES, ACCOUNT_KINDS } from "../words";

/**
 * One row an outfit: the lock of its books. Every booking takes this row FOR UPDATE first, so the books of one outfit are written one
 * booking at a time and no booking decides on a balance that another is changing. Also hands out the running numbers.
 */
export const bookState = mysqlTable("book_state", {
  outfitId: id("outfit_id")
    .primaryKey()
    .references(() => outfits.id),
  nextPickupNumber: int("next_pickup_number").notNull().default(1),
  /** Counts bookings; gives movements and entries one order within the outfit. */
  nextSequence: int("next_sequence").notNull().default(1),
});

/** A month that was closed at least once. A month with no row is open. */
export const months = mysqlTable(
  "months",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    /** `YYYY-MM`. */
    month: word("month", 7).notNull(),
    /** NULL while the month is open again. A trigger refuses postings dated in a closed month. */
    closedAt: instant("closed_at"),
    closedBy: id("closed_by"),
    reopenedAt: instant("reopened_at"),
    reopenedBy: id("reopened_by"),
  },
  (t) => [primaryKey({ columns: [t.outfitId, t.month] })],
);

/** An account of the money book. Seeded with the outfit; may be renamed and added to. */
export const accounts = mysqlTable(
  "accounts",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    /** Fixed word that the code posts by. */
    code: word("code", 40).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    kind: mysqlEnum("kind", ACCOUNT_KINDS).notNull(),
    position: int("position").notNull(),
  },
  (t) => [primaryKey({ columns: [t.outfitId, t.code] })],
);

/** Weight book: one balanced record. Append-only (trigger). */
export const movements = mysqlTable(
  "movements",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    sequence: int("sequence").notNull(),
    occurredOn: businessDate("occurred_on").notNull(),
    /** The event: pickup, weigh-in, count, ticket, work-out. A reversal keeps the kind of what it reverses. */
    kind: word("kind", 20).notNull(),
    documentType: word("document_type", 20).notNull(),
    documentId: id("document_id").notNull(),
    /** The movement this one takes back. NULL for a first booking; unique, so nothing is reversed twice. */
    reversesId: id("reverses_id"),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("movements_reverses").on(t.outfitId, t.reversesId),
    // Lists by day, newest first, and the records of one document.
    index("movements_day").on(t.outfitId, t.occurredOn, t.sequence),
    index("movements_document").on(t.outfitId, t.documentType, t.documentId),
    foreignKey({ name: "movements_reversed", columns: [t.outfitId, t.reversesId], foreignColumns: [t.outfitId, t.id] }),
    foreignKey({ name: "movements_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
  ],
);

/** Weight book: the lines of a movement; their quantities sum to zero. Append-only (trigger). */
export const movementLines = mysqlTable(
  "movement_lines",
  {
    outfitId: id("outfit_id").notNull(),
    movementId: id("movement_id").notNull(),
    line: int("line").notNull(),
    place: mysqlEnum("place", PLACES).notNull(),
    /** Set exactly when the place is a bin. */
    binId: id("bin_id"),
    /** Set exactly when the place is the pile: whose lot. */
    pickupId: id("pickup_id"),
    /** NULL for material that has no grade yet (outside, pile, and their variance). */
    gradeId: id("grade_id"),
    /** Into the place when positive, in the book unit. */
    quantity: weight("quantity").notNull(),
    /** The movement's date again, so that reports need no join. */
    occurredOn: businessDate("occurred_on").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.movementId, t.line] }),
    // Rebuild of a bin, and what was sold of a grade in a month.
    index("movement_lines_of_bin").on(t.outfitId, t.binId, t.gradeId),
    index("movement_lines_place").on(t.outfitId, t.place, t.occurredOn, t.gradeId),
    index("movement_lines_of_pickup").on(t.outfitId, t.pickupId),
    foreignKey({ name: "movement_lines_movement", columns: [t.outfitId, t.movementId], foreignColumns: [movements.outfitId, movements.id] }),
    foreignKey({ name: "movement_lines_grade", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
    // Bin and grade as one key: a line cannot put a grade into another grade's bin.
    foreignKey({ name: "movement_lines_bin", columns: [t.outfitId, t.binId, t.gradeId], foreignColumns: [bins.outfitId, bins.id, bins.gradeId] }),
    foreignKey({ name: "movement_lines_pickup", columns: [t.outfitId, t.pickupId], foreignColumns: [pickups.outfitId, pickups.id] }),
    check("movement_lines_bin_known", sql`(place = 'bin') = (bin_id is not null)`),
    check("movement_lines_lot_known", sql`(place = 'pile') = (pickup_id is not null)`),
    check("movement_lines_graded", sql`place not in ('bin', 'load', 'sold') or grade_id is not null`),
  ],
);

/** Money book: one balanced record. Append-only (trigger). */
export const entries = mysqlTable(
  "entries",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    sequence: int("sequence").notNull(),
    occurredOn: businessDate("occurred_on").notNull(),
    kind: word("kind", 20).notNull(),
    documentType: word("document_type", 20).notNull(),
    documentId: id("document_id").notNull(),
    reversesId: id("reverses_id"),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("entries_reverses").on(t.outfitId, t.reversesId),
    index("entries_day").on(t.outfitId, t.occurredOn, t.sequence),
    index("entries_document").on(t.outfitId, t.documentType, t.documentId),
    foreignKey({ name: "entries_reversed", columns: [t.outfitId, t.reversesId], foreignColumns: [t.outfitId, t.id] }),
    foreignKey({ name: "entries_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
  ],
);

/** Money book: the postings of an entry; their amounts sum to zero. Append-only (trigger). */
export const postings = mysqlTable(
  "postings",
  {
    outfitId: id("outfit_id").notNull(),
    entryId: id("entry_id").notNull(),
    line: int("line").notNull(),
    account: word("account", 40).notNull(),
    /** Debit when positive. */
    amountMinor: minor("amount_minor").notNull(),
    /** What the posting concerns; NULL where that does not apply. Every report is a grouping by these. */
    gradeId: id("grade_id"),
    yardId: id("yard_id"),
    pickupId: id("pickup_id"),
    ticketId: id("ticket_id"),
    memberId: id("member_id"),
    /** The entry's date again, so that reports need no join. */
    occurredOn: businessDate("occurred_on").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.entryId, t.line] }),
    // The month of one account, by grade: covering, because the earnings page reads thousands of these.
    index("postings_account").on(t.outfitId, t.account, t.occurredOn, t.gradeId, t.amountMinor),
    foreignKey({ name: "postings_entry", columns: [t.outfitId, t.entryId], foreignColumns: [entries.outfitId, entries.id] }),
    foreignKey({ name: "postings_account_known", columns: [t.outfitId, t.account], foreignColumns: [accounts.outfitId, accounts.code] }),
    foreignKey({ name: "postings_grade", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
    foreignKey({ name: "postings_yard", columns: [t.outfitId, t.yardId], foreignColumns: [yards.outfitId, yards.id] }),
    foreignKey({ name: "postings_pickup", columns: [t.outfitId, t.pickupId], foreignColumns: [pickups.outfitId, pickups.id] }),
    foreignKey({ name: "postings_ticket", columns: [t.outfitId, t.ticketId], foreignColumns: [tickets.outfitId, tickets.id] }),
    foreignKey({ name: "postings_member", columns: [t.outfitId, t.memberId], foreignColumns: [memberships.outfitId, memberships.id] }),
  ],
);

/** Balance of an account over all time: the sum of its postings, kept in the same transaction. */
export const accountBalances = mysqlTable(
  "account_balances",
  {
    outfitId: id("outfit_id").notNull(),
    account: word("account", 40).notNull(),
    balanceMinor: minor("balance_minor").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.account] }),
    foreignKey({ name: "account_balances_account", columns: [t.outfitId, t.account], foreignColumns: [accounts.outfitId, accounts.code] }),
  ],
);

/** Total of an account within a month: the sum of its postings dated in it, kept in the same transaction. */
export const accountMonths = mysqlTable(
  "account_months",
  {
    outfitId: id("outfit_id").notNull(),
    month: word("month", 7).notNull(),
    account: word("account", 40).notNull(),
    amountMinor: minor("amount_minor").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.month, t.account] }),
    foreignKey({ name: "account_months_account", columns: [t.outfitId, t.account], foreignColumns: [accounts.outfitId, accounts.code] }),
  ],
);

/** Moving weighted average: what the outfit holds of a grade in bins and on loads, and what it cost. */
export const gradeStock = mysqlTable(
  "grade_stock",
  {
    outfitId: id("outfit_id").notNull(),
    gradeId: id("grade_id").notNull(),
    quantity: weight("quantity").notNull(),
    costMinor: minor("cost_minor").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.gradeId] }),
    foreignKey({ name: "grade_stock_grade", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
    check("grade_stock_not_negative", sql`quantity >= 0 and cost_minor >= 0`),
    check("grade_stock_empty_costs_nothing", sql`quantity > 0 or cost_minor = 0`),
  ],
);
