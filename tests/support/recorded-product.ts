import { canonicalJson } from "@/lib/audit/canonical-json";
import { issueContentHash } from "@/lib/audit/issue-content-hash";
import { lineRevisionHash } from "@/lib/audit/line-revision-hash";
import { performAct } from "@/lib/audit/perform-act";
import { textHash } from "@/lib/audit/text-hash";
import { chainHead } from "@/lib/audit/write-entry";
import type { Clock } from "@/lib/vocabulary/clock";
import { Comment } from "@/models/comment";
import { inTransaction } from "@/models/database";
import { Issue } from "@/models/issue";
import { Line } from "@/models/line";
import { LineRevision } from "@/models/line-revision";
import { Membership } from "@/models/membership";
import { Product } from "@/models/product";
import { Proposal } from "@/models/proposal";
import { ProposalEditor } from "@/models/proposal-editor";
import { Result } from "@/models/result";
import { Round } from "@/models/round";
import { RoundEdit } from "@/models/round-edit";
import { Signature } from "@/models/signature";
import { User } from "@/models/user";

export const CODE = "TF2";
export const START = "2026-12-01T08:00:00.000Z";

/** A clock that is one second later each time that it is read. */
export function steppingClock(start = START): Clock {
  let moment = Date.parse(start);
  return () => new Date((moment += 1000));
}

export interface Persons {
  eva: { userId: number; printedName: string };
  tom: { userId: number; printedName: string };
}

export async function twoPersons(): Promise<Persons> {
  const [eva, tom] = await inTransaction(async (tx) => [
    await User.create(
      { email: "eva@example.org", name: "Eva", passwordHash: "-", createdAt: START },
      { transaction: tx },
    ),
    await User.create(
      { email: "tom@example.org", name: "Tom", passwordHash: "-", createdAt: START },
      { transaction: tx },
    ),
  ]);
  if (!eva || !tom) throw new Error("two persons were made");
  return { eva: { userId: eva.id, printedName: "Eva" }, tom: { userId: tom.id, printedName: "Tom" } };
}

export interface RecordedProduct extends Persons {
  productId: number;
  itemId: number;
  pointId: number;
  proposalId: number;
  roundId: number;
  clock: Clock;
}

const SUBJECT = { type: "product", id: CODE, label: CODE };

/** A product with its first issue and a proposal that waits for signatures, each act recorded. */
export async function recordedProduct(): Promise<RecordedProduct> {
  const { eva, tom } = await twoPersons();
  const clock = steppingClock();
  const productId = await performAct(eva, clock, { act: "create_product", chain: CODE }, async (tx, record, at) => {
    const product = await Product.create(
      { code: CODE, name: "Test fairing", kind: "vehicle_fairing", timeZone: "UTC", createdAt: at },
      { transaction: tx },
    );
    await Membership.create(
      { userId: tom.userId, productId: product.id, role: "reviewer", fromAt: at },
      { transaction: tx },
    );
    record({ act: "create_product", subject: SUBJECT });
    return product.id;
  });
  const { itemId, pointId } = await firstIssue({ eva, tom }, productId, clock);
  const { proposalId, roundId } = await submitted({ eva, tom }, productId, itemId, clock);
  return { eva, tom, productId, itemId, pointId, proposalId, roundId, clock };
}

