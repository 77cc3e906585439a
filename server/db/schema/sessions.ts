import { sql } from "drizzle-orm";
import {
  index,
  integer,
  json,
  jsonb,
  pgPolicy,
  pgTable,
  primaryKey,
  smallint,
  text,
  timestamp,
  uuid,
  varchar,
} from "drizzle-orm/pg-core";
import { actorUserId, nobodyActs, web } from "./roles.ts";

/**
 * The layout connect-pg-simple reads and writes. It finds a session before anybody is known, so no actor can own the
 * row; instead the table is closed to every transaction in which somebody acts. The cookie is signed besides: a
 * session's id alone opens nothing.
 */
export const sessions = pgTable(
  "sessions",
  {
    sid: varchar("sid").primaryKey(),
    sess: json("sess").notNull(),
    expire: timestamp("expire", { precision: 6 }).notNull(),
  },
  (t) => [
    index("sessions_expire").on(t.expire),
    pgPolicy("sessions_store", { for: "all", to: web, using: nobodyActs, withCheck: nobodyActs }),
  ],
);

/** Answers already given to POST requests, so that one sent twice is done once. */
export const idempotencyKeys = pgTable(
  "idempotency_keys",
  {
    userId: uuid("user_id").notNull(),
    key: text("key").notNull(),
    requestDigest: text("request_digest").notNull(),
    status: smallint("status"),
    response: jsonb("response"),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.userId, t.key] }),
    index("idempotency_keys_created").on(t.createdAt),
    pgPolicy("idempotency_keys_own", {
      for: "all",
      to: web,
      using: sql`user_id = ${actorUserId}`,
      withCheck: sql`user_id = ${actorUserId}`,
    }),
  ],
);

/** Requests counted per caller and window; shared by every copy of the API. */
export const rateLimits = pgTable(
  "rate_limits",
  {
    caller: text("caller").primaryKey(),
    hits: integer("hits").notNull(),
    resetAt: timestamp("reset_at", { withTimezone: true }).notNull(),
  },
  (t) => [
    index("rate_limits_reset").on(t.resetAt),
    pgPolicy("rate_limits_counting", { for: "all", to: web, using: nobodyActs, withCheck: nobodyActs }),
  ],
);
