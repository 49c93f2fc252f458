import { appendOnly, isHash, isOneOf, isTime, refuseInsert, type Migration } from "./migration";

const OPEN_ROUND = `(SELECT p.state = 'proposed' AND p.round = r.number
  FROM rounds r JOIN proposals p ON p.id = r.proposal_id WHERE r.id = NEW.round_id)`;

function tookPart(person: string): string {
  return `EXISTS (SELECT 1 FROM rounds r JOIN proposals p ON p.id = r.proposal_id
    LEFT JOIN proposal_editors e ON e.proposal_id = p.id
    WHERE r.id = NEW.round_id AND (p.proposer_id = ${person} OR e.user_id = ${person}))`;
}

/** An approval on the round that was not taken back and of which the condition holds. */
function standingApproval(condition: string): string {
  return `EXISTS (SELECT 1 FROM signatures s WHERE s.round_id = NEW.round_id AND s.decision = 'approve' AND (${condition})
    AND NOT EXISTS (SELECT 1 FROM signatures t WHERE t.takes_back_id = s.id))`;
}

/** A round asks for one program manager at most, and for as many reviewers as the rules it keeps. */
const CAPACITY_FILLED = `(SELECT count(*) FROM signatures s
    WHERE s.round_id = NEW.round_id AND s.decision = 'approve' AND s.capacity = NEW.capacity
      AND NOT EXISTS (SELECT 1 FROM signatures t WHERE t.takes_back_id = s.id))
  >= CASE NEW.capacity WHEN 'program_manager' THEN 1
    ELSE coalesce((SELECT json_extract(rules, '$.reviewers') FROM rounds WHERE id = NEW.round_id), 1) END`;

