import { boolean, decimal, foreignKey, index, int, json, mysqlEnum, mysqlTable, primaryKey, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { id, weight, word } from "./columns";
import { outfits } from "./people";
import { FAMILIES } from "../words";

/** A class of metal that a yard prices. Each outfit starts with its own copy of the catalogue and may change it. */
export const grades = mysqlTable(
  "grades",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    id: id("id").notNull(),
    /** The catalogue's word for it. NULL for a grade the outfit made itself. */
    key: word("key", 60),
    name: varchar("name", { length: 120 }).notNull(),
    family: mysqlEnum("family", FAMILIES).notNull(),
    /** A published trade code, where one fits. */
    tradeCode: varchar("trade_code", { length: 40 }),
    what: text("what").notNull(),
    notThis: text("not_this").notNull(),
    /** Share of metal that comes out, 0 to 1. NULL when nobody has said. */
    typicalRecovery: decimal("typical_recovery", { precision: 6, scale: 4 }),
    /** What local law may ask for before it is sold. NULL when nothing is known. */
    regulated: text("regulated"),
    /** Order in lists: the catalogue's, then the outfit's own. */
    position: int("position").notNull(),
    /** FALSE hides the grade from pickers; what is booked stays. */
    active: boolean("active").notNull().default(true),
    version: int("version").notNull().default(1),
  },
  (t) => [primaryKey({ columns: [t.outfitId, t.id] }), uniqueIndex("grades_key").on(t.outfitId, t.key), uniqueIndex("grades_name").on(t.outfitId, t.name)],
);

/** A type of thing found, with what it usually weighs and the hazards it carries. */
export const itemKinds = mysqlTable(
  "item_kinds",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    id: id("id").notNull(),
    key: word("key", 60),
    name: varchar("name", { length: 120 }).notNull(),
    plural: varchar("plural", { length: 120 }).notNull(),
    /** At most 14 letters, for the tile on a phone. */
    tileName: varchar("tile_name", { length: 40 }).notNull(),
    /** Heading in pickers: kitchen, laundry and so on. */
    groupName: varchar("group_name", { length: 60 }).notNull(),
    /** One whole item, in the outfit's book unit. */
    typicalWeight: weight("typical_weight").notNull(),
    /** Where the weight comes from: memory, published, measured. */
    weightMark: word("weight_mark", 20).notNull(),
    /** Usual minutes to take one apart. NULL when nobody has said. */
    minutes: decimal("minutes", { precision: 6, scale: 1 }),
    /** Hazard keys, first one first. */
    hazards: json("hazards").$type<string[]>().notNull(),
    /** The record that must exist before it is cut or sold. NULL when none. */
    holdUntil: word("hold_until", 40),
    /** Catalogue key of the grade a whole one sells as. */
    sellWholeGrade: word("sell_whole_grade", 60),
    position: int("position").notNull(),
    active: boolean("active").notNull().default(true),
    version: int("version").notNull().default(1),
  },
  (t) => [primaryKey({ columns: [t.outfitId, t.id] }), uniqueIndex("item_kinds_key").on(t.outfitId, t.key)],
);

/** One line of a breakdown sheet: a part inside an item kind. */
export const itemKindParts = mysqlTable(
  "item_kind_parts",
  {
    outfitId: id("outfit_id").notNull(),
    itemKindId: id("item_kind_id").notNull(),
    position: int("position").notNull(),
    key: word("key", 60).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    /** Where it sits and what it looks like: the sheet's own sentences. */
    whereItSits: text("where_it_sits").notNull(),
    looksLike: text("looks_like").notNull(),
    /** How to tell the metal. NULL where looking is enough. */
    test: text("test"),
    /** Catalogue keys of the usual grade, what it may be instead, and what it counts as when left in. */
    grade: word("grade", 60).notNull(),
    altGrade: word("alt_grade", 60),
    leaveAs: word("leave_as", 60),
    perItem: int("per_item").notNull(),
    /** One piece of this part, in the outfit's book unit; an item has `per_item` of them. */
    typicalWeight: weight("typical_weight").notNull(),
    weightMark: word("weight_mark", 20).notNull(),
    oftenMissed: boolean("often_missed").notNull(),
    minutes: decimal("minutes", { precision: 6, scale: 1 }),
    hazard: word("hazard", 40),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.itemKindId, t.position] }),
    foreignKey({ name: "item_kind_parts_kind", columns: [t.outfitId, t.itemKindId], foreignColumns: [itemKinds.outfitId, itemKinds.id] }),
    // "Which kinds hold this grade?"
    index("item_kind_parts_grade").on(t.outfitId, t.grade),
  ],
);
