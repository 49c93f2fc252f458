import { appendOnly, isHash, type Migration } from "./migration";

/** The budget sheet of an issue at an operating point, as the bytes that answer for it. An issue never changes. */
export const issueSheets: Migration = {
  name: "0025-issue-sheets",
  statements: [
    `CREATE TABLE issue_sheets (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      product_id INTEGER NOT NULL,
      issue INTEGER NOT NULL,
      operating_point TEXT NOT NULL,
      recipe INTEGER NOT NULL CHECK (recipe > 0),
      sha256 TEXT NOT NULL CHECK (${isHash("sha256")}),
      bytes BLOB NOT NULL,
      UNIQUE (product_id, issue, operating_point, recipe),
      FOREIGN KEY (product_id, issue) REFERENCES issues (product_id, number)
    ) STRICT`,
    ...appendOnly("issue_sheets"),
  ],
};
