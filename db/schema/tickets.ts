import { sql } from "drizzle-orm";
import { boolean, check, foreignKey, index, int, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { businessDate, id, instant, minor, price, weight } from "./columns";
import { bins } from "./bins";
import { grades } from "./catalogue";
import { memberships } from "./people";
import { yards } from "./prices";
import { PRICE_PERS, TICKET_STATES, PAYMENT_METHODS } from "../words";

/** The yard's paper. A draft books nothing; posting books both ledgers. */
export const tickets = mysqlTable(
  "tickets",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    yardId: id("yard_id").notNull(),
    /** The number printed on the paper. */
    number: varchar("number", { length: 60 }).notNull(),
    /** The number while the ticket stands, NULL once void: one paper is entered once, and can be entered again after a void. */
    liveNumber: varchar("live_number", { length: 60 }).generatedAlwaysAs(sql`(if(state = 'void', null, number))`, { mode: "stored" }),
    ticketOn: businessDate("ticket_on").notNull(),
    state: mysqlEnum("state", TICKET_STATES).notNull().default("draft"),
    /** Sales tax the yard pays on top. */
    taxMinor: minor("tax_minor").notNull(),
    /** Fees the yard keeps back. */
    feeMinor: minor("fee_minor").notNull(),
    /** What the paper's total is off its own lines; 0 unless the person said the paper says so. Booked to rounding. */
    differenceMinor: minor("difference_minor").notNull(),
    /** lines + tax - fees + difference: what the yard owes. */
    totalMinor: minor("total_minor").notNull(),
    /** Sum of its standing payments. */
    paidMinor: minor("paid_minor").notNull().default(0),
    /** How the yard said it would pay. NULL when not said. */
    paymentMethod: mysqlEnum("payment_method", PAYMENT_METHODS),
    /** The person kept a sum that does not add up because the paper has it so. */
    paperSaysSo: boolean("paper_says_so").notNull().default(false),
    note: varchar("note", { length: 2000 }),
    version: int("version").notNull().default(1),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
    postedBy: id("posted_by"),
    postedAt: instant("posted_at"),
    voidedBy: id("voided_by"),
    voidedAt: instant("voided_at"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("tickets_paper").on(t.outfitId, t.yardId, t.liveNumber),
    index("tickets_day").on(t.outfitId, t.ticketOn, t.id),
    index("tickets_state").on(t.outfitId, t.state, t.ticketOn),
    foreignKey({ name: "tickets_yard", columns: [t.outfitId, t.yardId], foreignColumns: [yards.outfitId, yards.id] }),
    foreignKey({ name: "tickets_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("tickets_paid", sql`paid_minor >= 0 and paid_minor <= greatest(total_minor, 0)`),
  ],
);

/** A line of the paper, as printed. Weights in the book unit. */
export const ticketLines = mysqlTable(
  "ticket_lines",
  {
    outfitId: id("outfit_id").notNull(),
    ticketId: id("ticket_id").notNull(),
    line: int("line").notNull(),
    /** What it is to us: the grade that leaves our bins. */
    gradeId: id("grade_id").notNull(),
    /** The grade the yard bought it as, when another. NULL: the same. */
    soldAsGradeId: id("sold_as_grade_id"),
    /** The bin it leaves. NULL: the grade's bins, fullest first. */
    binId: id("bin_id"),
    gross: weight("gross"),
    tare: weight("tare"),
    deduction: weight("deduction"),
    net: weight("net").notNull(),
    /** Number of pieces, for a price per piece. */
    pieces: int("pieces"),
    price: price("price").notNull(),
    per: mysqlEnum("per", PRICE_PERS).notNull(),
    amountMinor: minor("amount_minor").notNull(),
    yardWording: varchar("yard_wording", { length: 120 }),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.ticketId, t.line] }),
    index("ticket_lines_grade").on(t.outfitId, t.gradeId),
    index("ticket_lines_bin").on(t.outfitId, t.binId, t.gradeId),
    foreignKey({ name: "ticket_lines_ticket", columns: [t.outfitId, t.ticketId], foreignColumns: [tickets.outfitId, tickets.id] }),
    foreignKey({ name: "ticket_lines_grade_known", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
    foreignKey({ name: "ticket_lines_sold_as", columns: [t.outfitId, t.soldAsGradeId], foreignColumns: [grades.outfitId, grades.id] }),
    foreignKey({ name: "ticket_lines_bin_known", columns: [t.outfitId, t.binId, t.gradeId], foreignColumns: [bins.outfitId, bins.id, bins.gradeId] }),
    check("ticket_lines_net", sql`net > 0`),
  ],
);

/** Money the yard paid on a ticket. */
export const ticketPayments = mysqlTable(
  "ticket_payments",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    ticketId: id("ticket_id").notNull(),
    paidOn: businessDate("paid_on").notNull(),
    amountMinor: minor("amount_minor").notNull(),
    method: mysqlEnum("method", PAYMENT_METHODS).notNull(),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
    /** NULL while it stands; set when its ticket is voided. */
    voidedAt: instant("voided_at"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    index("ticket_payments_ticket").on(t.outfitId, t.ticketId),
    foreignKey({ name: "ticket_payments_ticket_known", columns: [t.outfitId, t.ticketId], foreignColumns: [tickets.outfitId, tickets.id] }),
    foreignKey({ name: "ticket_payments_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("ticket_payments_amount", sql`amount_minor > 0`),
  ],
);
