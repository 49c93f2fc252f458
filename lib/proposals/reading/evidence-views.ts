import type { Transaction } from "sequelize";
import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import { isAllowed } from "@/policies/authorize";
import { citationsIn, citationsOf } from "../records/cited-files";
import { fileOfContent, readableFiles } from "../records/file-records";
import { fileView } from "./file-views";
import { fileSubject, historySubject, lookingsAt } from "../records/note-looking";
import type { RoundReview } from "../review/round-review";
import { personOf } from "./routing-views";
import type { CitedEvidenceView, EvidenceView, FileView, LineReference, SignerLookings } from "../views";

/** What a round rests on, and who looked at it. */
export async function evidenceViewOf(actor: Actor, review: RoundReview, tx: Transaction): Promise<EvidenceView> {
  const { proposal, today } = review;
  const files = await readableFiles(actor, proposal.productId, tx);
  const cited = citedViews(actor, review, files);
  const beside = files
    .filter(({ place, proposalId }) => place === "proposal" && proposalId === proposal.id)
    .map((file) => fileView(actor, file));
  const histories = historiesOf(review);
  const shown = [...cited.flatMap(({ file }) => file ?? []), ...beside];
  return {
    ...{ cited, beside, histories, ageDays: termsOf(today.state).evidenceAgeDays },
    signers: await signerLookings(actor, review, { files: uniqueFiles(shown), histories }, tx),
  };
}

function citedViews(
  actor: Actor,
  { round, base, onBase }: RoundReview,
  files: Awaited<ReturnType<typeof readableFiles>>,
): CitedEvidenceView[] {
  return citationsIn(round.edits).map(({ kind, number, citation }) => {
    const { document, revision, date, file } = citation;
    const isHere = (line: { kind: string; number: string }) => line.kind === kind && line.number === number;
    const before = citationsOf(base.state.lines.find(isHere)?.body);
    const after = onBase.change.after.state.lines.find(isHere);
    const held = file ? fileOfContent(files, file.sha256) : null;
    const isOld = before.some(
      (old) =>
        old.citation.document === document &&
        old.citation.revision === revision &&
        old.citation.date === date &&
        old.citation.file?.sha256 === file?.sha256,
    );
    return {
      line: { kind, number, name: after ? lineName(after) : "" },
      ...{ document, revision, date, isNew: !isOld, fileName: file?.name ?? null },
      file: held ? fileView(actor, held) : null,
    };
  });
}

function historiesOf({ round, base }: RoundReview): LineReference[] {
  return round.edits.flatMap(({ kind, number }) => {
    const line = base.state.lines.find((each) => each.kind === kind && each.number === number);
    return line ? [{ kind, number, name: lineName(line) }] : [];
  });
}

function uniqueFiles(files: readonly FileView[]): FileView[] {
  return files.filter(({ fileId }, index) => files.findIndex((other) => other.fileId === fileId) === index);
}

async function signerLookings(
  actor: Actor,
  { proposal, round, routing, signatures, people }: RoundReview,
  { files, histories }: { files: readonly FileView[]; histories: readonly LineReference[] },
  tx: Transaction,
): Promise<SignerLookings[]> {
  if (round.id === 0 || files.length + histories.length === 0) return [];
  const signed = signatures.filter(({ roundId }) => roundId === round.id).map(({ signerId }) => signerId);
  const may = proposal.state === "proposed" ? routing.flatMap(({ maySign }) => maySign) : [];
  const signers = [...new Set([...signed, ...may.map(({ userId }) => userId)])];
  const watches = isAllowed(actor, { on: "Product", action: "read_lookings", productId: proposal.productId });
  const ofFile = (fileId: number) => fileSubject(round.id, fileId);
  const ofLine = ({ kind, number }: LineReference) => historySubject(round.id, kind, number);
  const [opened, looked] = [
    await lookingsAt(
      "file",
      files.map(({ fileId }) => ofFile(fileId)),
      tx,
    ),
    watches ? await lookingsAt("line history", histories.map(ofLine), tx) : [],
  ];
  const firstAt = (seen: typeof opened, person: number, subject: string) =>
    seen.find((each) => each.userId === person && each.subject === subject)?.firstAt ?? null;
  return signers.map((userId) => ({
    person: personOf(people, userId),
    files: files.map(({ fileId, name }) => ({ fileId, name, at: firstAt(opened, userId, ofFile(fileId)) })),
    histories: watches ? histories.map((line) => ({ line, at: firstAt(looked, userId, ofLine(line)) })) : null,
  }));
}
