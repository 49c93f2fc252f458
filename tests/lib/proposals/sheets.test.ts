import { describe, expect, it } from "vitest";
import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { budgetWith } from "@/lib/proposals/reading/budget-with";
import { daySheet } from "@/lib/proposals/day-sheet/day-sheet";
import { propose } from "@/lib/proposals/submitting/propose";
import { proposalList, proposalPatch, proposalView } from "@/lib/proposals/queries";
import { raiseObjection } from "@/lib/proposals/signing/raise-objection";
import { returnProposal } from "@/lib/proposals/signing/return-proposal";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { noteVisit } from "@/lib/proposals/records/visits";
import { addItem, shareItem } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import {
  adding,
  approvedItems,
  approves,
  CODE,
  content,
  editOf,
  formKey,
  proposed,
  revising,
  team,
} from "./review-cycle";

withDatabase();

// Air at 15 °C and 25 m/s: q = 0.5 · 1.225 · 625 = 382.8 Pa (ISO 2533); A = 0.1 m²; growth 20 % (estimated).
const PREDICTED_PER_CD = 382.8 * 0.1 * 1.2;

async function withSmallChange() {
  const people = await team();
  const { tansy, odo, fenno, clock } = people;
  await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.3)], fenno);
  const edits = [revising("010", "–", tansy.userId, 0.49, { name: "Mirror, rounded" })];
  const small = await proposed(tansy, clock, { title: "Round the mirror", edits });
  return { ...people, small };
}

