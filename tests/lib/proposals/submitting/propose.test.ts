import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { Proposal } from "@/models/proposal";
import { Round } from "@/models/round";
import { addItem, newestBudget } from "@/tests/support/budget-on-file";
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
  type Content,
  type Team,
} from "../review-cycle";

withDatabase();

/** What the submission of a draft with this content is refused with; nothing of it stands afterwards. */
async function refusedWith({ tansy, clock }: Team, more: Content) {
  const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
  await saveDraft(tansy, { proposalId, lockVersion: 0, content: content(more) }, clock);
  const submitted = propose(tansy, { proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
  const refusal = await submitted.then(
    () => null,
    (problem: unknown) => problem,
  );
  expect(await Proposal.findByPk(proposalId)).toMatchObject({ state: "draft", number: null, round: 0 });
  return refusal;
}

/** A plate at 25 m/s in air at 15 °C, ν = 1.461e-5 m²/s: Re = 1.71e6 · L. */
function plate(ownerId: number, more: object) {
  return editOf(
    addItem("050", {
      ...{ name: "Cap", ownerId, group: null, order: 50, grade: "estimated", saving: false, methodVersion: 1 },
      ...{ method: "flat-plate-friction", length: { value: 1 }, breadth: { value: 0.5 }, faces: 2 },
      ...{ roughness: { value: 0 }, frictionLine: "prandtl-schlichting", transition: "natural" },
      ...more,
    }),
  );
}

describe("submitting a draft", () => {
  it("demands at least one edit or transfer, a title and a reason, each at its field", async () => {
    const people = await team();
    expect(await refusedWith(people, {})).toMatchObject({ code: "invalid", faults: [{ path: "edits" }] });
    const edits = [adding("010", people.tansy.userId, 0.5)];
    expect(await refusedWith(people, { edits, title: "", reason: "" })).toMatchObject({
      code: "invalid",
      faults: [{ path: "title" }, { path: "reason" }],
    });
  });

  it("refuses incomplete bodies with every fault at its field; faults of typing are no acts", async () => {
    const people = await team();
    const body = { ownerId: people.tansy.userId, method: "bluff-body", name: "" };
    const edits = [{ ...adding("010", people.tansy.userId, 0.5), body }];
    const refusal = await refusedWith(people, { edits });
    expect(refusal).toMatchObject({ code: "invalid" });
    expect(refusal).toHaveProperty(
      "faults",
      expect.arrayContaining([expect.objectContaining({ path: "edits.0.body.name" })]),
    );
    expect((await historyPage({ chain: CODE, act: "propose" })).rows).toEqual([]);
  });

  it("refuses an edit that changes nothing, also when a length is only typed in another unit", async () => {
    const people = await team();
    const { tansy } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const edits = [revising("010", "–", tansy.userId, 0.5)];
    expect(await refusedWith(people, { edits })).toMatchObject({ faults: [{ path: "edits.0.body" }] });
  });

  it("demands evidence for a grade above estimated, on a new item too", async () => {
    const people = await team();
    const edits = [adding("010", people.tansy.userId, 0.5, { grade: "layout" })];
    expect(await refusedWith(people, { edits })).toMatchObject({
      code: "evidence_missing",
      faults: [{ path: "edits.0.body.evidence" }],
    });
    const evidence = [{ document: "7731-C", revision: "C", date: "2026-02-01" }];
    const cited = [adding("020", people.tansy.userId, 0.5, { grade: "layout", evidence })];
    await expect(proposed(people.tansy, people.clock, { edits: cited })).resolves.toEqual(expect.any(Number));
  });

  it("demands a justification of a caution once, and again only where its excess grew", async () => {
    const people = await team();
    const { tansy, ines, lusia, clock } = people;
    const ownerId = tansy.userId;
    // Held laminar to the end at Re 1.71e6, above the usual critical 5e5: more than threefold.
    const laminar = { transition: "laminar" };
    const refusal = await refusedWith(people, { edits: [plate(ownerId, laminar)] });
    expect(refusal).toMatchObject({ code: "justification_missing", faults: [{ path: "edits.0.body.justifications" }] });

    // The excess that a form claims is not believed: the server writes what the result says.
    const justifications = [{ code: "laminar-above-critical", text: "Quiet tunnel, measured.", excess: 1e9 }];
    const edit = { ...plate(ownerId, { ...laminar, justifications }), number: "060" };
    const proposalId = await proposed(tansy, clock, { edits: [edit] });
    await approves(ines, proposalId, "reviewer", clock);
    await approves(lusia, proposalId, "program_manager", clock);
    const line = (await newestBudget(CODE)).state.lines.find(({ kind, number }) => kind === "item" && number === "060");
    const kept = line?.kind === "item" ? line.body.justifications : [];
    expect(kept[0]?.excess).toBeGreaterThan(3);
    expect(kept[0]?.excess).toBeLessThan(4);

    const revised = (more: object) => [
      { ...edit, operation: "revise" as const, baseLetter: "–", body: { ...edit.body, justifications: kept, ...more } },
    ];
    await expect(proposed(tansy, clock, { edits: revised({ breadth: { value: 0.4 } }) })).resolves.toBeTypeOf("number");
    expect(await refusedWith(people, { edits: revised({ length: { value: 1.5 } }) })).toMatchObject({
      code: "justification_missing",
    });
  });

  it("refuses what has no result at an operating point", async () => {
    const people = await team();
    const edits = [plate(people.tansy.userId, { length: { value: 1e-5 } })];
    expect(await refusedWith(people, { edits })).toMatchObject({
      code: "evaluation_refused",
      faults: [{ path: "edits.0.body" }],
    });
  });

  it("refuses a stale copy, and a draft that was overtaken before it was ever submitted", async () => {
    const people = await team();
    const { tansy, fenno, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
    const edits = [revising("010", "–", tansy.userId, 0.49)];
    await saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
    const input = { proposalId, lockVersion: 0, key: formKey(), password: null };
    await expect(propose(tansy, input, clock)).rejects.toMatchObject({ code: "moved" });

    const other = await proposed(fenno, clock, { edits: [revising("010", "–", tansy.userId, 0.48)] });
    await approves(elske, other, "reviewer", clock);
    await expect(propose(tansy, { ...input, lockVersion: 1 }, clock)).rejects.toMatchObject({ code: "overtaken" });
  });

  it("stands on the newest issue when others were approved in between that do not overtake it", async () => {
    const people = await team();
    const { tansy, odo, fenno, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.3)], fenno);
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
    const edits = [revising("010", "–", tansy.userId, 0.49)];
    await saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
    const other = await proposed(odo, clock, { edits: [revising("020", "–", odo.userId, 0.29)] });
    await approves(elske, other, "reviewer", clock);
    await propose(tansy, { proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
    expect(await Round.findOne({ where: { proposalId } })).toMatchObject({ baseIssue: 3 });
  });
});

describe("who may edit what", () => {
  it("lets an owner edit their own items only, field by field of the draft, and a co-editor theirs", async () => {
    const people = await team();
    const { tansy, odo, fenno, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.3)], fenno);
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
    const mine = revising("010", "–", tansy.userId, 0.49);
    const theirs = revising("020", "–", odo.userId, 0.29);
    const save = (actor: typeof tansy, lockVersion: number, edits: (typeof mine)[]) =>
      saveDraft(actor, { proposalId, lockVersion, content: content({ edits }) }, clock);
    await expect(save(tansy, 0, [mine, theirs])).rejects.toMatchObject({ code: "forbidden" });
    await expect(save(odo, 0, [theirs])).rejects.toMatchObject({ code: "forbidden" });
    await shareDraft(tansy, { proposalId, userId: odo.userId }, clock);
    await save(tansy, 0, [mine]);
    await save(odo, 1, [mine, theirs]);
    const answer = await propose(tansy, { proposalId, lockVersion: 2, key: formKey(), password: null }, clock);
    expect(answer).toEqual({ key: "2", number: 2, round: 1 });
  });

  it("refuses an owner what only a program manager may: terms, finishes, operating points, other items", async () => {
    const people = await team();
    const { tansy, clock } = people;
    const { state } = await newestBudget(CODE);
    for (const line of state.lines.filter(({ kind }) => kind !== "allocations")) {
      const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
      const { kind, number, letter: baseLetter, body } = line;
      const edits = [editOf({ operation: "revise", kind, number, baseLetter, body })];
      const saved = saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
      await expect(saved, `${kind} ${number}`).rejects.toMatchObject({ code: "forbidden" });
    }
  });
});
