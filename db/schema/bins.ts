import { sql } from "drizzle-orm";
import { boolean, check, foreignKey, index, int, json, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { businessDate, id, instant, weight, word } from "./columns";
import { grades } from "./catalogue";
import { memberships } from "./people";
import { pickups } from "./pickups";

/** A container holding one grade. */
export const bins = mysqlTable(
  "bins",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    /** What is chalked on it: C2-1. */
    label: varchar("label", { length: 30 }).notNull(),
    /** Cannot change once anything was booked: movement lines point at bin and grade together. */
    gradeId: id("grade_id").notNull(),
    /** Weight of the empty container, in the book unit. */
    tare: weight("tare").notNull(),
    /** Where it stands. */
    place: varchar("place", { length: 120 }),
    /** Weight at which the outfit wants to sell. NULL when not set. */
    sellPoint: weight("sell_point"),
    /** NULL while in use. Only an empty bin is put away. */
    putAwayAt: instant("put_away_at"),
    version: int("version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("bins_label").on(t.outfitId, t.label),
    // Lets weigh-ins, counts and ticket lines carry bin and grade as one key.
    uniqueIndex("bins_grade").on(t.outfitId, t.id, t.gradeId),
    index("bins_of_grade").on(t.outfitId, t.gradeId),
    foreignKey({ name: "bins_grade_known", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
    check("bins_tare", sql`tare >= 0`),
  ],
);

/** What a bin holds: the sum of its movement lines, kept in the same transaction. A bin with no row holds nothing. */
export const binBalances = mysqlTable(
  "bin_balances",
  {
    outfitId: id("outfit_id").notNull(),
    binId: id("bin_id").notNull(),
    quantity: weight("quantity").notNull(),
    /** Day on which it was last filled from empty. NULL while empty. */
    heldSince: businessDate("held_since"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.binId] }),
    foreignKey({ name: "bin_balances_bin", columns: [t.outfitId, t.binId], foreignColumns: [bins.outfitId, bins.id] }),
    check("bin_balances_not_negative", sql`quantity >= 0`),
  ],
);

/** One draw of a weigh-in: a container put on the scale, as typed and in the unit as typed. */
export type Draw = { gross: string; tare: string };

/** Putting weighed metal into a bin. */
export const weighIns = mysqlTable(
  "weigh_ins",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    binId: id("bin_id").notNull(),
    gradeId: id("grade_id").notNull(),
    weighedOn: businessDate("weighed_on").notNull(),
    /** The pickup it came from. NULL: from the pile as a whole, or from outside. */
    pickupId: id("pickup_id"),
    /** TRUE: drawn from the oldest hauls of the pile. FALSE with no pickup: from outside, at no cost. */
    fromPile: boolean("from_pile").notNull().default(false),
    /** Sums over the draws, in the book unit; net = gross - tare. */
    gross: weight("gross").notNull(),
    tare: weight("tare").notNull(),
    net: weight("net").notNull(),
    /** The draws and the unit as they were typed. */
    draws: json("draws").$type<Draw[]>().notNull(),
    unit: word("unit", 12).notNull(),
    note: varchar("note", { length: 2000 }),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
    /** NULL while it stands. */
    voidedAt: instant("voided_at"),
    voidedBy: id("voided_by"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    index("weigh_ins_day").on(t.outfitId, t.weighedOn, t.id),
    index("weigh_ins_bin").on(t.outfitId, t.binId, t.gradeId),
    index("weigh_ins_pickup").on(t.outfitId, t.pickupId),
    foreignKey({ name: "weigh_ins_bin_known", columns: [t.outfitId, t.binId, t.gradeId], foreignColumns: [bins.outfitId, bins.id, bins.gradeId] }),
    foreignKey({ name: "weigh_ins_pickup_known", columns: [t.outfitId, t.pickupId], foreignColumns: [pickups.outfitId, pickups.id] }),
    foreignKey({ name: "weigh_ins_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("weigh_ins_net", sql`net > 0 and gross - tare = net`),
  ],
);

/** Weighing a bin to correct the book. */
export const counts = mysqlTable(
  "counts",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    binId: id("bin_id").notNull(),
    gradeId: id("grade_id").notNull(),
    countedOn: businessDate("counted_on").notNull(),
    gross: weight("gross").notNull(),
    tare: weight("tare").notNull(),
    /** What the scale says is in the bin. */
    net: weight("net").notNull(),
    /** What the book said just before. */
    bookQuantity: weight("book_quantity").notNull(),
    /** net - book; negative is a loss. */
    difference: weight("difference").notNull(),
    note: varchar("note", { length: 2000 }),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
    voidedAt: instant("voided_at"),
    voidedBy: id("voided_by"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    index("counts_day").on(t.outfitId, t.countedOn, t.id),
    foreignKey({ name: "counts_bin_known", columns: [t.outfitId, t.binId, t.gradeId], foreignColumns: [bins.outfitId, bins.id, bins.gradeId] }),
    foreignKey({ name: "counts_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("counts_net", sql`net >= 0 and net - book_quantity = difference`),
  ],
);
