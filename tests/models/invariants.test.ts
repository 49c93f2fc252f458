import { beforeEach, describe, expect, it } from "vitest";
import { database, inTransaction } from "@/models/database";
import { addItem, approve, bluffItem, establish, fixedItem, shareItem } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import { revisionLetters } from "@/tests/support/invariants/numbering";
import { person, product, withRole } from "@/tests/support/people";

withDatabase();

/** A budget of four issues: items in an allocated group, a transfer, a revision, a retired item. */
beforeEach(async () => {
  await product("TF-2");
  const tansy = await withRole(await person("Tansy Merle"), "TF-2", "component_owner");
  const ines = await withRole(await person("Ines Maat"), "TF-2", "reviewer");
  const lusia = await withRole(await person("Lusia Brand"), "TF-2", "program_manager");
  const fenno = await withRole(await person("Fenno Vries"), "TF-2", "program_manager");
  await establish(lusia, "TF-2", "2026-03-01T09:00:00.000Z");
  const both = [[ines, "reviewer"] as const, [lusia, "program_manager"] as const];
  const group = { operation: "add", kind: "group", number: "G10", baseLetter: null } as const;
  const first = fixedItem(tansy.userId, 4, { group: "G10" });
  await approve("TF-2", "2026-03-02T09:00:00.000Z", {
    proposer: fenno,
    signers: both,
    edits: [
      { ...group, body: { name: "Cab", parent: null, order: 1 } },
      addItem("010", first),
      addItem("020", bluffItem(tansy.userId, 0.5, 0.2, { group: "G10", order: 20 })),
      addItem("030", shareItem(tansy.userId, 0.1, ["020"], { order: 30 })),
    ],
    transfers: [
      { giver: { kind: "unallocated", number: null }, receiver: { kind: "group", number: "G10" }, hundredths: 5000 },
      { giver: { kind: "group", number: "G10" }, receiver: { kind: "item", number: "010" }, hundredths: 600 },
    ],
  });
  await approve("TF-2", "2026-03-03T09:00:00.000Z", {
    proposer: tansy,
    signers: [[ines, "reviewer"]],
    edits: [
      {
        operation: "revise",
        kind: "item",
        number: "020",
        baseLetter: "–",
        body: bluffItem(tansy.userId, 0.4, 0.2, { group: "G10", order: 20 }),
      },
    ],
  });
  await approve("TF-2", "2026-03-04T09:00:00.000Z", {
    proposer: tansy,
    signers: both,
    edits: [{ operation: "retire", kind: "item", number: "010", baseLetter: "–", body: null }],
  });
});

/** Writes behind the product's back: the guards of the tables are taken off first. */
function forge(statement: string): Promise<void> {
  return inTransaction(async (tx) => {
    const [triggers] = await database.query(
      "SELECT name FROM sqlite_master WHERE type = 'trigger' AND name <> 'proposals_end_is_end'",
      { transaction: tx },
    );
    for (const trigger of triggers) {
      if (typeof trigger === "object" && trigger !== null && "name" in trigger) {
        await database.query(`DROP TRIGGER ${String(trigger.name)}`, { transaction: tx });
      }
    }
    for (const each of statement.split(";\n")) await database.query(each, { transaction: tx });
  });
}

const BODY = (kind: string) =>
  `id = (SELECT max(r.id) FROM line_revisions r JOIN lines l ON l.id = r.line_id WHERE l.kind = '${kind}')`;

