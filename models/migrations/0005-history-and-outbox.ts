import { appendOnly, isHash, isOneOf, isTime, refuseDelete, refuseInsert, type Migration } from "./migration";

const GENESIS = "0".repeat(64);

export const historyAndOutbox: Migration = {
  name: "0005-history-and-outbox",
  statements: [
    `CREATE TABLE history_entries (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      chain TEXT NOT NULL,
      sequence INTEGER NOT NULL,
      at TEXT NOT NULL CHECK (${isTime("at")}),
      person_id INTEGER REFERENCES users (id),
      printed_name TEXT NOT NULL,
      capacity TEXT,
      act TEXT NOT NULL,
      subject_type TEXT NOT NULL,
      subject_id TEXT NOT NULL,
      subject_label TEXT NOT NULL,
      was TEXT CHECK (was IS NULL OR json_valid(was)),
      now TEXT CHECK (now IS NULL OR json_valid(now)),
      reason TEXT,
      outcome TEXT NOT NULL CHECK (${isOneOf("outcome", ["done", "refused"])}),
      canonical_text TEXT NOT NULL,
      previous_hash TEXT NOT NULL CHECK (${isHash("previous_hash")}),
      hash TEXT NOT NULL UNIQUE CHECK (${isHash("hash")}),
      UNIQUE (chain, sequence)
    ) STRICT`,
    "CREATE INDEX history_entries_of_subject ON history_entries (chain, subject_type, subject_id)",
    "CREATE INDEX history_entries_of_person ON history_entries (person_id, at)",
    `CREATE TABLE chain_heads (
      chain TEXT PRIMARY KEY,
      sequence INTEGER NOT NULL,
      hash TEXT NOT NULL CHECK (${isHash("hash")})
    ) STRICT, WITHOUT ROWID`,
    refuseInsert(
      "history_entries",
      "known_chain",
      "NEW.chain <> 'house' AND NOT EXISTS (SELECT 1 FROM products WHERE code = NEW.chain)",
      "history_entries: a chain is the house or a product",
    ),
    refuseInsert(
      "history_entries",
      "linked",
      `NEW.sequence <> 1 + (SELECT coalesce(max(sequence), 0) FROM history_entries WHERE chain = NEW.chain)
        OR NEW.previous_hash <> coalesce((SELECT hash FROM history_entries WHERE chain = NEW.chain
          ORDER BY sequence DESC LIMIT 1), '${GENESIS}')`,
      "history_entries: each follows the hash of the entry before it",
    ),
    `CREATE TRIGGER history_entries_head AFTER INSERT ON history_entries BEGIN
      INSERT INTO chain_heads (chain, sequence, hash) VALUES (NEW.chain, NEW.sequence, NEW.hash)
        ON CONFLICT (chain) DO UPDATE SET sequence = excluded.sequence, hash = excluded.hash;
    END`,
    ...appendOnly("history_entries"),
    refuseDelete("chain_heads"),
    `CREATE TABLE dropped_refusals (
      user_id INTEGER PRIMARY KEY,
      count INTEGER NOT NULL CHECK (count >= 0)
    ) STRICT`,
    `CREATE TABLE outbox_messages (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      key TEXT NOT NULL UNIQUE,
      to_user_id INTEGER NOT NULL REFERENCES users (id),
      template TEXT NOT NULL,
      data TEXT NOT NULL CHECK (json_valid(data)),
      message_id TEXT NOT NULL UNIQUE,
      entry_id INTEGER REFERENCES history_entries (id),
      created_at TEXT NOT NULL CHECK (${isTime("created_at")}),
      attempts INTEGER NOT NULL DEFAULT 0,
      next_attempt_at TEXT NOT NULL CHECK (${isTime("next_attempt_at")}),
      leased_until TEXT CHECK (leased_until IS NULL OR ${isTime("leased_until")}),
      sent_at TEXT CHECK (sent_at IS NULL OR ${isTime("sent_at")}),
      failed_at TEXT CHECK (failed_at IS NULL OR ${isTime("failed_at")}),
      last_problem TEXT,
      CHECK (sent_at IS NULL OR failed_at IS NULL)
    ) STRICT`,
    `CREATE INDEX outbox_messages_waiting ON outbox_messages (next_attempt_at)
      WHERE sent_at IS NULL AND failed_at IS NULL`,
    refuseDelete("outbox_messages"),
    `CREATE TABLE sessions (
      id TEXT PRIMARY KEY,
      user_id INTEGER NOT NULL REFERENCES users (id),
      started_at TEXT NOT NULL CHECK (${isTime("started_at")}),
      ended_at TEXT CHECK (ended_at IS NULL OR ${isTime("ended_at")})
    ) STRICT`,
    `CREATE TABLE idempotency_keys (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      user_id INTEGER NOT NULL REFERENCES users (id),
      act TEXT NOT NULL,
      key TEXT NOT NULL,
      result TEXT NOT NULL CHECK (json_valid(result)),
      made_at TEXT NOT NULL CHECK (${isTime("made_at")}),
      UNIQUE (user_id, act, key)
    ) STRICT`,
  ],
};
