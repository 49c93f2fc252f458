import { copyFileSync } from "node:fs";
import { QueryTypes } from "sequelize";
import { describe, expect, it } from "vitest";
import { allocationsOf } from "@/lib/evaluation/budget/indexed-state";
import { carryForward } from "@/lib/proposals/submitting/carry-forward";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { whatIfView, type WhatIfView } from "@/lib/proposals/reading/what-if";
import type { Actor } from "@/lib/vocabulary/actor";
import { closeDatabase, database, openDatabase } from "@/models/database";
import { Proposal } from "@/models/proposal";
import { newestBudget, addItem, shareItem } from "@/tests/support/budget-on-file";
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
  reviewOf,
  revising,
  team,
  type Team,
} from "../review-cycle";

withDatabase();

const unallocated = { kind: "unallocated" as const, number: null };
const item = (number: string) => ({ kind: "item" as const, number });

/** Two bodies and a share of the first, of 100 N with a reserve of 10 N; nothing is allocated. */
async function withItems(): Promise<Team> {
  const people = await team();
  const { tansy, odo, fenno } = people;
  const share = editOf(addItem("030", shareItem(tansy.userId, 0.2, ["010"])));
  await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.3), share], fenno);
  return people;
}

async function drafted({ clock }: Team, actor: Actor, edits: Parameters<typeof content>[0]["edits"]) {
  const { proposalId } = await startDraft(actor, { productCode: CODE, title: "", key: formKey() }, clock);
  await saveDraft(actor, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
  return proposalId;
}

const seen = async (actor: Actor, ...keys: string[]): Promise<WhatIfView> => {
  const view = await whatIfView(actor, CODE, keys);
  if (!view) throw new Error("not established");
  return view;
};

/** Signs what is asked for, by two who own nothing of it. */
async function approveTruly(people: Team, proposalId: number) {
  const { ines, lusia, clock } = people;
  const { required } = await reviewOf(proposalId, clock);
  for (const { capacity } of required)
    await approves(capacity === "reviewer" ? ines : lusia, proposalId, capacity, clock);
}

async function everyRow(): Promise<unknown> {
  const select = { type: QueryTypes.SELECT } as const;
  const tables = await database.query<{ name: string }>("SELECT name FROM sqlite_master WHERE type = 'table'", select);
  const rows: unknown[] = [];
  for (const { name } of tables) rows.push([name, await database.query(`SELECT * FROM ${name}`, select)]);
  return rows;
}

/** Runs the work on a copy of the database file and comes back to the original. */
async function onCopy<T>(work: () => Promise<T>): Promise<T> {
  const [main] = await database.query<{ file: string }>("PRAGMA database_list", { type: QueryTypes.SELECT });
  const file = main?.file ?? "";
  await closeDatabase();
  copyFileSync(file, `${file}-copy`);
  await openDatabase(`${file}-copy`);
  const answer = await work();
  await closeDatabase();
  await openDatabase(file);
  return answer;
}

/** What the sheet says of a budget, from the stored rows of an issue. */
async function stored() {
  const { state, results } = await newestBudget(CODE);
  const { rows, unallocatedHundredths } = allocationsOf(state);
  return {
    points: results.points.map(({ operatingPoint, totals, standing }) => ({ operatingPoint, totals, standing })),
    items: new Map(
      results.points.flatMap(({ operatingPoint, items }) =>
        items.map(({ item: number, predicted }) => [`${operatingPoint} ${number}`, predicted] as const),
      ),
    ),
    allocations: new Map([
      ...rows.map(({ number, hundredths }) => [number, hundredths] as const),
      ["Unallocated", unallocatedHundredths] as const,
    ]),
  };
}

describe("what a set of proposals would do together", () => {
  it("equals truly approving that set on a copy, and touches nothing", async () => {
    const people = await withItems();
    const { tansy, fenno, clock } = people;
    const first = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.45)] });
    const second = await proposed(fenno, clock, { edits: [revising("010", "–", tansy.userId, 0.5, { name: "Wing" })] });
    const transfers = [{ giver: unallocated, receiver: item("010"), hundredths: 2500 }];
    const third = await proposed(tansy, clock, { transfers });
    const draft = await drafted(people, tansy, [adding("040", tansy.userId, 0.2)]);
    const [before, rows] = [await stored(), await everyRow()];

    const view = await seen(tansy, "2", "3", "4", `draft-${draft}`);
    expect(view.steps.map(({ issue, conflicts }) => [issue, conflicts])).toEqual([
      [3, []],
      [4, []],
      [5, []],
      [6, []],
    ]);
    expect(view.steps[1]?.carried).toEqual(["Item 010 has a new revision, A, since issue 3 (TF-2-CP-02)."]);
    expect(await everyRow()).toEqual(rows);

    const after = await onCopy(async () => {
      await approveTruly(people, first);
      const { lockVersion } = await Proposal.findByPk(second, { rejectOnEmpty: true });
      const carried = { proposalId: second, lockVersion, ontoIssue: 3, settled: [], key: formKey() };
      await carryForward(fenno, carried, clock);
      await approveTruly(people, second);
      await approveTruly(people, third);
      const own = await Proposal.findByPk(draft, { rejectOnEmpty: true });
      const later = { proposalId: draft, lockVersion: own.lockVersion, ontoIssue: 5, settled: [], key: formKey() };
      await carryForward(tansy, later, clock);
      await propose(
        tansy,
        { proposalId: draft, lockVersion: own.lockVersion + 1, key: formKey(), password: null },
        clock,
      );
      await approveTruly(people, draft);
      return stored();
    });

    expect(await stored()).toEqual(before);
    expect(
      view.effect?.points.map(({ operatingPoint, now }) => ({
        ...{ operatingPoint, basic: now?.basic, predicted: now?.predicted },
        ...{ margin: now?.margin, standing: now?.standing },
      })),
    ).toEqual(
      after.points.map(({ operatingPoint, totals: { basic, predicted, margin }, standing }) => ({
        ...{ operatingPoint, basic, predicted, margin, standing },
      })),
    );
    const shown = [...(view.effect?.edited ?? []), ...(view.effect?.followers ?? [])];
    expect(
      new Map([
        ...before.items,
        ...shown.map((each) => [`${each.operatingPoint} ${each.item}`, each.predictedNow] as const),
      ]),
    ).toEqual(after.items);
    expect(shown.find(({ item: number }) => number === "030")?.delta).toBeLessThan(0);
    const [allocated, free] = [after.allocations.get("010"), after.allocations.get("Unallocated")];
    expect(view.allocations).toEqual([
      { name: "010 Wing", was: null, toBe: allocated },
      { name: "Unallocated", was: before.allocations.get("Unallocated"), toBe: free },
    ]);
  }, 120_000);

  it("leaves out a proposal that changes the same field, and names field, line, values and the other proposal", async () => {
    const people = await withItems();
    const { tansy, fenno, clock } = people;
    await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.45)] });
    await proposed(fenno, clock, { edits: [revising("010", "–", tansy.userId, 0.4)] });

    const both = await seen(tansy, "3", "2");
    expect(both.steps).toMatchObject([
      { label: "TF-2-CP-02", issue: 3, conflicts: [] },
      {
        label: "TF-2-CP-03",
        issue: null,
        conflicts: ["TF-2-CP-02 and TF-2-CP-03 both change “Drag coefficient” of item 010: 0.45 there, 0.4 here."],
      },
    ]);
    const [alone, other] = [await seen(tansy, "2"), await seen(tansy, "3")];
    expect(both.effect?.points).toEqual(alone.effect?.points);
    expect(other.steps).toMatchObject([{ issue: 3, conflicts: [] }]);
    expect(other.effect?.points[0]?.predictedDelta).toBeLessThan(alone.effect?.points[0]?.predictedDelta ?? 0);
  });

  it("names the giver and the newtons where two transfers together ask for more than is there", async () => {
    const { tansy, odo, clock } = await withItems();
    const from = (receiver: string, hundredths: number) => ({
      transfers: [{ giver: unallocated, receiver: item(receiver), hundredths }],
    });
    await proposed(tansy, clock, from("010", 5000));
    await proposed(odo, clock, from("020", 4100));
    expect((await seen(odo, "3")).steps).toMatchObject([{ issue: 3, conflicts: [] }]);
    expect((await seen(odo, "2", "3")).steps[1]).toMatchObject({
      issue: null,
      conflicts: [expect.stringMatching(/^Unallocated would have to give 1\.00\sN more than it holds\.$/)],
    });
  });

  it("leaves out retiring an item that another proposal of the set begins to refer to", async () => {
    const people = await withItems();
    const { fenno, lusia, clock } = people;
    const share = editOf(addItem("050", shareItem(fenno.userId, 0.1, ["020"])));
    await proposed(fenno, clock, { edits: [share] });
    const retiring = {
      operation: "retire" as const,
      kind: "item" as const,
      number: "020",
      baseLetter: "–",
      body: null,
    };
    await proposed(lusia, clock, { edits: [retiring] });
    expect((await seen(lusia, "3")).steps).toMatchObject([{ issue: 3, conflicts: [] }]);
    const [, second] = (await seen(lusia, "2", "3")).steps;
    expect(second?.issue).toBeNull();
    expect(second?.conflicts.join(" ")).toMatch(/050/);
  });

  it("lists drafts to their editors only, and ignores what a reader may not see or what is not there", async () => {
    const people = await withItems();
    const { tansy, odo, maud } = people;
    const draft = await drafted(people, tansy, [revising("010", "–", tansy.userId, 0.45)]);
    expect((await seen(tansy, `draft-${draft}`)).candidates).toMatchObject([{ key: `draft-${draft}`, isTicked: true }]);
    for (const actor of [odo, maud]) {
      expect(await seen(actor, `draft-${draft}`, "99")).toMatchObject({ candidates: [], steps: [], effect: null });
    }
    await expect(whatIfView({ ...odo, memberships: [] }, CODE, [])).rejects.toMatchObject({ code: "forbidden" });
  });
});
