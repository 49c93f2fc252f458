import type { Migration } from "./migration";

/** Who changed which field of a draft's edit, and when: JSON by field. Drafts are no acts, so no history tells it. */
export const touchedFields: Migration = {
  name: "0009-touched-fields",
  statements: ["ALTER TABLE proposal_edits ADD COLUMN touched TEXT NOT NULL DEFAULT '{}' CHECK (json_valid(touched))"],
};
