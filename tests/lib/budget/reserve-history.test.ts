import { describe, expect, it } from "vitest";
import { budgetAt } from "@/lib/budget/queries";
import { reserveHistory, type ReserveMove } from "@/lib/budget/reserve-history";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import type { Actor } from "@/lib/vocabulary/actor";
import { addItem, approve, bluffItem, establish, firstPoint } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { person, withRole } from "@/tests/support/people";
import { cast, type Cast, ISSUE_1, ISSUE_2, ISSUE_3 } from "@/tests/support/three-issues";

withDatabase();

const ISSUE_4 = "2026-04-02T09:00:00.000Z";
const ISSUE_5 = "2026-04-20T09:00:00.000Z";

const reserveOf = (letter: string, hundredths: number, more: { at: string; hundredths: number }[] = []): LineEdit => ({
  operation: "revise",
  kind: "terms",
  number: "TM",
  baseLetter: letter,
  body: {
    ...newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: hundredths }),
    reserves: [{ at: "OP-1", hundredths }, ...more].map((row) => ({
      operatingPoint: row.at,
      hundredths: row.hundredths,
    })),
  },
});

/** Limit 100 N and reserve 10 N at first; 2.5 N drawn in issue 2, nothing in 3, 1 N added in 4. */
async function drawnAndAdded({ ines, lusia, tansy }: Cast): Promise<Actor> {
  const fenno = await withRole(await person("Fenno Drib"), "TF-2", "program_manager");
  await establish(lusia, "TF-2", ISSUE_1);
  const both = [
    [ines, "reviewer"],
    [lusia, "program_manager"],
  ] as const;
  const draw = { proposer: fenno, signers: both, title: "Draw for the mirrors" };
  await approve("TF-2", ISSUE_2, { ...draw, edits: [reserveOf("–", 750)] });
  const item = addItem("010", bluffItem(tansy.userId, 0.5, 0.2));
  await approve("TF-2", ISSUE_3, { proposer: tansy, signers: both, edits: [item] });
  await approve("TF-2", ISSUE_4, { ...draw, title: "Back into the reserve", edits: [reserveOf("A", 850)] });
  return fenno;
}

const figures = ({ issue, before, change, balance }: ReserveMove) => [issue.number, before, change, balance];

describe("the reserve and its history", () => {
  it("lists each issue that drew on it or added to it, with reason and signatures, and leaves out the others", async () => {
    const people = await cast();
    await drawnAndAdded(people);
    const [reference] = await reserveHistory(people.ines, "TF-2", 4);
    expect(reference).toMatchObject({ operatingPoint: "OP-1", isReference: true, balance: 850 });
    // By hand: 10.00, less 2.50, plus 1.00.
    expect(reference?.moves.map(figures)).toEqual([
      [1, null, 1000, 1000],
      [2, 1000, -250, 750],
      [4, 750, 100, 850],
    ]);
    expect(reference?.moves[0]).toMatchObject({ reason: null, issue: { proposal: null } });
    expect(reference?.moves[1]).toMatchObject({
      reason: "For the test",
      isStated: true,
      issue: {
        proposal: { title: "Draw for the mirrors", proposer: { name: "Fenno Drib" } },
        signatures: [{ printedName: "Ines Maat" }, { printedName: "Lusia Brand" }],
      },
    });
  });

  it("chains: every balance is where the next begins, and the last one is today's reserve and part of the limit", async () => {
    const people = await cast();
    await drawnAndAdded(people);
    const [reference] = await reserveHistory(people.ines, "TF-2", 4);
    const moves = reference?.moves ?? [];
    for (const [at, { before, change, balance }] of moves.entries()) {
      expect(before).toBe(moves[at - 1]?.balance ?? null);
      expect((before ?? 0) + change).toBe(balance);
    }
    const { allocations } = await budgetAt(people.ines, "TF-2", "newest");
    expect(moves.at(-1)?.balance).toBe(allocations.reserveHundredths);
    // 100.00 = nothing allocated + 91.50 unallocated + 8.50 reserve: what was drawn and not given back is unallocated.
    expect(allocations).toMatchObject({ unallocatedHundredths: 9150, isConserved: true });
  });

  it("ends where an earlier issue ended when that is asked for", async () => {
    const people = await cast();
    await drawnAndAdded(people);
    const [reference] = await reserveHistory(people.lusia, "TF-2", 3);
    expect(reference).toMatchObject({ balance: 750 });
    expect(reference?.moves.map(({ issue }) => issue.number)).toEqual([1, 2]);
  });

  it("tells a reserve that scales with the limit from one that the terms name", async () => {
    const people = await cast();
    const fenno = await drawnAndAdded(people);
    const winter: LineEdit = {
      operation: "add",
      kind: "operating_point",
      number: "OP-2",
      baseLetter: null,
      body: { ...firstPoint(20000), name: "Winter" },
    };
    const signers = [
      [people.ines, "reviewer"],
      [people.lusia, "program_manager"],
    ] as const;
    await approve("TF-2", ISSUE_5, { proposer: fenno, signers, edits: [winter] });
    const named = [reserveOf("B", 850, [{ at: "OP-2", hundredths: 500 }])];
    await approve("TF-2", "2026-05-02T09:00:00.000Z", { proposer: fenno, signers, edits: named });
    const histories = await reserveHistory(people.ines, "TF-2", 6);
    expect(histories.map(({ operatingPoint }) => operatingPoint)).toEqual(["OP-1", "OP-2"]);
    expect(histories[0]?.moves).toHaveLength(3);
    // 8.50 N of 100 N, at a limit of 200 N: 17.00 N; then 5.00 N by name.
    expect(histories[1]?.moves.map(figures)).toEqual([
      [5, null, 1700, 1700],
      [6, 1700, -1200, 500],
    ]);
    expect(histories[1]?.moves.map(({ isStated }) => isStated)).toEqual([false, true]);
  });

  it("is for those who may read the budget", async () => {
    const people = await cast();
    await drawnAndAdded(people);
    const stranger = await person("Someone Else");
    await expect(reserveHistory(stranger, "TF-2", 4)).rejects.toMatchObject({ code: "forbidden" });
  });
});
