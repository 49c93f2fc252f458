import {
  appendOnly,
  fixedColumns,
  isDay,
  isHash,
  isOneOf,
  isTime,
  refuseDelete,
  refuseInsert,
  type Migration,
} from "./migration";

const STATES = ["draft", "proposed", "returned", "approved", "disapproved", "withdrawn"];
const OPERATIONS = ["add", "revise", "retire", "reinstate"];

const LEGAL_MOVES = `(OLD.state = 'draft' AND NEW.state IN ('proposed', 'withdrawn'))
  OR (OLD.state = 'proposed' AND NEW.state IN ('approved', 'returned', 'disapproved', 'withdrawn'))
  OR (OLD.state = 'returned' AND NEW.state IN ('proposed', 'withdrawn'))`;

const PROPOSAL_ENDED =
  "(SELECT state FROM proposals WHERE id = NEW.proposal_id) IN ('approved', 'disapproved', 'withdrawn')";

export const proposals: Migration = {
  name: "0002-proposals",
  statements: [
    `CREATE TABLE proposals (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      number INTEGER CHECK (number > 0),
      title TEXT NOT NULL DEFAULT '',
      reason TEXT NOT NULL DEFAULT '',
      evidence TEXT NOT NULL DEFAULT '[]' CHECK (json_valid(evidence)),
      needed_by TEXT CHECK (needed_by IS NULL OR ${isDay("needed_by")}),
      state TEXT NOT NULL DEFAULT 'draft' CHECK (${isOneOf("state", STATES)}),
      round INTEGER NOT NULL DEFAULT 0 CHECK (round >= 0),
      base_issue INTEGER NOT NULL CHECK (base_issue > 0),
      proposer_id INTEGER NOT NULL REFERENCES users (id),
      lock_version INTEGER NOT NULL DEFAULT 0,
      created_at TEXT NOT NULL CHECK (${isTime("created_at")}),
      ended_at TEXT CHECK (ended_at IS NULL OR ${isTime("ended_at")}),
      UNIQUE (product_id, number),
      CHECK (state IN ('draft', 'withdrawn') OR (number IS NOT NULL AND round > 0)),
      CHECK ((state IN ('approved', 'disapproved', 'withdrawn')) = (ended_at IS NOT NULL))
    ) STRICT`,
    fixedColumns("proposals", ["id", "product_id", "proposer_id", "created_at"]),
    `CREATE TRIGGER proposals_start_as_drafts BEFORE INSERT ON proposals WHEN NEW.state <> 'draft' OR NEW.round <> 0
      BEGIN SELECT RAISE(ABORT, 'proposals: each starts as a draft'); END`,
    `CREATE TRIGGER proposals_number_stays BEFORE UPDATE ON proposals
      WHEN OLD.number IS NOT NULL AND NEW.number IS NOT OLD.number
      BEGIN SELECT RAISE(ABORT, 'proposals: a number once given stays'); END`,
    `CREATE TRIGGER proposals_end_is_end BEFORE UPDATE ON proposals
      WHEN OLD.state IN ('approved', 'disapproved', 'withdrawn')
      BEGIN SELECT RAISE(ABORT, 'proposals: an end state never changes'); END`,
    `CREATE TRIGGER proposals_legal_moves BEFORE UPDATE ON proposals
      WHEN NEW.state <> OLD.state AND NOT (${LEGAL_MOVES})
      BEGIN SELECT RAISE(ABORT, 'proposals: this move is not listed'); END`,
    refuseDelete("proposals"),
    `CREATE TABLE proposal_edits (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      position INTEGER NOT NULL,
      line_id INTEGER NOT NULL REFERENCES lines (id),
      operation TEXT NOT NULL CHECK (${isOneOf("operation", OPERATIONS)}),
      base_letter TEXT,
      body TEXT CHECK (body IS NULL OR json_valid(body)),
      UNIQUE (proposal_id, line_id),
      CHECK ((operation = 'add') = (base_letter IS NULL))
    ) STRICT`,
    "CREATE INDEX proposal_edits_of_line ON proposal_edits (line_id)",
    refuseInsert("proposal_edits", "open", PROPOSAL_ENDED, "proposal_edits: the proposal has ended"),
    `CREATE TABLE proposal_transfers (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      position INTEGER NOT NULL,
      body TEXT NOT NULL CHECK (json_valid(body)),
      UNIQUE (proposal_id, position)
    ) STRICT`,
    refuseInsert("proposal_transfers", "open", PROPOSAL_ENDED, "proposal_transfers: the proposal has ended"),
    `CREATE TABLE proposal_coeditors (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      user_id INTEGER NOT NULL REFERENCES users (id),
      named_by_id INTEGER NOT NULL REFERENCES users (id),
      named_at TEXT NOT NULL CHECK (${isTime("named_at")}),
      ended_at TEXT CHECK (ended_at IS NULL OR ${isTime("ended_at")})
    ) STRICT`,
    "CREATE UNIQUE INDEX proposal_coeditors_in_force ON proposal_coeditors (proposal_id, user_id) WHERE ended_at IS NULL",
    fixedColumns("proposal_coeditors", ["id", "proposal_id", "user_id", "named_by_id", "named_at"]),
    refuseDelete("proposal_coeditors"),
    `CREATE TABLE proposal_editors (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      user_id INTEGER NOT NULL REFERENCES users (id),
      first_edit_at TEXT NOT NULL CHECK (${isTime("first_edit_at")}),
      last_edit_at TEXT NOT NULL CHECK (${isTime("last_edit_at")} AND last_edit_at >= first_edit_at),
      UNIQUE (proposal_id, user_id)
    ) STRICT`,
    fixedColumns("proposal_editors", ["id", "proposal_id", "user_id", "first_edit_at"]),
    refuseDelete("proposal_editors"),
    `CREATE TABLE assignments (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      capacity TEXT NOT NULL CHECK (${isOneOf("capacity", ["reviewer", "program_manager"])}),
      user_id INTEGER NOT NULL REFERENCES users (id),
      named_by_id INTEGER NOT NULL REFERENCES users (id),
      named_at TEXT NOT NULL CHECK (${isTime("named_at")}),
      ended_at TEXT CHECK (ended_at IS NULL OR ${isTime("ended_at")})
    ) STRICT`,
    "CREATE UNIQUE INDEX assignments_in_force ON assignments (proposal_id, capacity) WHERE ended_at IS NULL",
    fixedColumns("assignments", ["id", "proposal_id", "capacity", "user_id", "named_by_id", "named_at"]),
    refuseDelete("assignments"),
    `CREATE TABLE rounds (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      number INTEGER NOT NULL,
      base_issue INTEGER NOT NULL CHECK (base_issue > 0),
      title TEXT NOT NULL,
      reason TEXT NOT NULL,
      evidence TEXT NOT NULL CHECK (json_valid(evidence)),
      needed_by TEXT CHECK (needed_by IS NULL OR ${isDay("needed_by")}),
      rules TEXT NOT NULL CHECK (json_valid(rules)),
      canonical_text TEXT NOT NULL,
      hash TEXT NOT NULL CHECK (${isHash("hash")}),
      submitted_by_id INTEGER NOT NULL REFERENCES users (id),
      submitted_as TEXT CHECK (submitted_as IS NULL OR submitted_as = 'program_manager'),
      submitted_at TEXT NOT NULL CHECK (${isTime("submitted_at")}),
      UNIQUE (proposal_id, number)
    ) STRICT`,
    refuseInsert(
      "rounds",
      "without_gap",
      "NEW.number <> 1 + (SELECT coalesce(max(number), 0) FROM rounds WHERE proposal_id = NEW.proposal_id)",
      "rounds: numbers are 1, 2, 3 without a gap",
    ),
    refuseInsert("rounds", "open", PROPOSAL_ENDED, "rounds: the proposal has ended"),
    ...appendOnly("rounds"),
    `CREATE TABLE round_edits (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      round_id INTEGER NOT NULL REFERENCES rounds (id),
      position INTEGER NOT NULL,
      line_id INTEGER NOT NULL REFERENCES lines (id),
      operation TEXT NOT NULL CHECK (${isOneOf("operation", OPERATIONS)}),
      base_letter TEXT,
      body TEXT CHECK (body IS NULL OR json_valid(body)),
      UNIQUE (round_id, line_id),
      CHECK ((operation = 'add') = (base_letter IS NULL)),
      CHECK (body IS NOT NULL OR operation IN ('retire', 'reinstate'))
    ) STRICT`,
    ...appendOnly("round_edits"),
    `CREATE TABLE round_transfers (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      round_id INTEGER NOT NULL REFERENCES rounds (id),
      position INTEGER NOT NULL,
      body TEXT NOT NULL CHECK (json_valid(body)),
      UNIQUE (round_id, position)
    ) STRICT`,
    ...appendOnly("round_transfers"),
  ],
};
