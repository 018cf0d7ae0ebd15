import { sql } from "drizzle-orm";
import { boolean, check, decimal, foreignKey, index, int, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { businessDate, id, instant, price } from "./columns";
import { grades } from "./catalogue";
import { memberships, outfits } from "./people";
import { PRICE_PERS } from "../words";

/** A buyer. */
export const yards = mysqlTable(
  "yards",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    id: id("id").notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    place: varchar("place", { length: 200 }),
    phone: varchar("phone", { length: 40 }),
    hours: varchar("hours", { length: 200 }),
    /** What it asks of sellers, how it pays: free words. */
    note: varchar("note", { length: 2000 }),
    /** FALSE: not counted among the best prices, not offered for new tickets. */
    active: boolean("active").notNull().default(true),
    version: int("version").notNull().default(1),
  },
  (t) => [primaryKey({ columns: [t.outfitId, t.id] }), uniqueIndex("yards_name").on(t.outfitId, t.name)],
);

/** A yard's prices from a date on. In force until the yard's next sheet or its own last day. */
export const priceSheets = mysqlTable(
  "price_sheets",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    yardId: id("yard_id").notNull(),
    inForceFrom: businessDate("in_force_from").notNull(),
    /** NULL: until the next sheet. */
    lastDay: businessDate("last_day"),
    version: int("version").notNull().default(1),
    madeBy: id("made_by").notNull(),
    madeAt: instant("made_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    // One sheet a yard and day, so "the sheet in force" has one answer. Also finds the latest start on or before a date.
    uniqueIndex("price_sheets_start").on(t.outfitId, t.yardId, t.inForceFrom),
    foreignKey({ name: "price_sheets_yard", columns: [t.outfitId, t.yardId], foreignColumns: [yards.outfitId, yards.id] }),
    foreignKey({ name: "price_sheets_maker", columns: [t.outfitId, t.madeBy], foreignColumns: [memberships.outfitId, memberships.id] }),
    check("price_sheets_days", sql`last_day is null or last_day >= in_force_from`),
  ],
);

/** One price on a sheet, as quoted and normalised. */
export const priceSheetLines = mysqlTable(
  "price_sheet_lines",
  {
    outfitId: id("outfit_id").notNull(),
    sheetId: id("sheet_id").notNull(),
    line: int("line").notNull(),
    gradeId: id("grade_id").notNull(),
    price: price("price").notNull(),
    per: mysqlEnum("per", PRICE_PERS).notNull(),
    /** Money per book unit, for comparing. NULL for prices per piece. */
    normalised: decimal("normalised", { precision: 24, scale: 12 }),
    /** The yard's own words for the grade. */
    yardWording: varchar("yard_wording", { length: 120 }),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.sheetId, t.line] }),
    // One price a grade and sheet.
    uniqueIndex("price_sheet_lines_grade").on(t.outfitId, t.sheetId, t.gradeId),
    index("price_sheet_lines_of_grade").on(t.outfitId, t.gradeId),
    foreignKey({ name: "price_sheet_lines_sheet", columns: [t.outfitId, t.sheetId], foreignColumns: [priceSheets.outfitId, priceSheets.id] }),
    foreignKey({ name: "price_sheet_lines_grade_known", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
    check("price_sheet_lines_price", sql`price >= 0`),
  ],
);

/** The yard's wording for one of our grades, remembered from its sheets and tickets. */
export const gradeAliases = mysqlTable(
  "grade_aliases",
  {
    outfitId: id("outfit_id").notNull(),
    yardId: id("yard_id").notNull(),
    wording: varchar("wording", { length: 120 }).notNull(),
    gradeId: id("grade_id").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.yardId, t.wording] }),
    foreignKey({ name: "grade_aliases_yard", columns: [t.outfitId, t.yardId], foreignColumns: [yards.outfitId, yards.id] }),
    foreignKey({ name: "grade_aliases_grade", columns: [t.outfitId, t.gradeId], foreignColumns: [grades.outfitId, grades.id] }),
  ],
);
