import { appendOnly, type Migration } from "./migration";

/** Why another reviewer was named, and to whom a remark is addressed. */
export const namedAndAddressed: Migration = {
  name: "0009-named-and-addressed",
  statements: [
    "ALTER TABLE assignments ADD COLUMN reason TEXT",
    `CREATE TRIGGER assignments_fixed_reason BEFORE UPDATE ON assignments WHEN OLD.reason IS NOT NEW.reason
      BEGIN SELECT RAISE(ABORT, 'assignments: reason never changes'); END`,
    `CREATE TABLE comment_addressees (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      comment_id INTEGER NOT NULL REFERENCES comments (id),
      user_id INTEGER NOT NULL REFERENCES users (id),
      UNIQUE (comment_id, user_id)
    ) STRICT`,
    ...appendOnly("comment_addressees"),
  ],
};
