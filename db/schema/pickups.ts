import { sql } from "drizzle-orm";
import { check, foreignKey, index, int, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { businessDate, id, instant, minor, weight } from "./columns";
import { itemKinds } from "./catalogue";
import { memberships } from "./people";
import { PICKUP_SOURCES, PICKUP_STATES, PAID_FROM } from "../words";

/** One stop's haul. */
export const pickups = mysqlTable(
  "pickups",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    /** Running number within the outfit, the one people say aloud. */
    number: int("number").notNull(),
    pickedUpOn: businessDate("picked_up_on").notNull(),
    source: mysqlEnum("source", PICKUP_SOURCES).notNull(),
    place: varchar("place", { length: 200 }),
    note: varchar("note", { length: 2000 }),
    /** Money given for the haul; 0 when nothing was paid. */
    paidMinor: minor("paid_minor").notNull(),
    /** Where that money came from. */
    paidFrom: mysqlEnum("paid_from", PAID_FROM).notNull(),
    /** Sum of the items' estimates when it was logged, in the book unit. */
    estimatedWeight: weight("estimated_weight").notNull(),
    /** open: material may still come of it. worked-out: nothing is left. */
    state: mysqlEnum("state", PICKUP_STATES).notNull().default("open"),
    version: int("version").notNull().default(1),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
    voidedAt: instant("voided_at"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("pickups_number").on(t.outfitId, t.number),
    // Newest first, and the open ones for the pile.
    index("pickups_day").on(t.outfitId, t.pickedUpOn, t.id),
    index("pickups_state").on(t.outfitId, t.state, t.pickedUpOn),
    foreignKey({ name: "pickups_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("pickups_paid", sql`paid_minor >= 0`),
  ],
);

/** What was picked up, by item kind. */
export const pickupItems = mysqlTable(
  "pickup_items",
  {
    outfitId: id("outfit_id").notNull(),
    pickupId: id("pickup_id").notNull(),
    line: int("line").notNull(),
    itemKindId: id("item_kind_id").notNull(),
    count: int("count").notNull(),
    /** Weight of the whole line when it was put on a scale. NULL when estimated from the kind's typical weight. */
    weighed: weight("weighed"),
    /** What the pile was booked with for this line. */
    estimatedWeight: weight("estimated_weight").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.pickupId, t.line] }),
    index("pickup_items_kind").on(t.outfitId, t.itemKindId),
    foreignKey({ name: "pickup_items_pickup", columns: [t.outfitId, t.pickupId], foreignColumns: [pickups.outfitId, pickups.id] }),
    foreignKey({ name: "pickup_items_kind_known", columns: [t.outfitId, t.itemKindId], foreignColumns: [itemKinds.outfitId, itemKinds.id] }),
    check("pickup_items_count", sql`count > 0`),
  ],
);

/** The pile: what is left of each pickup's estimate, and of the money paid for it. Kept with the movement lines and postings. */
export const lots = mysqlTable(
  "lots",
  {
    outfitId: id("outfit_id").notNull(),
    pickupId: id("pickup_id").notNull(),
    remainingWeight: weight("remaining_weight").notNull(),
    remainingCostMinor: minor("remaining_cost_minor").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.pickupId] }),
    foreignKey({ name: "lots_pickup", columns: [t.outfitId, t.pickupId], foreignColumns: [pickups.outfitId, pickups.id] }),
    check("lots_not_negative", sql`remaining_weight >= 0 and remaining_cost_minor >= 0`),
  ],
);
