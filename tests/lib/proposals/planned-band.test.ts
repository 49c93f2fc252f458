import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { bandSide, plannedAt } from "@/lib/evaluation/budget/planned-profile";
import type { Clock } from "@/lib/vocabulary/clock";
import { OutboxMessage } from "@/models/outbox-message";
import { addItem, fixedItem, newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import { approvedItems, approves, CODE, editOf, proposed, team, type Team } from "./review-cycle";

withDatabase();

/** 60 N ± 5 N in March, falling to 40 N ± 5 N in April. */
const PROFILE = [
  { date: "2026-03-01", predictedHundredths: 6000, toleranceHundredths: 500 },
  { date: "2026-03-31", predictedHundredths: 4000, toleranceHundredths: 500 },
];

describe("the planned profile", () => {
  it("is a straight line between its dates, holds after the last one and is nothing before the first", () => {
    expect(plannedAt(PROFILE, "2026-02-28T23:59:59.999Z")).toBeNull();
    // Half of the thirty days from 60 N to 40 N.
    expect(plannedAt(PROFILE, "2026-03-16T00:00:00.000Z")).toEqual({ predicted: 5000, tolerance: 500 });
    expect(plannedAt(PROFILE, "2027-01-01T00:00:00.000Z")).toEqual({ predicted: 4000, tolerance: 500 });
    expect(plannedAt(PROFILE.toReversed(), "2026-03-16T00:00:00.000Z")).toEqual({ predicted: 5000, tolerance: 500 });
  });

  it("has its edges inside the band, to 0.01 N", () => {
    const at = "2026-03-16T00:00:00.000Z";
    expect([45, 44.99, 55, 55.01].map((newtons) => bandSide(PROFILE, at, newtons))).toEqual([
      "inside",
      "below",
      "inside",
      "above",
    ]);
    expect(bandSide([], at, 50)).toBeNull();
  });
});

/** An item of fixed newtons without growth: the predicted total is what is typed here. */
async function planned() {
  const people = await team();
  const { fenno, ines, lusia, clock } = people;
  const lamp = editOf(addItem("010", fixedItem(fenno.userId, 50)));
  await approvedItems(people, [lamp], fenno);
  const terms = (await newestBudget(CODE)).state.lines.find(({ kind }) => kind === "terms");
  const growthTable = Object.fromEntries(
    ["estimated", "layout", "preliminary", "released", "measured_like_part", "measured_actual"].map((grade) => [
      grade,
      0,
    ]),
  );
  const body = JSON.parse(JSON.stringify({ ...terms?.body, growthTable, plannedProfile: PROFILE }));
  const edit = { operation: "revise" as const, kind: "terms" as const, number: "TM", baseLetter: "–", body };
  const id = await proposed(fenno, clock, { edits: [edit] });
  await approves(ines, id, "reviewer", clock);
  await approves(lusia, id, "program_manager", clock);
  return people;
}

async function becomes(newtons: number, { fenno, ines, lusia }: Team, clock: Clock) {
  const line = (await newestBudget(CODE)).state.lines.find(({ kind }) => kind === "item");
  const body = editOf(addItem("010", fixedItem(fenno.userId, newtons))).body;
  const edit = {
    operation: "revise" as const,
    kind: "item" as const,
    number: "010",
    baseLetter: line?.letter ?? "",
    body,
  };
  const id = await proposed(fenno, clock, { edits: [edit] });
  const signed = await approves(ines, id, "reviewer", clock);
  if (signed.issue === null) await approves(lusia, id, "program_manager", clock);
}

async function notices(): Promise<{ issue: number; side: string; toUserId: number }[]> {
  const mails = await OutboxMessage.findAll({ where: { template: "left_planned_band" }, order: ["id"] });
  return mails
    .map(({ data, toUserId }) => ({ ...JSON.parse(data), toUserId }))
    .map(({ issue, side, toUserId }) => ({ issue, side, toUserId }));
}

const on = (day: string): Clock => {
  let moment = Date.parse(`${day}T08:00:00.000Z`);
  return () => new Date((moment += 1000));
};

describe("leaving the tolerance band", () => {
  it("is told once to each program manager; a further edit outside is not, leaving it after a return is", async () => {
    const people = await planned();
    const both = (issue: number, side: string) =>
      [people.fenno, people.lusia].map(({ userId: toUserId }) => ({ issue, side, toUserId }));
    // At noon of 1 March 60 N ± 5 N are planned, less two thirds of a newton a day.
    expect(await notices()).toEqual(both(3, "below"));
    await becomes(51, people, people.clock);
    expect(await notices()).toHaveLength(2);
    await becomes(60, people, people.clock);
    await becomes(62, people, people.clock);
    expect(await notices()).toHaveLength(2);
    await becomes(70, people, people.clock);
    expect(await notices()).toEqual([...both(3, "below"), ...both(7, "above")]);
    await becomes(72, people, people.clock);
    expect(await notices()).toHaveLength(4);

    const entries = (await historyPage({ chain: CODE, act: "leave_planned_band" })).rows;
    expect(entries.map(({ subjectLabel, now }) => [subjectLabel, now])).toEqual([
      [
        "TF-2 issue 7",
        expect.objectContaining({
          side: "above",
          operatingPoint: "OP-1",
          predictedNewtons: "70.00",
          toleranceNewtons: "5.00",
        }),
      ],
      ["TF-2 issue 3", expect.objectContaining({ side: "below", predictedNewtons: "50.00" })],
    ]);
    expect((await verifyChain(CODE)).faults).toEqual([]);
    expect(await invariantFaults()).toEqual([]);
  });

  it("is told when the plan has fallen away under a total that stayed, with the next issue", async () => {
    const people = await planned();
    await becomes(58, people, people.clock);
    const before = (await notices()).length;
    // On 31 March 40 N ± 5 N are planned.
    await becomes(57, people, on("2026-03-31"));
    expect((await notices()).slice(before)).toMatchObject([
      { issue: 5, side: "above" },
      { issue: 5, side: "above" },
    ]);
    await becomes(56, people, on("2026-04-02"));
    expect(await notices()).toHaveLength(before + 2);
  });
});