export const signaturesAndRemarks: Migration = {
  name: "0004-signatures-and-remarks",
  statements: [
    `CREATE TABLE signatures (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL REFERENCES products (id),
      sequence INTEGER NOT NULL,
      subject_type TEXT NOT NULL CHECK (${isOneOf("subject_type", ["round", "establishment", "baseline"])}),
      round_id INTEGER REFERENCES rounds (id),
      baseline_id INTEGER UNIQUE REFERENCES baselines (id),
      signer_id INTEGER NOT NULL REFERENCES users (id),
      printed_name TEXT NOT NULL,
      capacity TEXT NOT NULL CHECK (${isOneOf("capacity", ["reviewer", "program_manager"])}),
      deputy_for_id INTEGER REFERENCES users (id),
      deputy_for_name TEXT,
      decision TEXT NOT NULL CHECK (${isOneOf("decision", ["approve", "return", "disapprove", "take_back"])}),
      takes_back_id INTEGER UNIQUE REFERENCES signatures (id),
      meaning TEXT CHECK (decision <> 'approve' OR coalesce(length(meaning), 0) > 0),
      reason TEXT,
      canonical_text TEXT NOT NULL,
      hash TEXT NOT NULL CHECK (${isHash("hash")}),
      signed_at TEXT NOT NULL CHECK (${isTime("signed_at")}),
      UNIQUE (product_id, sequence),
      CHECK ((subject_type = 'round') = (round_id IS NOT NULL)),
      CHECK ((subject_type = 'baseline') = (baseline_id IS NOT NULL)),
      CHECK (subject_type = 'round' OR (decision = 'approve' AND capacity = 'program_manager')),
      CHECK ((decision = 'take_back') = (takes_back_id IS NOT NULL)),
      CHECK ((deputy_for_id IS NULL) = (deputy_for_name IS NULL) AND deputy_for_id IS NOT signer_id),
      CHECK (decision <> 'disapprove' OR capacity = 'program_manager'),
      CHECK (decision = 'approve' OR coalesce(length(reason), 0) > 0)
    ) STRICT`,
    "CREATE INDEX signatures_of_round ON signatures (round_id)",
    "CREATE UNIQUE INDEX signatures_established_once ON signatures (product_id) WHERE subject_type = 'establishment'",
    refuseInsert(
      "signatures",
      "sequence",
      "NEW.sequence <> 1 + (SELECT coalesce(max(sequence), 0) FROM signatures WHERE product_id = NEW.product_id)",
      "signatures: the sequence has no gap",
    ),
    refuseInsert(
      "signatures",
      "independent",
      `NEW.round_id IS NOT NULL AND (${tookPart("NEW.signer_id")} OR ${tookPart("NEW.deputy_for_id")})`,
      "signatures: nobody signs what they proposed or edited, as themselves or as deputy",
    ),
    refuseInsert(
      "signatures",
      "open_round",
      `NEW.round_id IS NOT NULL AND ${OPEN_ROUND} IS NOT 1`,
      "signatures: the round is not open to signers",
    ),
    refuseInsert(
      "signatures",
      "one_capacity",
      `NEW.round_id IS NOT NULL AND NEW.decision = 'approve' AND ${standingApproval("s.signer_id = NEW.signer_id")}`,
      "signatures: one person signs a round in one capacity",
    ),
    refuseInsert(
      "signatures",
      "capacity_free",
      `NEW.round_id IS NOT NULL AND NEW.decision = 'approve' AND ${CAPACITY_FILLED}`,
      "signatures: this capacity has been signed",
    ),
    refuseInsert(
      "signatures",
      "nothing_unsettled",
      `NEW.round_id IS NOT NULL AND NEW.decision = 'approve' AND EXISTS (SELECT 1 FROM comments c
        JOIN rounds r ON r.proposal_id = c.proposal_id
        WHERE r.id = NEW.round_id AND c.asks_action = 1 AND c.settled_at IS NULL)`,
      "signatures: a remark that asks for action is not settled",
    ),
    refuseInsert(
      "signatures",
      "take_back_own",
      `NEW.decision = 'take_back' AND NOT ${standingApproval("s.id = NEW.takes_back_id AND s.signer_id = NEW.signer_id")}`,
      "signatures: only an own approval that stands can be taken back",
    ),
    ...appendOnly("signatures"),
    `CREATE TABLE objections (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      round_id INTEGER NOT NULL REFERENCES rounds (id),
      author_id INTEGER NOT NULL REFERENCES users (id),
      printed_name TEXT NOT NULL,
      reason TEXT NOT NULL CHECK (length(reason) > 0),
      raised_at TEXT NOT NULL CHECK (${isTime("raised_at")})
    ) STRICT`,
    ...appendOnly("objections"),
    `CREATE TABLE comments (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      proposal_id INTEGER NOT NULL REFERENCES proposals (id),
      round_id INTEGER REFERENCES rounds (id),
      number INTEGER,
      parent_id INTEGER REFERENCES comments (id),
      line_id INTEGER REFERENCES lines (id),
      field TEXT,
      author_id INTEGER NOT NULL REFERENCES users (id),
      printed_name TEXT NOT NULL,
      body TEXT NOT NULL CHECK (length(body) > 0),
      suggestion TEXT,
      asks_action INTEGER NOT NULL DEFAULT 0 CHECK (asks_action IN (0, 1)),
      written_at TEXT NOT NULL CHECK (${isTime("written_at")}),
      settled_by_id INTEGER REFERENCES users (id),
      settled_by_name TEXT,
      settled_at TEXT CHECK (settled_at IS NULL OR ${isTime("settled_at")}),
      settled_reason TEXT,
      UNIQUE (proposal_id, number),
      CHECK ((parent_id IS NULL) = (number IS NOT NULL)),
      CHECK (parent_id IS NULL OR asks_action = 0),
      CHECK (field IS NULL OR line_id IS NOT NULL),
      CHECK ((settled_at IS NULL) = (settled_by_id IS NULL) AND (settled_at IS NULL) = (settled_by_name IS NULL)
        AND (settled_at IS NULL) = (settled_reason IS NULL)),
      CHECK (settled_at IS NULL OR asks_action = 1)
    ) STRICT`,
    "CREATE INDEX comments_of_proposal ON comments (proposal_id)",
    refuseInsert(
      "comments",
      "numbered",
      `NEW.parent_id IS NULL AND NEW.number IS NOT 1 + (SELECT coalesce(max(number), 0) FROM comments
        WHERE proposal_id = NEW.proposal_id)`,
      "comments: remarks are numbered 1, 2, 3 in their proposal",
    ),
    refuseInsert(
      "comments",
      "same_thread",
      `NEW.parent_id IS NOT NULL AND NOT EXISTS (SELECT 1 FROM comments
        WHERE id = NEW.parent_id AND proposal_id = NEW.proposal_id AND parent_id IS NULL)`,
      "comments: an answer hangs on a remark of the same proposal",
    ),
    refuseInsert(
      "comments",
      "unsettled_first",
      "NEW.settled_at IS NOT NULL",
      "comments: settled later, not when written",
    ),
    `CREATE TRIGGER comments_only_settled BEFORE UPDATE ON comments WHEN OLD.settled_at IS NOT NULL OR
      OLD.id IS NOT NEW.id OR OLD.proposal_id IS NOT NEW.proposal_id OR OLD.round_id IS NOT NEW.round_id
      OR OLD.number IS NOT NEW.number OR OLD.parent_id IS NOT NEW.parent_id OR OLD.line_id IS NOT NEW.line_id
      OR OLD.field IS NOT NEW.field OR OLD.author_id IS NOT NEW.author_id OR OLD.printed_name IS NOT NEW.printed_name
      OR OLD.body IS NOT NEW.body OR OLD.suggestion IS NOT NEW.suggestion OR OLD.asks_action IS NOT NEW.asks_action
      OR OLD.written_at IS NOT NEW.written_at
      BEGIN SELECT RAISE(ABORT, 'comments: the text never changes, and a remark is settled once'); END`,
    `CREATE TRIGGER comments_never_deleted BEFORE DELETE ON comments
      BEGIN SELECT RAISE(ABORT, 'comments: a row is never deleted'); END`,
    `CREATE TABLE lookings (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      user_id INTEGER NOT NULL REFERENCES users (id),
      kind TEXT NOT NULL,
      subject TEXT NOT NULL,
      first_at TEXT NOT NULL CHECK (${isTime("first_at")}),
      last_at TEXT NOT NULL CHECK (${isTime("last_at")}),
      UNIQUE (user_id, kind, subject)
    ) STRICT`,
  ],
};
