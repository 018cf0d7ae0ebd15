import { sql } from "drizzle-orm";
import { check, foreignKey, index, int, mysqlEnum, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { businessDate, id, instant, minor } from "./columns";
import { memberships } from "./people";
import { PAID_FROM, COST_KINDS } from "../words";

/** Money spent on running the work. */
export const costs = mysqlTable(
  "costs",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    spentOn: businessDate("spent_on").notNull(),
    kind: mysqlEnum("kind", COST_KINDS).notNull(),
    amountMinor: minor("amount_minor").notNull(),
    paidFrom: mysqlEnum("paid_from", PAID_FROM).notNull(),
    /** What it was for, in the person's words. */
    note: varchar("note", { length: 2000 }),
    version: int("version").notNull().default(1),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
    voidedAt: instant("voided_at"),
    voidedBy: id("voided_by"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    index("costs_day").on(t.outfitId, t.spentOn, t.id),
    index("costs_maker_day").on(t.outfitId, t.madeBy, t.spentOn),
    foreignKey({ name: "costs_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("costs_amount", sql`amount_minor > 0`),
  ],
);