describe("the sheet of a proposal", () => {
  it("shows every field as it was and as it is to be, and what each brings", async () => {
    const { ines, clock } = await withSmallChange();
    const sheet = await proposalView(ines, CODE, "2", undefined, clock);
    const [line] = sheet?.lines ?? [];
    expect(line).toMatchObject({ kind: "item", number: "010", baseLetter: "–", todayLetter: "–", nextLetter: "A" });
    const changed = line?.rows.filter((row) => row.changed) ?? [];
    expect(changed.map(({ field, was, toBe }) => [field, was, toBe])).toEqual([
      ["name", "Mirror", "Mirror, rounded"],
      ["dragCoefficient", "0.5", "0.49"],
    ]);
    expect(changed[0]?.effect).toEqual({ onBase: 0, onToday: 0 });
    expect(changed[1]?.effect.onToday).toBeCloseTo(-0.01 * PREDICTED_PER_CD, 2);
    expect(line?.effect.onToday).toBeCloseTo(-0.01 * PREDICTED_PER_CD, 2);
    expect(sheet?.effectToday?.sentence).toBe("Predicted falls by 0.46\u2009N; still inside.");
    expect(sheet?.signingSheet?.text).toContain("dragCoefficient: 0.5 -> 0.49");
  });

  it("gives who signs it today's budget with the change, to follow its figures, while a round is open", async () => {
    const { tansy, ines, small, clock } = await withSmallChange();
    const budget = await budgetWith(ines, CODE, "2");
    const result = budget?.results.points[0]?.items.find(({ item }) => item === "010");
    expect(result?.predicted).toBeCloseTo(0.49 * PREDICTED_PER_CD, 2);
    expect(budget?.issue.number).toBe(2);
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "Later", key: formKey() }, clock);
    await expect(budgetWith(ines, CODE, `draft-${proposalId}`)).rejects.toMatchObject({ code: "forbidden" });
    expect(await budgetWith(tansy, CODE, `draft-${proposalId}`)).toBeNull();
    await approves(ines, small, "reviewer", clock);
    expect(await budgetWith(ines, CODE, "2")).toBeNull();
  });

  it("offers each reader the moves that are theirs, and tells the barred why", async () => {
    const { tansy, odo, ines, lusia, fenno, maud, clock } = await withSmallChange();
    const movesOf = async (reader: typeof tansy) => {
      const moves = (await proposalView(reader, CODE, "2", undefined, clock))?.moves;
      return Object.entries(moves ?? {}).flatMap(([move, { applies, allowed }]) => (applies && allowed ? [move] : []));
    };
    expect(await movesOf(tansy)).toEqual(["edit", "share", "propose", "withdraw", "remark", "add_file"]);
    expect((await proposalView(tansy, CODE, "2", undefined, clock))?.moves.sign_as_reviewer).toEqual({
      applies: true,
      allowed: false,
      because: "Nobody signs their own change: you are barred as its proposer and as owner of item 010.",
    });
    expect(await movesOf(odo)).toEqual(["object", "remark", "add_file"]);
    expect(await movesOf(ines)).toEqual(["sign_as_reviewer", "return", "remark", "add_file"]);
    expect(await movesOf(lusia)).toEqual(["withdraw", "return", "disapprove", "remark", "add_file", "name_reviewer"]);
    expect(await movesOf(maud)).toEqual([]);

    await proposed(fenno, clock, { edits: [adding("030", odo.userId, 0.1)] });
    expect((await proposalView(fenno, CODE, "3", undefined, clock))?.moves.sign_as_program_manager).toEqual({
      applies: true,
      allowed: false,
      because: "Nobody signs their own change: you are barred as its proposer.",
    });
  });

  it("keeps what an earlier round said, and shows that its return belongs to it", async () => {
    const { tansy, ines, small, clock } = await withSmallChange();
    const sheet = await proposalView(ines, CODE, "2", undefined, clock);
    const input = {
      proposalId: small,
      roundHash: sheet?.round?.hash ?? "",
      capacity: "reviewer",
      deputyForId: null,
    } as const;
    await returnProposal(ines, { ...input, reason: "State the source." }, clock);
    const { lockVersion = 0 } = (await proposalView(tansy, CODE, "2", undefined, clock)) ?? {};
    const edits = [revising("010", "–", tansy.userId, 0.48)];
    await saveDraft(tansy, { proposalId: small, lockVersion, content: content({ edits }) }, clock);
    const again = { proposalId: small, lockVersion: lockVersion + 1, key: formKey(), password: null };
    expect(await propose(tansy, again, clock)).toEqual({ key: "2", number: 2, round: 2 });

    const earlier = await proposalView(ines, CODE, "2", 1, clock);
    expect(earlier?.lines[0]?.rows.find(({ field }) => field === "dragCoefficient")?.toBe).toBe("0.49");
    expect(earlier?.moves.sign_as_reviewer.applies).toBe(false);
    const now = await proposalView(ines, CODE, "2", undefined, clock);
    expect(now?.lines[0]?.rows.find(({ field }) => field === "dragCoefficient")?.toBe).toBe("0.48");
    expect(now?.signatures).toMatchObject([
      { round: 1, decision: "return", counts: false, becauseNot: "belongs to round 1" },
    ]);
    expect(now?.moves.sign_as_reviewer).toMatchObject({ applies: true, allowed: true });
  });

  it("shows remarks at their field, in threads, and objections to all", async () => {
    const { tansy, odo, ines, small, clock } = await withSmallChange();
    const place = { line: { kind: "item" as const, number: "010" }, field: "dragCoefficient" };
    const words = { suggestion: "0.495", asksForAction: true, to: [], text: "Which gauge?" };
    const { remarkId } = await addRemark(
      ines,
      { proposalId: small, parentId: null, ...place, ...words, key: formKey() },
      clock,
    );
    const answer = { line: null, field: null, suggestion: null, asksForAction: false, to: [], text: "Gauge 7." };
    await addRemark(tansy, { proposalId: small, parentId: remarkId, ...answer, key: formKey() }, clock);
    await raiseObjection(odo, { proposalId: small, reason: "My item sits in its wake.", key: formKey() }, clock);

    const sheet = await proposalView(ines, CODE, "2", undefined, clock);
    const row = sheet?.lines[0]?.rows.find(({ field }) => field === "dragCoefficient");
    expect(row?.remarkNumbers).toEqual([1]);
    expect(sheet?.remarks).toMatchObject([
      {
        ...{ number: 1, asksForAction: true, to: [], settled: null, maySettle: true, fieldLabel: row?.label },
        replies: [{ text: "Gauge 7.", author: { name: "Tansy Owner" } }],
      },
    ]);
    expect(sheet?.objections).toMatchObject([{ by: { name: "Odo Owner" }, reason: "My item sits in its wake." }]);
    expect(sheet?.moves.sign_as_reviewer).toMatchObject({ applies: true, allowed: false });
  });

  it("gives the change as a unified patch over the canonical text", async () => {
    const { maud, clock } = await withSmallChange();
    const patch = await proposalPatch(maud, CODE, "2", undefined, clock);
    expect(patch?.label).toBe("TF-2-CP-02");
    const rows = patch?.text.split("\n") ?? [];
    expect(rows).toContain("-dragCoefficient: 0.5");
    expect(rows).toContain("+dragCoefficient: 0.49");
    expect(rows[0]).toBe("--- item 010\trevision –");
    expect(rows[1]).toBe("+++ item 010\trevision A");
  });
});

