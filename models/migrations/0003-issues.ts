import { appendOnly, fixedColumns, isHash, isTime, refuseDelete, refuseInsert, type Migration } from "./migration";

// Letters of ASME Y14.35: no I, O, Q, S, X, Z. The first issue is "–"; after Y come AA … YY.
const LETTERS = "ABCDEFGHJKLMNPRTUVWY";
const NEXT_LETTER = `(SELECT CASE
    WHEN n = 0 THEN '–'
    WHEN n <= 20 THEN substr('${LETTERS}', n, 1)
    ELSE substr('${LETTERS}', (n - 1) / 20, 1) || substr('${LETTERS}', (n - 1) % 20 + 1, 1)
  END FROM (SELECT count(*) AS n FROM line_revisions WHERE line_id = NEW.line_id))`;

const NEWEST_ISSUE = "(SELECT coalesce(max(number), 0) FROM issues WHERE product_id = NEW.product_id)";

export const issues: Migration = {
  name: "0003-issues",
  statements: [
    `CREATE TABLE issues (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      number INTEGER NOT NULL,
      proposal_id INTEGER UNIQUE REFERENCES proposals (id),
      made_at TEXT NOT NULL CHECK (${isTime("made_at")}),
      totals TEXT NOT NULL CHECK (json_valid(totals)),
      uncertainty TEXT CHECK (uncertainty IS NULL OR json_valid(uncertainty)),
      content_hash TEXT NOT NULL CHECK (${isHash("content_hash")}),
      chain_sequence INTEGER NOT NULL,
      chain_hash TEXT NOT NULL CHECK (${isHash("chain_hash")}),
      UNIQUE (product_id, number),
      CHECK ((number = 1) = (proposal_id IS NULL))
    ) STRICT`,
    refuseInsert(
      "issues",
      "without_gap",
      `NEW.number <> 1 + ${NEWEST_ISSUE}`,
      "issues: numbers are 1, 2, 3 without a gap",
    ),
    refuseInsert(
      "issues",
      "later",
      "NEW.made_at <= (SELECT max(made_at) FROM issues WHERE product_id = NEW.product_id)",
      "issues: each is later than the one before",
    ),
    refuseInsert(
      "issues",
      "of_a_proposal",
      `NEW.proposal_id IS NOT NULL AND NOT EXISTS (SELECT 1 FROM proposals
        WHERE id = NEW.proposal_id AND product_id = NEW.product_id AND state = 'proposed')`,
      "issues: made by a proposal that stands before its last signature",
    ),
    ...appendOnly("issues"),
    `CREATE TRIGGER proposals_approved_by_issue BEFORE UPDATE ON proposals
      WHEN NEW.state = 'approved' AND NOT EXISTS (SELECT 1 FROM issues WHERE proposal_id = NEW.id)
      BEGIN SELECT RAISE(ABORT, 'proposals: an approved one has made an issue'); END`,
    `CREATE TABLE line_revisions (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL,
      line_id INTEGER NOT NULL,
      letter TEXT NOT NULL,
      issue INTEGER NOT NULL,
      retired INTEGER NOT NULL DEFAULT 0 CHECK (retired IN (0, 1)),
      body TEXT NOT NULL CHECK (json_valid(body)),
      hash TEXT NOT NULL CHECK (${isHash("hash")}),
      proposal_id INTEGER REFERENCES proposals (id),
      UNIQUE (line_id, letter),
      UNIQUE (line_id, issue),
      FOREIGN KEY (line_id, product_id) REFERENCES lines (id, product_id),
      FOREIGN KEY (product_id, issue) REFERENCES issues (product_id, number)
    ) STRICT`,
    "CREATE INDEX line_revisions_of_issue ON line_revisions (product_id, issue)",
    refuseInsert(
      "line_revisions",
      "newest_issue",
      `NEW.issue <> ${NEWEST_ISSUE}`,
      "line_revisions: written with the newest issue only",
    ),
    refuseInsert(
      "line_revisions",
      "letters",
      `NEW.letter IS NOT ${NEXT_LETTER}`,
      "line_revisions: letters follow ASME Y14.35 without a gap",
    ),
    ...appendOnly("line_revisions"),
    `CREATE TABLE results (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL,
      item_id INTEGER NOT NULL,
      operating_point_id INTEGER NOT NULL,
      issue INTEGER NOT NULL,
      method_version INTEGER NOT NULL,
      basic REAL NOT NULL,
      growth_fraction REAL NOT NULL,
      growth REAL NOT NULL,
      predicted REAL NOT NULL,
      notes TEXT NOT NULL CHECK (json_valid(notes)),
      answer TEXT NOT NULL CHECK (json_valid(answer)),
      UNIQUE (item_id, operating_point_id, issue),
      FOREIGN KEY (item_id, product_id) REFERENCES lines (id, product_id),
      FOREIGN KEY (operating_point_id, product_id) REFERENCES lines (id, product_id),
      FOREIGN KEY (product_id, issue) REFERENCES issues (product_id, number)
    ) STRICT`,
    "CREATE INDEX results_of_issue ON results (product_id, issue)",
    refuseInsert(
      "results",
      "newest_issue",
      `NEW.issue <> ${NEWEST_ISSUE}`,
      "results: written with the newest issue only",
    ),
    ...appendOnly("results"),
    `CREATE TABLE baselines (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL,
      issue INTEGER NOT NULL,
      name TEXT NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      purpose TEXT NOT NULL,
      signer_id INTEGER NOT NULL REFERENCES users (id),
      made_at TEXT NOT NULL CHECK (${isTime("made_at")}),
      UNIQUE (product_id, name),
      FOREIGN KEY (product_id, issue) REFERENCES issues (product_id, number)
    ) STRICT`,
    ...appendOnly("baselines"),
    `CREATE TABLE attachments (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      owner_type TEXT NOT NULL,
      owner_id INTEGER NOT NULL,
      name TEXT NOT NULL,
      media_type TEXT NOT NULL,
      size INTEGER NOT NULL CHECK (size >= 0),
      sha256 TEXT NOT NULL CHECK (${isHash("sha256")}),
      added_by_id INTEGER NOT NULL REFERENCES users (id),
      added_at TEXT NOT NULL CHECK (${isTime("added_at")}),
      voided_by_id INTEGER REFERENCES users (id),
      voided_at TEXT CHECK (voided_at IS NULL OR ${isTime("voided_at")}),
      void_reason TEXT,
      CHECK ((voided_at IS NULL) = (voided_by_id IS NULL) AND (voided_at IS NULL) = (void_reason IS NULL))
    ) STRICT`,
    fixedColumns("attachments", [
      "id",
      "product_id",
      "owner_type",
      "owner_id",
      "name",
      "media_type",
      "size",
      "sha256",
      "added_by_id",
      "added_at",
    ]),
    `CREATE TRIGGER attachments_void_once BEFORE UPDATE ON attachments WHEN OLD.voided_at IS NOT NULL
      BEGIN SELECT RAISE(ABORT, 'attachments: voided once'); END`,
    refuseDelete("attachments"),
  ],
};