/** One forgery per invariant, and what has to be found. */
const FORGERIES: [string, string, RegExp][] = [
  [
    "a number that is skipped",
    `INSERT INTO proposals (id, product_id, base_issue, proposer_id, created_at)
      VALUES (9, 1, 4, 1, '2026-03-05T08:00:00.000Z');
    INSERT INTO issues (product_id, number, proposal_id, made_at, totals, content_hash, chain_sequence, chain_hash)
      SELECT product_id, 6, 9, '2026-03-05T09:00:00.000Z', totals, content_hash, chain_sequence, chain_hash
      FROM issues WHERE number = 4`,
    /^1: TF-2 has issue 6 in place 5/,
  ],
  [
    "an issue of a proposal that was not approved",
    "DROP TRIGGER proposals_end_is_end;\nUPDATE proposals SET state = 'disapproved' WHERE number = 3",
    /^1: TF-2 issue 4 has a proposal in state disapproved/,
  ],
  [
    "a letter that is skipped",
    `UPDATE line_revisions SET letter = 'B' WHERE letter = 'A'
      AND line_id = (SELECT id FROM lines WHERE kind = 'item' AND number = '020')`,
    /^2: TF-2 item 020 has B where A is due/,
  ],
  [
    "a signature of the proposer",
    "UPDATE signatures SET signer_id = (SELECT proposer_id FROM proposals WHERE number = 2) WHERE id = 3",
    /^3: signature 3 is by a person with a part/,
  ],
  [
    "a signature of an owner",
    "UPDATE signatures SET signer_id = (SELECT id FROM users WHERE name = 'Tansy Merle') WHERE id = 1",
    /^3: signature 1 is by a person with a part/,
  ],
  [
    "a link that does not fit",
    `UPDATE history_entries SET previous_hash = '${"a".repeat(64)}' WHERE id = 3`,
    /^4: entry/,
  ],
  [
    "an edit after the end",
    "UPDATE proposal_editors SET last_edit_at = '2027-01-01T00:00:00.000Z' WHERE id = 1",
    /^5: proposal 1 has a edit that is younger/,
  ],
  ["no guard of end states", "DROP TRIGGER proposals_end_is_end", /^5: nothing keeps a proposal/],
  [
    "an allocation from nowhere",
    `UPDATE line_revisions SET body = json_set(body, '$.unallocatedHundredths', 1) WHERE ${BODY("allocations")}`,
    /^6: TF-2 issue 4: allocations, unallocated and reserve make/,
  ],
  [
    "a ceiling that is passed",
    `UPDATE line_revisions SET body = json_insert(body, '$.rows[#]',
      json('{"kind":"item","number":"020","hundredths":5100}')) WHERE ${BODY("allocations")}`,
    /^6: TF-2 issue 4: the members of group G10 hold more/,
  ],
  [
    "an allocation of a retired item",
    `UPDATE line_revisions SET body = json_insert(body, '$.rows[#]',
      json('{"kind":"item","number":"010","hundredths":0}')) WHERE ${BODY("allocations")}`,
    /^6: TF-2 issue 4: item 010 is not in force/,
  ],
  [
    "a missing program manager",
    "DELETE FROM signatures WHERE id = 2",
    /^7: proposal 1 lacks a program manager: it touches/,
  ],
  ["a missing reviewer", "DELETE FROM signatures WHERE id = 3", /^7: proposal 2 lacks a reviewer/],
  [
    "an unsettled request",
    `INSERT INTO comments (proposal_id, number, author_id, printed_name, body, asks_action, written_at)
      VALUES (1, 1, 1, 'X', 'Do it', 1, '2026-03-02T08:00:00.000Z')`,
    /^7: proposal 1 was approved with an unsettled request/,
  ],
  [
    "a result that is not what its formula gives",
    "UPDATE results SET predicted = predicted + 1e-8 WHERE issue = 3",
    /^8: product 1 issue 3, 020 at OP-1: predicted/,
  ],
  ["an act that is not in the history", "DELETE FROM history_entries WHERE id = 7", /^9: issue \d stands 0 times/],
  [
    "a message of no act",
    `INSERT INTO outbox_messages (key, to_user_id, template, data, message_id, created_at, next_attempt_at)
      VALUES ('k', 1, 't', '{}', 'm', '2026-03-02T08:00:00.000Z', '2026-03-02T08:00:00.000Z')`,
    /^9: message 1 belongs to no act/,
  ],
];

describe("the nine invariants", () => {
  it("hold for a budget with groups, transfers, followers and a retired item", async () => {
    expect(await invariantFaults()).toEqual([]);
  });

  it.each(FORGERIES)("find %s", async (_name, statement, sentence) => {
    await forge(statement);
    expect(await invariantFaults()).toEqual(expect.arrayContaining([expect.stringMatching(sentence)]));
  });
});

it("counts revision letters as ASME Y14.35 does", () => {
  const letters = revisionLetters(421);
  // "–", 20 letters, then AA … YY.
  expect(letters.slice(0, 3)).toEqual(["–", "A", "B"]);
  expect(letters.slice(19, 23)).toEqual(["W", "Y", "AA", "AB"]);
  expect(letters[420]).toBe("YY");
});