describe("drafts", () => {
  it("are seen by their proposer and named co-editors, by nobody else", async () => {
    const { tansy, odo, ines, lusia, maud, clock } = await withSmallChange();
    const { key, proposalId } = await startDraft(tansy, { productCode: CODE, title: "Secret", key: formKey() }, clock);
    for (const reader of [odo, ines, lusia, maud]) {
      await expect(proposalView(reader, CODE, key, undefined, clock)).rejects.toMatchObject({ code: "forbidden" });
      expect((await proposalList(reader, CODE, clock))?.rows.map((row) => row.key)).toEqual(["2", "1"]);
    }
    await shareDraft(tansy, { proposalId, userId: odo.userId }, clock);
    expect(await proposalView(odo, CODE, key, undefined, clock)).toMatchObject({ title: "Secret", round: null });
    expect((await proposalList(odo, CODE, clock))?.rows.map((row) => row.key)).toEqual([key, "2", "1"]);
  });

  it("answer a stale save with what is stored, and overwrite nothing", async () => {
    const { tansy, odo, clock } = await withSmallChange();
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "Both", key: formKey() }, clock);
    await shareDraft(tansy, { proposalId, userId: odo.userId }, clock);
    const mine = content({ title: "Tansy's words" });
    expect(await saveDraft(tansy, { proposalId, lockVersion: 0, content: mine }, clock)).toMatchObject({
      outcome: "saved",
      lockVersion: 1,
    });
    const theirs = content({ title: "Odo's words" });
    expect(await saveDraft(odo, { proposalId, lockVersion: 0, content: theirs }, clock)).toMatchObject({
      outcome: "moved",
      stored: { lockVersion: 1, content: { title: "Tansy's words" }, savedBy: { name: "Tansy Owner" } },
    });
  });

  it("keep an unfinished body as it was typed, and reserve the number of a new line for themselves", async () => {
    const { tansy, odo, clock } = await withSmallChange();
    const first = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
    const half = { ...adding("030", tansy.userId, 0.5), body: { name: "", ownerId: tansy.userId, method: "share" } };
    await saveDraft(
      tansy,
      { proposalId: first.proposalId, lockVersion: 0, content: content({ edits: [half] }) },
      clock,
    );
    const second = await startDraft(odo, { productCode: CODE, title: "", key: formKey() }, clock);
    const taken = content({ edits: [adding("030", odo.userId, 0.5)] });
    await expect(
      saveDraft(odo, { proposalId: second.proposalId, lockVersion: 0, content: taken }, clock),
    ).rejects.toMatchObject({ code: "invalid", faults: [{ path: "edits.0.number" }] });
  });
});

describe("the day sheet", () => {
  it("says what waits for whom, what they wait for and where their items stand", async () => {
    const { tansy, ines, lusia, small, clock } = await withSmallChange();
    const ofInes = await daySheet(ines, clock);
    expect(ofInes.waitsForMe).toMatchObject([{ key: "2", what: "Sign as reviewer, or return it" }]);
    const ofTansy = await daySheet(tansy, clock);
    expect(ofTansy.iWaitFor).toMatchObject([
      { key: "2", waitingFor: [{ capacity: "reviewer", names: ["Elske Reviewer", "Ines Reviewer"] }] },
    ]);
    expect(ofTansy.myItems).toMatchObject([{ number: "010", letter: "–", allocationHundredths: null, over: false }]);
    expect(ofTansy.myItems[0]?.predicted).toBeCloseTo(0.5 * PREDICTED_PER_CD, 1);
    expect((await daySheet(lusia, clock)).waitsForMe).toEqual([]);

    await approves(ines, small, "reviewer", clock);
    expect((await daySheet(ines, clock)).waitsForMe).toEqual([]);
    expect((await daySheet(tansy, clock)).myItems).toMatchObject([{ number: "010", letter: "A" }]);
  });

  it("tells what changed since the last visit, not since the last reload", async () => {
    const { tansy, ines, small } = await withSmallChange();
    const at = (time: string) => () => new Date(`2026-03-05T${time}Z`);
    await noteVisit(tansy, at("08:00:00.000"));
    await approves(ines, small, "reviewer", at("09:00:00.000"));
    await noteVisit(tansy, at("10:00:00.000"));
    await noteVisit(tansy, at("10:01:00.000"));
    const { changedSince, lastSeenAt } = await daySheet(tansy, at("10:01:00.000"));
    expect(lastSeenAt).toBe("2026-03-05T08:00:00.000Z");
    expect(changedSince).toMatchObject([{ issue: 3, label: "TF-2-CP-02", title: "Round the mirror" }]);
  });
});