async function firstIssue({ eva }: Persons, productId: number, clock: Clock) {
  return performAct(eva, clock, { act: "establish_product", chain: CODE }, async (tx, record, at) => {
    const head = await chainHead(CODE, tx);
    const item = await Line.create({ productId, kind: "item", number: "010", reservedAt: at }, { transaction: tx });
    const point = await Line.create(
      { productId, kind: "operating_point", number: "OP-1", reservedAt: at },
      { transaction: tx },
    );
    const bodies = { item: canonicalJson({ name: "Cab roof" }), operating_point: canonicalJson({ name: "Cruise" }) };
    const revisions = [item, point].map((line) => {
      const kind = line.kind === "item" ? ("item" as const) : ("operating_point" as const);
      const body = bodies[kind];
      const hash = lineRevisionHash({
        productCode: CODE,
        kind,
        number: line.number,
        letter: "–",
        retired: false,
        body,
      });
      return { lineId: line.id, kind, number: line.number, letter: "–", body, hash };
    });
    const result = {
      methodVersion: 1,
      basic: 60.5,
      growthFraction: 0.15,
      growth: 9.075,
      predicted: 69.575,
      notes: "[]",
      answer: "{}",
    };
    const totals = canonicalJson([{ operatingPoint: "OP-1", predicted: 69.575 }]);
    const contentHash = issueContentHash({
      productCode: CODE,
      number: 1,
      totals,
      uncertainty: null,
      revisions,
      results: [{ item: "010", operatingPoint: "OP-1", ...result }],
    });
    await Issue.create(
      { productId, number: 1, madeAt: at, totals, contentHash, chainSequence: head.sequence, chainHash: head.hash },
      { transaction: tx },
    );
    for (const { lineId, letter, body, hash } of revisions) {
      await LineRevision.create({ productId, lineId, letter, issue: 1, body, hash }, { transaction: tx });
    }
    await Result.create(
      { productId, itemId: item.id, operatingPointId: point.id, issue: 1, ...result },
      { transaction: tx },
    );
    record({ act: "establish_product", subject: SUBJECT, now: { issue: 1 } });
    return { itemId: item.id, pointId: point.id };
  });
}

async function submitted({ eva }: Persons, productId: number, lineId: number, clock: Clock) {
  return performAct(eva, clock, { act: "propose", chain: CODE }, async (tx, record, at) => {
    const proposal = await Proposal.create(
      { productId, baseIssue: 1, proposerId: eva.userId, createdAt: at },
      { transaction: tx },
    );
    await ProposalEditor.create(
      { proposalId: proposal.id, userId: eva.userId, firstEditAt: at, lastEditAt: at },
      { transaction: tx },
    );
    const canonicalText = "round text";
    const round = await Round.create(
      {
        proposalId: proposal.id,
        number: 1,
        baseIssue: 1,
        title: "Smoother roof",
        reason: "Measured finish.",
        evidence: "[]",
        rules: canonicalJson({ reviewers: 1 }),
        canonicalText,
        hash: textHash("round", canonicalText),
        submittedById: eva.userId,
        submittedAt: at,
      },
      { transaction: tx },
    );
    await RoundEdit.create(
      { roundId: round.id, position: 1, lineId, operation: "revise", baseLetter: "–", body: "{}" },
      { transaction: tx },
    );
    await proposal.update({ number: 1, round: 1, state: "proposed" }, { transaction: tx });
    record({ act: "propose", subject: { type: "proposal", id: "1", label: "TF2-CP-01" }, reason: "Measured finish." });
    return { proposalId: proposal.id, roundId: round.id };
  });
}

type SignatureFields = Parameters<typeof Signature.build>[0];

/** Signs the round of the product by raw rows, so that the table's own rules are what answers. */
export function sign(product: RecordedProduct, fields: Partial<NonNullable<SignatureFields>> = {}): Promise<number> {
  const { tom, clock, productId, roundId } = product;
  return performAct(tom, clock, { act: "approve_proposal", chain: CODE }, async (tx, record, at) => {
    const sequence = (await Signature.count({ where: { productId }, transaction: tx })) + 1;
    const signature = await Signature.create(
      {
        productId,
        sequence,
        subjectType: "round",
        roundId,
        signerId: tom.userId,
        printedName: "Tom",
        capacity: "reviewer",
        decision: "approve",
        meaning: "Inputs, method and evidence checked",
        canonicalText: "as shown",
        hash: textHash("signature", "as shown"),
        signedAt: at,
        ...fields,
      },
      { transaction: tx },
    );
    record({
      act: "approve_proposal",
      subject: { type: "proposal", id: "1", label: "TF2-CP-01" },
      capacity: "reviewer",
    });
    return signature.id;
  });
}

/** A remark that asks for action. */
export function remark(product: RecordedProduct, number = 1): Promise<number> {
  const { tom, clock, proposalId, roundId } = product;
  return performAct(tom, clock, { act: "add_remark", chain: CODE }, async (tx, record, at) => {
    const comment = await Comment.create(
      {
        ...{ proposalId, roundId, number, authorId: tom.userId, printedName: "Tom" },
        ...{ body: "Which gauge?", asksAction: true, writtenAt: at },
      },
      { transaction: tx },
    );
    record({ act: "add_remark", subject: { type: "remark", id: String(comment.id), label: `R${number}` } });
    return comment.id;
  });
}
