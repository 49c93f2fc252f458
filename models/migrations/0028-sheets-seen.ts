import { isTime, type Migration } from "./migration";

/** What a person last saw of a change sheet, and what they had seen before that: it says what moved since. */
export const sheetsSeen: Migration = {
  name: "0028-sheets-seen",
  statements: [
    `CREATE TABLE sheets_seen (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      user_id INTEGER NOT NULL REFERENCES users (id),
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      seen TEXT NOT NULL CHECK (json_valid(seen)),
      last_at TEXT NOT NULL CHECK (${isTime("last_at")}),
      earlier TEXT CHECK (earlier IS NULL OR json_valid(earlier)),
      earlier_at TEXT CHECK (earlier_at IS NULL OR ${isTime("earlier_at")}),
      UNIQUE (user_id, proposal_id)
    ) STRICT`,
  ],
};
