import { expect } from "@playwright/test";
import { z } from "zod";
import {
  carryForward,
  drafted,
  propose,
  proposed,
  saveDraft,
  sheetBefore,
  sign,
  signs,
  type SubmittedProposal,
} from "../support/http-acts";
import { valueOf, type HttpAnswer } from "../support/http-answer";
import { bluff, content, revising } from "../support/http-bodies";
import { storedRows } from "../support/http-tables";
import { test } from "../support/http-test";
import { RACES, TIMES } from "../support/races";

test.use({ scene: "tests/e2e/support/same-moment-scene.ts" });
// The signatures in one capacity are given to what two editors submitted before.
test.describe.configure({ mode: "serial", timeout: 600_000 });

const Signed = z.object({ state: z.string(), issue: z.int().nullable() });
const Submitted = z.object({ key: z.string(), number: z.int(), round: z.int() });
const Proposal = z.object({
  proposalId: z.int(),
  number: z.int().nullable(),
  state: z.string(),
  round: z.int(),
  lockVersion: z.int(),
});

/** Lets two acts go at once; who is sent first changes from time to time. */
async function together(
  time: number,
  one: () => Promise<HttpAnswer>,
  other: () => Promise<HttpAnswer>,
): Promise<[HttpAnswer, HttpAnswer]> {
  if (time % 2 === 0) return Promise.all([one(), other()]);
  const [second, first] = await Promise.all([other(), one()]);
  return [first, second];
}

/** The one of two acts that counted, and what the other was told. */
function winnerAndLoser(answers: readonly HttpAnswer[]) {
  const won = answers.filter((answer) => answer.ok);
  const lost = answers.filter((answer) => !answer.ok);
  expect([won.length, lost.length], JSON.stringify(answers)).toEqual([1, 1]);
  return { won: won[0]?.value, lost: lost[0] };
}

function proposalsOf(dataFolder: string, title: string) {
  return storedRows(
    dataFolder,
    `SELECT id AS proposalId, number, state, round, lock_version AS lockVersion FROM proposals
     WHERE title = '${title}' ORDER BY id`,
    Proposal,
  );
}

async function count(dataFolder: string, statement: string): Promise<number> {
  const [row] = await storedRows(
    dataFolder,
    `SELECT count(*) AS found FROM ${statement}`,
    z.object({ found: z.int() }),
  );
  return row?.found ?? NaN;
}

/** Numbers are given once and without a gap, and the history's links fit: nothing was doubled, nothing lost. */
async function expectWhole(dataFolder: string): Promise<void> {
  const gaps = [
    "(SELECT number, row_number() OVER (ORDER BY number) AS place FROM issues) WHERE number <> place",
    "(SELECT number, row_number() OVER (ORDER BY number) AS place FROM proposals WHERE number > 0) WHERE number <> place",
    `(SELECT number, row_number() OVER (PARTITION BY proposal_id ORDER BY number) AS place FROM rounds)
       WHERE number <> place`,
    `(SELECT previous_hash, lag(hash) OVER (PARTITION BY chain ORDER BY sequence) AS before FROM history_entries)
       WHERE before <> previous_hash`,
    "issues i WHERE i.number > 1 AND (SELECT count(*) FROM proposals p WHERE p.id = i.proposal_id AND p.state = 'approved') <> 1",
  ];
  for (const gap of gaps) expect(await count(dataFolder, gap), gap).toBe(0);
}

/** Refusals of one person beyond thirty a minute are counted instead of written. */
async function refusals(dataFolder: string, act: string): Promise<number> {
  const written = await count(dataFolder, `history_entries WHERE act = '${act}' AND outcome = 'refused'`);
  const Counted = z.object({ found: z.int() });
  const [left] = await storedRows(dataFolder, "SELECT coalesce(sum(count), 0) AS found FROM dropped_refusals", Counted);
  const [told] = await storedRows(
    dataFolder,
    "SELECT coalesce(sum(json_extract(canonical_text, '$.now.leftOutBefore')), 0) AS found FROM history_entries",
    Counted,
  );
  return written + (left?.found ?? NaN) + (told?.found ?? NaN);
}

