import { fixedColumns, isDay, isOneOf, refuseInsert, type Migration } from "./migration";

/** Files get the date of their source, and one of two places in a proposal. */
export const datedFiles: Migration = {
  name: "0008-dated-files",
  statements: [
    `ALTER TABLE attachments ADD COLUMN source_date TEXT CHECK (source_date IS NULL OR ${isDay("source_date")})`,
    refuseInsert("attachments", "dated", "NEW.source_date IS NULL", "attachments: a file has the date of its source"),
    refuseInsert(
      "attachments",
      "placed",
      `NOT (${isOneOf("NEW.owner_type", ["working_copy", "proposal"])}) OR NEW.product_id IS NOT
        (SELECT product_id FROM proposals WHERE id = NEW.owner_id)`,
      "attachments: a file comes by a proposal of its product",
    ),
    "CREATE UNIQUE INDEX attachments_once ON attachments (owner_type, owner_id, sha256)",
    "CREATE INDEX attachments_by_content ON attachments (sha256)",
    "DROP TRIGGER attachments_fixed_columns",
    fixedColumns("attachments", [
      "id",
      "product_id",
      "owner_type",
      "owner_id",
      "name",
      "media_type",
      "size",
      "sha256",
      "source_date",
      "added_by_id",
      "added_at",
    ]),
  ],
};
