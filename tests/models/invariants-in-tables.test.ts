import { beforeEach, describe, expect, it } from "vitest";
import { textHash } from "@/lib/audit/text-hash";
import { database, inTransaction } from "@/models/database";
import { Comment } from "@/models/comment";
import { HistoryEntry } from "@/models/history-entry";
import { Issue } from "@/models/issue";
import { Line } from "@/models/line";
import { LineRevision } from "@/models/line-revision";
import { Proposal } from "@/models/proposal";
import { ProposalEditor } from "@/models/proposal-editor";
import { Round } from "@/models/round";
import { Signature } from "@/models/signature";
import { User } from "@/models/user";
import { withDatabase } from "../support/database";
import { recordedProduct, remark, sign, type RecordedProduct } from "../support/recorded-product";

withDatabase();

let product: RecordedProduct;

beforeEach(async () => {
  product = await recordedProduct();
});

const HASH = "0123456789abcdef".repeat(4);

function run(sql: string): Promise<unknown> {
  return inTransaction((tx) => database.query(sql, { transaction: tx }));
}

/** The sentence of a trigger stands in the error under Sequelize's own. */
async function refusal(work: Promise<unknown>): Promise<string> {
  try {
    await work;
  } catch (problem) {
    const parent: unknown = problem instanceof Error ? Reflect.get(problem, "parent") : undefined;
    return parent instanceof Error ? parent.message : String(problem);
  }
  return "nothing was refused";
}

function issue(number: number, proposalId: number | null, madeAt = "2026-12-02T00:00:00.000Z"): Promise<Issue> {
  const { productId } = product;
  const rest = { totals: "[]", contentHash: HASH, chainSequence: 0, chainHash: HASH };
  return inTransaction((tx) => Issue.create({ productId, number, proposalId, madeAt, ...rest }, { transaction: tx }));
}

function revision(letter: string, issueNumber: number): Promise<LineRevision> {
  const row = {
    productId: product.productId,
    lineId: product.itemId,
    letter,
    issue: issueNumber,
    body: "{}",
    hash: HASH,
  };
  return inTransaction((tx) => LineRevision.create(row, { transaction: tx }));
}

function move(values: { state: Proposal["state"]; endedAt?: string }): Promise<unknown> {
  return inTransaction((tx) => Proposal.update(values, { where: { id: product.proposalId }, transaction: tx }));
}

describe("issues", () => {
  it("have no gap", async () => {
    expect(await refusal(issue(3, product.proposalId))).toContain("without a gap");
    expect(await refusal(issue(1, null))).toContain("without a gap");
  });

  it("are each later than the one before", async () => {
    const first = await Issue.findOne({ rejectOnEmpty: true });
    expect(await refusal(issue(2, product.proposalId, first.madeAt))).toContain("later than the one before");
  });

  it("are each made by a proposal that waits for its last signature, once", async () => {
    expect(await refusal(issue(2, null))).toContain("CHECK");
    await issue(2, product.proposalId);
    const later = "2026-12-03T00:00:00.000Z";
    expect(await refusal(issue(3, product.proposalId, later))).toContain("UNIQUE");
    await move({ state: "withdrawn", endedAt: "2026-12-02T00:00:00.000Z" });
    expect(await refusal(issue(3, product.proposalId, later))).toContain("before its last signature");
  });

  it("stand behind every approved proposal", async () => {
    const approve = { state: "approved", endedAt: "2026-12-02T00:00:00.000Z" } as const;
    expect(await refusal(move(approve))).toContain("an approved one has made an issue");
    await issue(2, product.proposalId);
    await move(approve);
    expect((await Proposal.findOne({ rejectOnEmpty: true })).state).toBe("approved");
  });
});