test("two different last signatures both count and make one issue", async ({ application: { dataFolder }, as }) => {
  const [tansy, ines, lusia] = [await as("tansy"), await as("ines"), await as("lusia")];
  const [before, signatures] = [await count(dataFolder, "issues"), await count(dataFolder, "signatures")];
  const receiver = { kind: "item" as const, number: "030" };
  const transfer = { giver: { kind: "unallocated" as const, number: null }, receiver, hundredths: 1 };
  for (let time = 0; time < TIMES; time += 1) {
    // An owner's transfer needs a reviewer and a program manager.
    const proposal = await proposed(tansy, content([], [transfer]));
    const shown = await sheetBefore(ines, proposal);
    const answers = await together(
      time,
      () => sign(ines, proposal, shown, { capacity: "reviewer" }),
      () => sign(lusia, proposal, shown, { capacity: "program_manager" }),
    );
    const signed = answers.map((answer) => valueOf(answer, Signed)).sort((a, b) => (a.issue ?? 0) - (b.issue ?? 0));
    expect(signed).toEqual([
      { state: "proposed", issue: null },
      { state: "approved", issue: before + time + 1 },
    ]);
  }
  expect(await count(dataFolder, "issues")).toBe(before + TIMES);
  expect(await count(dataFolder, "signatures")).toBe(signatures + 2 * TIMES);
  await expectWhole(dataFolder);
});

test("of a last signature and a new round one comes first; the other is told, and what was typed stays", async ({
  application: { dataFolder },
  as,
}) => {
  const [odo, ines] = [await as("odo"), await as("ines")];
  const seen = new Set<string>();
  for (let time = 0; time < TIMES; time += 1) {
    const { proposal, lockVersion, typed } = await revisedSheet(time);
    const shown = await sheetBefore(ines, proposal);
    const before = await count(dataFolder, "issues");
    const answers = await together(
      time,
      () => sign(ines, proposal, shown),
      () => propose(odo, { proposalId: proposal.proposalId, lockVersion }),
    );
    const { won, lost } = winnerAndLoser(answers);
    const isSigned = answers[0].ok;
    seen.add(isSigned ? "signed" : "revised");
    expect(await count(dataFolder, "issues")).toBe(isSigned ? before + 1 : before);
    expect(isSigned ? Signed.parse(won).state : Submitted.parse(won).round).toBe(isSigned ? "approved" : 2);
    expect(lost).toMatchObject({
      sentence: isSigned
        ? "This proposal has been approved and never changes again. A further change needs a new proposal."
        : "A newer round was submitted in the meantime. Read the sheet again before you sign it.",
    });
    const copy = `proposal_edits WHERE proposal_id = ${proposal.proposalId}
      AND json_extract(body, '$.dragCoefficient') = ${typed}`;
    expect(await count(dataFolder, copy)).toBe(1);
  }
  expect([...seen].sort()).toEqual(["revised", "signed"]);
  await expectWhole(dataFolder);

  /** A round that a reviewer alone approves, and what its proposer typed since. */
  async function revisedSheet(time: number) {
    const { letter } = await newestLetter();
    // Less each time, so that a reviewer alone is asked.
    const [first, typed] = [(499 - 2 * time) / 1000, (498 - 2 * time) / 1000];
    const draft = await drafted(odo, content([revising("040", bluff(odo.userId, first), letter)]));
    const { key } = valueOf(await propose(odo, draft), Submitted);
    const { proposalId } = draft;
    const edited = content([revising("040", bluff(odo.userId, typed), letter)]);
    const Saved = z.object({ outcome: z.literal("saved"), lockVersion: z.int() });
    const saved = await saveDraft(odo, { proposalId, lockVersion: draft.lockVersion + 1, content: edited });
    return { proposal: { proposalId, key }, lockVersion: valueOf(saved, Saved).lockVersion, typed };
  }

  async function newestLetter() {
    const [newest] = await storedRows(
      dataFolder,
      `SELECT letter FROM line_revisions r JOIN lines l ON l.id = r.line_id WHERE l.number = '040'
       ORDER BY issue DESC LIMIT 1`,
      z.object({ letter: z.string() }),
    );
    return newest ?? { letter: "–" };
  }
});

