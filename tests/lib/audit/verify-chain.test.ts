import { beforeEach, describe, expect, it } from "vitest";
import { entryHash } from "@/lib/audit/entry-hash";
import { headOf } from "@/lib/audit/queries";
import { textHash } from "@/lib/audit/text-hash";
import { verifyChain } from "@/lib/audit/verify-chain";
import { performAct } from "@/lib/audit/perform-act";
import { Comment } from "@/models/comment";
import { HistoryEntry } from "@/models/history-entry";
import { withDatabase } from "@/tests/support/database";
import { forge } from "@/tests/support/forge";
import { CODE, recordedProduct, remark, sign, type RecordedProduct } from "@/tests/support/recorded-product";

withDatabase();

let product: RecordedProduct;

beforeEach(async () => {
  product = await recordedProduct();
  await sign(product);
  await remark(product);
});

async function faultCodes(): Promise<string[]> {
  return [...new Set((await verifyChain(CODE)).faults.map(({ code }) => code))].sort();
}

async function entry(sequence: number): Promise<HistoryEntry> {
  return HistoryEntry.findOne({ where: { chain: CODE, sequence }, rejectOnEmpty: true });
}

function quoted(text: string): string {
  return `'${text.replaceAll("'", "''")}'`;
}

function rewritten(sequence: number, text: string, hash: string): string {
  return `UPDATE history_entries SET reason = 'Other reason.', canonical_text = ${quoted(text)}, hash = '${hash}'
    WHERE chain = '${CODE}' AND sequence = ${sequence}`;
}

it("finds nothing in a history that nobody touched, and says how much it checked", async () => {
  const report = await verifyChain(CODE);

  expect(report.faults).toEqual([]);
  expect(report.entries).toBe(5);
  // One membership, one issue, one round, one signature, one remark.
  expect(report.records).toBe(5);
  expect(report.head).toEqual(await headOf(CODE));
});

it("finds nothing after a remark was settled by its act", async () => {
  await performAct(product.tom, product.clock, { act: "settle_remark", chain: CODE }, async (tx, record, at) => {
    const comment = await Comment.findOne({ rejectOnEmpty: true, transaction: tx });
    await comment.update(
      { settledById: product.tom.userId, settledByName: "Tom", settledAt: at, settledReason: "Answered." },
      { transaction: tx },
    );
    record({ act: "settle_remark", subject: { type: "remark", id: "1", label: "R1" } });
  });

  expect(await faultCodes()).toEqual([]);
});

describe("forgeries of entries", () => {
  it("finds an edited text", async () => {
    await forge(`UPDATE history_entries SET canonical_text = replace(canonical_text, 'Measured', 'Guessed')
      WHERE chain = '${CODE}' AND act = 'propose'`);
    expect(await faultCodes()).toEqual(["column", "hash"]);
  });

  it.each([
    ["at", "'2025-01-01T00:00:00.000Z'"],
    ["person_id", "2"],
    ["printed_name", "'Somebody else'"],
    ["capacity", "'program_manager'"],
    ["act", "'withdraw_proposal'"],
    ["subject_type", "'item'"],
    ["subject_id", "'99'"],
    ["subject_label", "'TF2-CP-99'"],
    ["was", "'1'"],
    ["now", "'2'"],
    ["reason", "'Other reason.'"],
    ["outcome", "'refused'"],
  ])("finds an edited column: %s", async (column, value) => {
    await forge(`UPDATE history_entries SET ${column} = ${value} WHERE chain = '${CODE}' AND act = 'propose'`);
    expect(await faultCodes()).toEqual(["column"]);
  });

  it("finds an entry cut out of the middle", async () => {
    await forge(`DELETE FROM history_entries WHERE chain = '${CODE}' AND sequence = 2`);
    expect(await faultCodes()).toEqual(expect.arrayContaining(["gap", "link", "cut", "unbound"]));
  });

  it("finds an entry cut out of the middle though the rest was renumbered", async () => {
    await forge(
      `DELETE FROM history_entries WHERE chain = '${CODE}' AND sequence = 2`,
      `UPDATE history_entries SET sequence = sequence - 1 WHERE chain = '${CODE}' AND sequence > 2`,
    );
    expect(await faultCodes()).toEqual(expect.arrayContaining(["link", "column", "cut"]));
  });

  it("finds a cut at the end by the head that is kept apart", async () => {
    await forge(`DELETE FROM history_entries WHERE chain = '${CODE}' AND sequence = 5`);
    expect(await faultCodes()).toEqual(["cut", "head", "unbound"]);
  });

  it("finds a cut at the end though head, counter and the row it bound were cut too, by a head noted outside", async () => {
    const noted = await headOf(CODE);
    const last = await entry(4);
    await forge(
      `DELETE FROM history_entries WHERE chain = '${CODE}' AND sequence = 5`,
      `UPDATE chain_heads SET sequence = 4, hash = '${last.hash}' WHERE chain = '${CODE}'`,
      "UPDATE sqlite_sequence SET seq = 4 WHERE name = 'history_entries'",
      "DELETE FROM comments",
    );
    expect(await faultCodes()).toEqual([]);

    const report = await verifyChain(CODE, { knownHead: noted ?? { sequence: 0, hash: "" } });
    expect(report.faults.map(({ code }) => code)).toEqual(["known_head"]);
  });

  it("finds two entries swapped", async () => {
    await forge(
      `UPDATE history_entries SET sequence = -1 WHERE chain = '${CODE}' AND sequence = 2`,
      `UPDATE history_entries SET sequence = 2 WHERE chain = '${CODE}' AND sequence = 3`,
      `UPDATE history_entries SET sequence = 3 WHERE chain = '${CODE}' AND sequence = -1`,
    );
    expect(await faultCodes()).toEqual(expect.arrayContaining(["column", "link"]));
  });

  it("finds an entry rewritten with its own hash", async () => {
    const { canonicalText, previousHash } = await entry(3);
    const text = canonicalText.replace("Measured finish.", "Other reason.");
    await forge(rewritten(3, text, entryHash(previousHash, text)));
    expect(await faultCodes()).toEqual(["link"]);
  });

  it("finds an entry rewritten with its own hash and the next entry's link patched", async () => {
    const { canonicalText, previousHash } = await entry(3);
    const text = canonicalText.replace("Measured finish.", "Other reason.");
    const hash = entryHash(previousHash, text);
    await forge(
      rewritten(3, text, hash),
      `UPDATE history_entries SET previous_hash = '${hash}' WHERE chain = '${CODE}' AND sequence = 4`,
    );
    expect(await faultCodes()).toEqual(["hash"]);
  });

  it("finds an entry moved over from another chain", async () => {
    await forge(`UPDATE history_entries SET chain = 'house' WHERE chain = '${CODE}' AND sequence = 1`);
    expect((await verifyChain("house")).faults.map(({ code }) => code)).toEqual(expect.arrayContaining(["column"]));
    expect(await faultCodes()).toEqual(expect.arrayContaining(["gap", "link"]));
  });

  it("finds an issue whose head before the act was in a part of the chain written anew", async () => {
    await forge(`UPDATE issues SET chain_hash = '${"ab".repeat(32)}'`);
    expect(await faultCodes()).toEqual(["altered", "issue_head"]);
  });
});

