import { bigint, boolean, foreignKey, index, int, json, mysqlEnum, mysqlTable, primaryKey, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { id, instant, word } from "./columns";
import { ROLES, WEIGHT_UNITS_OF_BOOKS } from "../words";

/** A person who signs in. Belongs to no outfit by itself: memberships say where they work. */
export const users = mysqlTable(
  "users",
  {
    id: id("id").primaryKey(),
    /** Lower case and NFKC-normalised by sign-up, so that one mailbox is one person. */
    email: varchar("email", { length: 254 }).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    /** argon2id, in PHC string form. */
    passwordHash: varchar("password_hash", { length: 255 }).notNull(),
    /** Raised when the password changes or a membership ends; a session token with another number is refused. */
    sessionVersion: int("session_version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [uniqueIndex("users_email").on(t.email)],
);

/** Sessions that were signed out of before their token ran out: a kept copy of such a token is refused. */
export const endedSessions = mysqlTable(
  "ended_sessions",
  {
    /** The session's own id, which its token carries. */
    id: id("id").primaryKey(),
    /** When the last token of the session runs out by itself; then the row is of no use. */
    expiresAt: instant("expires_at").notNull(),
  },
  // Rows of no use are swept by age.
  (t) => [index("ended_sessions_age").on(t.expiresAt)],
);

/** One business: the tenant. Every other table's key starts with its id. */
export const outfits = mysqlTable(
  "outfits",
  {
    id: id("id").primaryKey(),
    /** The word in URLs, made from the name at sign-up and never changed, so that links keep working. */
    slug: word("slug", 60).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    /** The town, shown beside the name. NULL until the owner types it. */
    place: varchar("place", { length: 120 }),
    /** ISO 3166-1 alpha-2. */
    country: word("country", 2).notNull(),
    /** ISO 4217; fixed once books exist. */
    currency: word("currency", 3).notNull(),
    /** The unit of every weight in the books; fixed once books exist. */
    weightUnit: mysqlEnum("weight_unit", WEIGHT_UNITS_OF_BOOKS).notNull(),
    /** IANA name; decides which calendar day a moment belongs to. Fixed once books exist. */
    timeZone: varchar("time_zone", { length: 64 }).notNull(),
    /** A price sheet older than this many days is stale. */
    staleAfterDays: int("stale_after_days").notNull().default(7),
    /** The owner hides prices and values from collectors and sorters. */
    hidesMoney: boolean("hides_money").notNull().default(false),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [uniqueIndex("outfits_slug").on(t.slug)],
);

/** A person in an outfit, with a role. Kept after removal, because the books name who made each record. */
export const memberships = mysqlTable(
  "memberships",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    id: id("id").notNull(),
    userId: id("user_id")
      .notNull()
      .references(() => users.id),
    role: mysqlEnum("role", ROLES).notNull(),
    /** NULL while the person belongs to the outfit. */
    removedAt: instant("removed_at"),
    version: int("version").notNull().default(1),
    joinedAt: instant("joined_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    // One membership a person and outfit: coming back reopens the old one. Also answers "which outfits am I in".
    uniqueIndex("memberships_user").on(t.userId, t.outfitId),
  ],
);

/** A link the owner hands to someone who should join. */
export const invitations = mysqlTable(
  "invitations",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    role: mysqlEnum("role", ROLES).notNull(),
    /** Who it is meant for, in the owner's words. NULL when not said. */
    note: varchar("note", { length: 200 }),
    /** SHA-256 of the token in the link, hexadecimal; the token itself is shown once. */
    tokenHash: word("token_hash", 64).notNull(),
    createdBy: id("created_by").notNull(),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    /** NULL until somebody joined by it; a link works once. */
    acceptedAt: instant("accepted_at"),
    revokedAt: instant("revoked_at"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("invitations_token").on(t.tokenHash),
    foreignKey({ name: "invitations_creator", columns: [t.outfitId, t.createdBy], foreignColumns: [memberships.outfitId, memberships.id] }),
  ],
);

/** A key with which a script acts for the outfit. */
export const apiKeys = mysqlTable(
  "api_keys",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    role: mysqlEnum("role", ROLES).notNull(),
    /** The first characters of the key, so that a person can tell two keys apart. */
    prefix: word("prefix", 16).notNull(),
    /** SHA-256 of the whole key, hexadecimal; the key itself is shown once. */
    keyHash: word("key_hash", 64).notNull(),
    /** The member the key's bookings are made in the name of. */
    createdBy: id("created_by").notNull(),
    createdAt: instant("created_at").notNull(),
    /** Written at most once a minute. NULL until first use. */
    lastUsedAt: instant("last_used_at"),
    revokedAt: instant("revoked_at"),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    uniqueIndex("api_keys_hash").on(t.keyHash),
    foreignKey({ name: "api_keys_creator", columns: [t.outfitId, t.createdBy], foreignColumns: [memberships.outfitId, memberships.id] }),
  ],
);

/** Who did what, written in the transaction that did it. Append-only (trigger). */
export const auditLog = mysqlTable(
  "audit_log",
  {
    outfitId: id("outfit_id").notNull(),
    id: id("id").notNull(),
    at: instant("at").notNull(),
    memberId: id("member_id").notNull(),
    /** Set when a script acted with a key in the member's name. */
    apiKeyId: id("api_key_id"),
    /** Verb-noun, like the use case: `post-ticket`. */
    action: word("action", 40).notNull(),
    subjectType: word("subject_type", 40).notNull(),
    subjectId: word("subject_id", 64).notNull(),
    requestId: word("request_id", 64).notNull(),
    /** What changed, for changes that no other table keeps. NULL when the subject's own rows tell it all. */
    detail: json("detail").$type<Record<string, unknown>>(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.id] }),
    // The history of one record.
    index("audit_log_subject").on(t.outfitId, t.subjectType, t.subjectId),
    foreignKey({ name: "audit_log_member", columns: [t.outfitId, t.memberId], foreignColumns: [memberships.outfitId, memberships.id] }),
  ],
);

/** The first answer to a booking request, kept so that the same request sent again books once. */
export const idempotencyKeys = mysqlTable(
  "idempotency_keys",
  {
    outfitId: id("outfit_id")
      .notNull()
      .references(() => outfits.id),
    /** SHA-256 of the Idempotency-Key header, hexadecimal: any length and alphabet is one fixed key. */
    keyHash: word("key_hash", 64).notNull(),
    /** SHA-256 of member, operation and parsed input; another request under the same key is refused. */
    fingerprint: word("fingerprint", 64).notNull(),
    /** JSON of the service's answer. NULL only inside the transaction that claims the key. */
    answer: text("answer"),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.outfitId, t.keyHash] }),
    // Old keys are swept by age.
    index("idempotency_keys_age").on(t.createdAt),
  ],
);

/** Counters of the rate limiter (its own column names), for sign-in, sign-up and public routes. */
export const rateLimits = mysqlTable("rate_limits", {
  key: varchar("key", { length: 255 }).primaryKey(),
  points: int("points").notNull().default(0),
  /** Milliseconds since the epoch. NULL means the counter does not expire. */
  expire: bigint("expire", { mode: "number", unsigned: true }),
});