test("of two editors who submit one draft one makes the round, the other is told to read it again", async ({
  application: { dataFolder },
  as,
}) => {
  const [tansy, odo] = [await as("tansy"), await as("odo")];
  const drafts = await proposalsOf(dataFolder, RACES.submits);
  expect(drafts).toHaveLength(TIMES);
  const before = await refusals(dataFolder, "propose");
  for (const [time, draft] of drafts.entries()) {
    const { won, lost } = winnerAndLoser(
      await together(
        time,
        () => propose(tansy, draft),
        () => propose(odo, draft),
      ),
    );
    expect(Submitted.parse(won).round).toBe(1);
    expect(lost).toMatchObject({
      code: "moved",
      sentence: "The working copy was saved by somebody else in the meantime: read it again, then propose.",
    });
  }
  const submitted = await proposalsOf(dataFolder, RACES.submits);
  expect(submitted.every(({ state, round }) => state === "proposed" && round === 1)).toBe(true);
  expect(await refusals(dataFolder, "propose")).toBe(before + TIMES);
  await expectWhole(dataFolder);
});

test("of two signatures in one capacity one counts, the other is told that it has been given", async ({
  application: { dataFolder },
  as,
}) => {
  const [ines, elske] = [await as("ines"), await as("elske")];
  const proposals = submittedOnes(await proposalsOf(dataFolder, RACES.submits));
  const before = await count(dataFolder, "signatures");
  const [issues, refused] = [await count(dataFolder, "issues"), await refusals(dataFolder, "approve_proposal")];
  for (const [time, proposal] of proposals.entries()) {
    const shown = await sheetBefore(ines, proposal);
    const { won, lost } = winnerAndLoser(
      await together(
        time,
        () => sign(ines, proposal, shown),
        () => sign(elske, proposal, shown),
      ),
    );
    expect(won).toEqual({ state: "proposed", issue: null });
    expect(lost).toMatchObject({
      code: "capacity_taken",
      sentence: "The signature of the reviewer has been given already.",
    });
  }
  expect(await count(dataFolder, "signatures")).toBe(before + TIMES);
  expect(await count(dataFolder, "issues")).toBe(issues);
  expect(await refusals(dataFolder, "approve_proposal")).toBe(refused + TIMES);
  await expectWhole(dataFolder);
});

test("of two who carry one proposal forward one makes the round, the other is told to look again", async ({
  application: { dataFolder },
  as,
}) => {
  const [tansy, odo, fenno, ines] = [await as("tansy"), await as("odo"), await as("fenno"), await as("ines")];
  for (const draft of await proposalsOf(dataFolder, RACES.carries)) valueOf(await propose(tansy, draft), Submitted);
  // Another value of the very field that all of them change.
  const overtaking = await proposed(fenno, content([revising("020", bluff(tansy.userId, 0.48))]));
  expect(valueOf(await signs(ines, overtaking), Signed).state).toBe("approved");
  const proposals = await proposalsOf(dataFolder, RACES.carries);
  expect(proposals).toHaveLength(TIMES);
  const ontoIssue = await count(dataFolder, "issues");
  const before = await refusals(dataFolder, "carry_forward");
  for (const [time, { proposalId, number, lockVersion }] of proposals.entries()) {
    const proposal = { proposalId, key: String(number) };
    const onto = { lockVersion, ontoIssue, item: "020", field: "dragCoefficient" };
    const { won, lost } = winnerAndLoser(
      await together(
        time,
        () => carryForward(tansy, proposal, onto),
        () => carryForward(odo, proposal, onto),
      ),
    );
    expect(won).toMatchObject({ round: 2 });
    expect(lost).toMatchObject({
      code: "moved",
      sentence: "A newer issue or another save came in between: look at the settlement table again.",
    });
  }
  const carried = await proposalsOf(dataFolder, RACES.carries);
  expect(carried.every(({ state, round }) => state === "proposed" && round === 2)).toBe(true);
  expect(await refusals(dataFolder, "carry_forward")).toBe(before + TIMES);
  await expectWhole(dataFolder);
});

function submittedOnes(proposals: readonly z.infer<typeof Proposal>[]): SubmittedProposal[] {
  return proposals.map(({ proposalId, number }) => ({ proposalId, key: String(number) }));
}