describe("line revisions", () => {
  it("are written with the newest issue only, one per line and issue", async () => {
    expect(await refusal(revision("A", 2))).toContain("newest issue only");
    expect(await refusal(revision("A", 1))).toContain("UNIQUE");
  });

  it("take the letters of ASME Y14.35: no I, O, Q, S, X, Z, and AA after Y", async () => {
    const letters = [
      "A",
      "B",
      "C",
      "D",
      "E",
      "F",
      "G",
      "H",
      "J",
      "K",
      "L",
      "M",
      "N",
      "P",
      "R",
      "T",
      "U",
      "V",
      "W",
      "Y",
    ];
    const next = [...letters, "AA", "AB"];
    for (const [index, letter] of next.entries()) {
      const number = index + 2;
      const madeAt = new Date(Date.parse("2026-12-02T00:00:00.000Z") + number * 1000).toISOString();
      const proposalId = await proposedProposal(number);
      await issue(number, proposalId, madeAt);
      expect(await refusal(revision(letter === "AB" ? "AC" : "I", number))).toContain("ASME Y14.35");
      await revision(letter, number);
    }
    expect(await LineRevision.count({ where: { lineId: product.itemId } })).toBe(23);
  });

  async function proposedProposal(number: number): Promise<number> {
    const { productId, eva } = product;
    const row = { productId, baseIssue: 1, proposerId: eva.userId, createdAt: "2026-12-01T10:00:00.000Z" };
    return inTransaction(async (tx) => {
      const proposal = await Proposal.create(row, { transaction: tx });
      await proposal.update({ state: "proposed", number, round: 1 }, { transaction: tx });
      return proposal.id;
    });
  }
});

describe("signatures", () => {
  it("are refused from the proposer", async () => {
    expect(await refusal(sign(product, { signerId: product.eva.userId }))).toContain("nobody signs what they proposed");
  });

  it("are refused from whoever edited the proposal", async () => {
    const { proposalId, tom } = product;
    const at = "2026-12-01T10:00:00.000Z";
    const editor = { proposalId, userId: tom.userId, firstEditAt: at, lastEditAt: at };
    await inTransaction((tx) => ProposalEditor.create(editor, { transaction: tx }));
    expect(await refusal(sign(product))).toContain("nobody signs what they proposed or edited");
  });

  it("are refused from a deputy of the proposer", async () => {
    const asDeputy = { deputyForId: product.eva.userId, deputyForName: "Eva" };
    expect(await refusal(sign(product, asDeputy))).toContain("as themselves or as deputy");
  });

  it("are taken once per person and capacity, and again after a take-back", async () => {
    const first = await sign(product);
    expect(await refusal(sign(product, { capacity: "program_manager" }))).toContain("one person signs");
    await sign(product, { decision: "take_back", takesBackId: first, meaning: null, reason: "Wrong sheet." });
    await sign(product);
    expect(await Signature.count()).toBe(3);
  });

  it("are taken from as many reviewers as the round's rules ask for, and from no more", async () => {
    const other = { email: "ida@example.org", name: "Ida", passwordHash: "-", createdAt: "2026-12-01T08:00:00.000Z" };
    const ida = await inTransaction((tx) => User.create(other, { transaction: tx }));
    await sign(product);
    const second = { signerId: ida.id, printedName: "Ida" };
    expect(await refusal(sign(product, second))).toContain("this capacity has been signed");
    await sign(product, { ...second, capacity: "program_manager" });
    expect(await Signature.count()).toBe(2);
  });

  it("are refused on a round that is not the proposal's newest or not open", async () => {
    await move({ state: "returned" });
    expect(await refusal(sign(product))).toContain("not open to signers");
  });

  it("that approve are refused while a remark asks for action; a return is not", async () => {
    await remark(product);
    expect(await refusal(sign(product))).toContain("is not settled");
    await sign(product, { decision: "return", meaning: null, reason: "See R1." });
    expect(await Signature.count()).toBe(1);
  });

  it("that return need a reason, and only a program manager disapproves", async () => {
    expect(await refusal(sign(product, { decision: "return", meaning: null }))).toContain("CHECK");
    expect(await refusal(sign(product, { decision: "disapprove", reason: "No." }))).toContain("CHECK");
  });
});