describe("forgeries of what entries bind", () => {
  it.each([
    ["an altered result", "UPDATE results SET predicted = 60", ["content"]],
    ["altered notes of a result", `UPDATE results SET notes = '["none"]'`, ["content"]],
    ["a result slipped in", insertedResult(), ["content"]],
    ["a removed result", "DELETE FROM results", ["content"]],
    ["an altered body of a revision", "UPDATE line_revisions SET body = '{}'", ["text"]],
    ["a revision marked as retired", "UPDATE line_revisions SET retired = 1", ["text"]],
    ["a removed revision", "DELETE FROM line_revisions", ["content"]],
    ["altered totals", "UPDATE issues SET totals = '[]'", ["altered", "content"]],
    ["a removed issue", "DELETE FROM issues", ["removed"]],
    ["an altered text of a round", "UPDATE rounds SET canonical_text = 'other'", ["altered", "text"]],
    ["an altered edit of a round", `UPDATE round_edits SET body = '{"a":1}'`, ["altered"]],
    ["altered rules of a round", "UPDATE rounds SET rules = '{}'", ["altered"]],
    ["an altered text of a signature", "UPDATE signatures SET canonical_text = 'other'", ["altered", "text"]],
    ["another signer", "UPDATE signatures SET signer_id = 1, printed_name = 'Eva'", ["altered"]],
    ["another capacity", "UPDATE signatures SET capacity = 'program_manager'", ["altered"]],
    ["a removed signature", "DELETE FROM signatures", ["removed"]],
    ["an altered remark", "UPDATE comments SET body = 'Fine.'", ["altered"]],
    ["a remark that asks for nothing any more", "UPDATE comments SET asks_action = 0", ["altered"]],
    ["a removed remark", "DELETE FROM comments", ["removed"]],
    ["a remark settled by nobody's act", settled(), ["closing"]],
    ["a role given by nobody's act", givenRole(), ["unbound"]],
    ["a role ended by nobody's act", "UPDATE memberships SET until_at = '2026-12-01T09:00:00.000Z'", ["closing"]],
    ["another role", "UPDATE memberships SET role = 'program_manager'", ["altered"]],
  ])("finds %s", async (_, statement, codes) => {
    await forge(statement);
    expect(await faultCodes()).toEqual(codes);
  });

  it("finds a signature's text altered together with its hash", async () => {
    await forge(`UPDATE signatures SET canonical_text = 'other', hash = '${textHash("signature", "other")}'`);
    expect(await faultCodes()).toEqual(["altered"]);
  });

  it("finds a settlement written past the act while the triggers stand", async () => {
    const { inTransaction } = await import("@/models/database");
    await inTransaction(async (tx) => {
      const comment = await Comment.findOne({ rejectOnEmpty: true, transaction: tx });
      await comment.update(
        { settledById: 1, settledByName: "Eva", settledAt: "2026-12-01T09:00:00.000Z", settledReason: "No." },
        { transaction: tx },
      );
    });
    expect(await faultCodes()).toEqual(["unbound"]);
  });
});

function insertedResult(): string {
  return `INSERT INTO results (product_id, item_id, operating_point_id, issue, method_version, basic, growth_fraction,
    growth, predicted, notes, answer) VALUES (1, 2, 2, 1, 1, 0, 0, 0, 0, '[]', '{}')`;
}

function settled(): string {
  return `UPDATE comments SET settled_by_id = 1, settled_by_name = 'Eva', settled_at = '2026-12-01T09:00:00.000Z',
    settled_reason = 'No.'`;
}

function givenRole(): string {
  return `INSERT INTO memberships (user_id, product_id, role, from_at)
    VALUES (1, 1, 'program_manager', '2026-12-01T09:00:00.000Z')`;
}