describe("the effect beside others", () => {
  /** 010 by Tansy and 020 by Odo are proposed on issue 2, and a share of a tenth follows both. */
  async function withTwoProposed() {
    const people = await team();
    const { tansy, odo, fenno, clock } = people;
    const share = editOf(addItem("030", shareItem(tansy.userId, 0.1, ["010", "020"])));
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.3), share], fenno);
    const first = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    await proposed(odo, clock, { edits: [revising("020", "–", odo.userId, 0.29)] });
    return { ...people, first };
  }

  it("stands field by field and line by line on the base issue and on today's", async () => {
    const { ines, lusia, odo, fenno, clock } = await withTwoProposed();
    // Overtakes nothing: another owner's item joins, and the share's members with it.
    const joins = adding("040", odo.userId, 0.2);
    const members = { ...editOf(addItem("030", shareItem(odo.userId, 0.2, ["010", "020", "040"]))) };
    const wider = { ...members, operation: "revise" as const, baseLetter: "–" };
    const other = await proposed(fenno, clock, { edits: [joins, wider] });
    await approves(ines, other, "reviewer", clock);
    await approves(lusia, other, "program_manager", clock);

    const sheet = await proposalView(ines, CODE, "2", undefined, clock);
    const [line] = sheet?.lines ?? [];
    const changed = line?.rows.find(({ field }) => field === "dragCoefficient");
    expect(changed?.effect.onBase).toBeCloseTo(-0.01 * PREDICTED_PER_CD, 2);
    expect(line?.effect).toEqual(changed?.effect);
    // The share of a tenth makes the total move by a tenth more, the share of a fifth by a fifth more.
    expect([sheet?.effectOnBase?.onIssue, sheet?.effectToday?.onIssue]).toEqual([2, 3]);
    expect(sheet?.effectOnBase?.points[0]?.predictedDelta).toBeCloseTo(-0.011 * PREDICTED_PER_CD, 2);
    expect(sheet?.effectToday?.points[0]?.predictedDelta).toBeCloseTo(-0.012 * PREDICTED_PER_CD, 2);
    expect(sheet?.effectToday?.followers.map(({ item }) => item)).toEqual(["030"]);
  });

  it("stands jointly with the others that are proposed, and names what could not follow", async () => {
    const { tansy, ines, clock, first } = await withTwoProposed();
    const sheet = await proposalView(ines, CODE, "2", undefined, clock);
    const jointly = jointlyOf(sheet);
    expect(jointly.points[0]?.predictedDelta).toBeCloseTo(-0.022 * PREDICTED_PER_CD, 2);
    expect(jointly.others).toEqual([{ key: "3", label: "TF-2-CP-03", title: "A change", counts: true, conflicts: [] }]);

    await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.48)] });
    const [, third] = jointlyOf(await proposalView(ines, CODE, "2", undefined, clock)).others;
    expect(third?.counts).toBe(false);
    expect(third?.conflicts[0]).toContain("both change");
    // What is decided stands for itself.
    await approves(ines, first, "reviewer", clock);
    expect((await proposalView(ines, CODE, "2", undefined, clock))?.jointly).toBeNull();
  });
});

function jointlyOf(sheet: Awaited<ReturnType<typeof proposalView>>) {
  const jointly = sheet?.jointly;
  if (typeof jointly !== "object" || jointly === null) throw new Error("nothing else is proposed");
  return jointly;
}