describe("proposals", () => {
  it.each(["approved", "disapproved", "withdrawn"] as const)("that are %s never change again", async (state) => {
    await issue(2, product.proposalId);
    await move({ state, endedAt: "2026-12-02T00:00:00.000Z" });
    expect(await refusal(run("UPDATE proposals SET title = 'Other'"))).toContain("an end state never changes");
    expect(await refusal(run("UPDATE proposals SET state = 'draft', ended_at = NULL"))).not.toBe("nothing was refused");
  });

  it("make no move that is not listed", async () => {
    expect(await refusal(move({ state: "draft" }))).toContain("not listed");
    await move({ state: "returned" });
    expect(await refusal(move({ state: "disapproved", endedAt: "2026-12-02T00:00:00.000Z" }))).toContain("not listed");
  });

  it("keep number and proposer", async () => {
    expect(await refusal(run("UPDATE proposals SET number = 9"))).toContain("a number once given stays");
    expect(await refusal(run(`UPDATE proposals SET proposer_id = ${product.tom.userId}`))).toContain("never change");
  });
});

it("refuses an entry that does not follow its predecessor's hash", async () => {
  const last = await HistoryEntry.findOne({ order: [["sequence", "DESC"]], rejectOnEmpty: true });
  const insert = (sequence: number, previous: string) =>
    run(`INSERT INTO history_entries (chain, sequence, at, printed_name, act, subject_type, subject_id, subject_label,
      outcome, canonical_text, previous_hash, hash) VALUES ('TF2', ${sequence}, '2026-12-02T00:00:00.000Z', 'Eva',
      'propose', 'proposal', '1', 'x', 'done', '{}', '${previous}', '${HASH}')`);
  expect(await refusal(insert(last.sequence + 1, HASH))).toContain("follows the hash");
  expect(await refusal(insert(last.sequence + 2, last.hash))).toContain("follows the hash");
  expect(await refusal(insert(last.sequence + 1, last.hash))).toBe("nothing was refused");
});

it("reserves a line's number for ever, and knows one sheet of allocations per product", async () => {
  const { productId } = product;
  const line = (kind: Line["kind"], number: string) =>
    inTransaction((tx) =>
      Line.create({ productId, kind, number, reservedAt: "2026-12-01T10:00:00.000Z" }, { transaction: tx }),
    );
  expect(await refusal(line("item", "010"))).toContain("UNIQUE");
  expect(await refusal(line("item", "-10"))).toContain("CHECK");
  await line("allocations", "AL");
  expect(await refusal(line("allocations", "AM"))).toContain("UNIQUE");
  expect(await refusal(run("DELETE FROM lines"))).toContain("never deleted");
});

it("lets a remark be settled once and changes nothing else of it", async () => {
  const id = await remark(product);
  const settle = (reason: string) =>
    run(`UPDATE comments SET settled_by_id = 1, settled_by_name = 'Eva', settled_at = '2026-12-02T00:00:00.000Z',
      settled_reason = '${reason}' WHERE id = ${id}`);
  expect(await refusal(run("UPDATE comments SET body = 'Fine.'"))).toContain("the text never changes");
  await settle("Answered.");
  expect(await refusal(settle("Again."))).toContain("settled once");
  expect((await Comment.findByPk(id))?.settledReason).toBe("Answered.");
});

it.each([
  ["issues", "content_hash"],
  ["line_revisions", "body"],
  ["results", "notes"],
  ["rounds", "reason"],
  ["round_edits", "body"],
  ["signatures", "reason"],
  ["history_entries", "reason"],
])("lets nobody change, replace or delete a row of %s", async (table, column) => {
  await sign(product);
  expect(await refusal(run(`UPDATE ${table} SET ${column} = ${column}`))).toContain("append-only");
  expect(await refusal(run(`DELETE FROM ${table}`))).toContain("never deleted");
  expect(await refusal(run(`INSERT OR REPLACE INTO ${table} SELECT * FROM ${table}`))).not.toBe("nothing was refused");
});

it("keeps a round's number without a gap", async () => {
  const { proposalId, eva } = product;
  const round = (number: number) =>
    inTransaction((tx) =>
      Round.create(
        {
          ...{ proposalId, number, baseIssue: 1, title: "", reason: "", evidence: "[]", rules: "{}" },
          ...{ canonicalText: "t", hash: textHash("round", "t"), submittedById: eva.userId },
          submittedAt: "2026-12-02T00:00:00.000Z",
        },
        { transaction: tx },
      ),
    );
  expect(await refusal(round(3))).toContain("without a gap");
  expect(await refusal(round(2))).toBe("nothing was refused");
});
