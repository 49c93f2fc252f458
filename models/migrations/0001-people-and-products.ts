import { fixedColumns, isDay, isOneOf, isTime, refuseDelete, type Migration } from "./migration";

const ROLES = ["component_owner", "reviewer", "program_manager", "auditor"];
const PRODUCT_KINDS = ["vehicle_fairing", "duct", "sign_panel", "other_body"];
const LINE_KINDS = ["item", "group", "operating_point", "finish", "allocations", "terms"];

export const peopleAndProducts: Migration = {
  name: "0001-people-and-products",
  statements: [
    `CREATE TABLE users (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      email TEXT NOT NULL UNIQUE CHECK (email = lower(trim(email)) AND length(email) BETWEEN 3 AND 254),
      name TEXT NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      password_hash TEXT NOT NULL,
      is_administrator INTEGER NOT NULL DEFAULT 0 CHECK (is_administrator IN (0, 1)),
      active INTEGER NOT NULL DEFAULT 1 CHECK (active IN (0, 1)),
      session_epoch INTEGER NOT NULL DEFAULT 0,
      preferences TEXT NOT NULL DEFAULT '{}' CHECK (json_valid(preferences)),
      created_at TEXT NOT NULL CHECK (${isTime("created_at")})
    ) STRICT`,
    refuseDelete("users"),
    `CREATE TABLE products (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      code TEXT NOT NULL UNIQUE
        CHECK (length(code) BETWEEN 2 AND 12 AND code NOT GLOB '*[^A-Z0-9-]*' AND code NOT GLOB '-*'),
      name TEXT NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      kind TEXT NOT NULL CHECK (${isOneOf("kind", PRODUCT_KINDS)}),
      time_zone TEXT NOT NULL,
      next_proposal_number INTEGER NOT NULL DEFAULT 1,
      created_at TEXT NOT NULL CHECK (${isTime("created_at")})
    ) STRICT`,
    fixedColumns("products", ["id", "code", "kind", "created_at"]),
    `CREATE TRIGGER products_numbers_grow BEFORE UPDATE ON products
      WHEN NEW.next_proposal_number < OLD.next_proposal_number
      BEGIN SELECT RAISE(ABORT, 'products: numbers are never used twice'); END`,
    refuseDelete("products"),
    `CREATE TABLE memberships (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      user_id INTEGER NOT NULL REFERENCES users (id),
      product_id INTEGER NOT NULL REFERENCES products (id),
      role TEXT NOT NULL CHECK (${isOneOf("role", ROLES)}),
      from_at TEXT NOT NULL CHECK (${isTime("from_at")}),
      until_at TEXT CHECK (until_at IS NULL OR (${isTime("until_at")} AND until_at >= from_at))
    ) STRICT`,
    "CREATE UNIQUE INDEX memberships_in_force ON memberships (user_id, product_id, role) WHERE until_at IS NULL",
    "CREATE INDEX memberships_of_product ON memberships (product_id)",
    fixedColumns("memberships", ["id", "user_id", "product_id", "role", "from_at"]),
    `CREATE TRIGGER memberships_end_once BEFORE UPDATE ON memberships WHEN OLD.until_at IS NOT NULL
      BEGIN SELECT RAISE(ABORT, 'memberships: a role that has ended stays ended'); END`,
    refuseDelete("memberships"),
    `CREATE TABLE deputies (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      holder_id INTEGER NOT NULL REFERENCES users (id),
      deputy_id INTEGER NOT NULL REFERENCES users (id),
      from_day TEXT NOT NULL CHECK (${isDay("from_day")}),
      until_day TEXT NOT NULL CHECK (${isDay("until_day")} AND until_day >= from_day),
      named_by_id INTEGER NOT NULL REFERENCES users (id),
      named_at TEXT NOT NULL CHECK (${isTime("named_at")}),
      ended_at TEXT CHECK (ended_at IS NULL OR ${isTime("ended_at")}),
      CHECK (holder_id <> deputy_id)
    ) STRICT`,
    fixedColumns("deputies", [
      "id",
      "product_id",
      "holder_id",
      "deputy_id",
      "from_day",
      "until_day",
      "named_by_id",
      "named_at",
    ]),
    refuseDelete("deputies"),
    `CREATE TABLE lines (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      kind TEXT NOT NULL CHECK (${isOneOf("kind", LINE_KINDS)}),
      number TEXT NOT NULL
        CHECK (length(number) BETWEEN 1 AND 12 AND number NOT GLOB '*[^A-Z0-9-]*' AND number NOT GLOB '-*'),
      reserved_at TEXT NOT NULL CHECK (${isTime("reserved_at")}),
      UNIQUE (product_id, kind, number),
      UNIQUE (id, product_id)
    ) STRICT`,
    "CREATE UNIQUE INDEX lines_one_sheet ON lines (product_id, kind) WHERE kind IN ('allocations', 'terms')",
    fixedColumns("lines", ["id", "product_id", "kind", "number", "reserved_at"]),
    refuseDelete("lines"),
  ],
};
