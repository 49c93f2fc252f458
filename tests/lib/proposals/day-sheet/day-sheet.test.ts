import { describe, expect, it, vi } from "vitest";
import { daySheet } from "@/lib/proposals/day-sheet/day-sheet";
import { marginShare } from "@/lib/proposals/review/margin-share";
import { nameDeputy } from "@/lib/products/name-deputy";
import { noteVisit } from "@/lib/proposals/records/visits";
import { waitingCount } from "@/lib/proposals/day-sheet/waiting-count";
import { inWaitingOrder } from "@/lib/proposals/day-sheet/waiting-order";
import { database } from "@/models/database";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, approves, CODE, proposed, revising, team } from "../review-cycle";

withDatabase();

// Air at 15 °C and 25 m/s: q = 0.5 · 1.225 · 625 = 382.8 Pa (ISO 2533); A = 0.1 m²; growth 20 % (estimated).
const PREDICTED_PER_CD = 382.8 * 0.1 * 1.2;

describe("what waits on the day sheet", () => {
  it("comes by the day on which it is needed, or by the share of the margin that it takes", async () => {
    const people = await team();
    const { tansy, ines, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", tansy.userId, 0.3)]);
    const small = { edits: [revising("010", "–", tansy.userId, 0.505)], neededBy: "2026-05-01" };
    const large = { edits: [revising("020", "–", tansy.userId, 0.32)], neededBy: "2026-06-01" };
    const first = await proposed(tansy, clock, large);
    const second = await proposed(tansy, clock, small);
    const third = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });

    const idsBy = async (order: "needed" | "margin") =>
      (await daySheet(ines, clock, order)).waitsForMe.map(({ proposalId }) => proposalId);
    expect(await idsBy("needed")).toEqual([second, first, third]);
    expect(await idsBy("margin")).toEqual([first, second, third]);

    const [, entry] = (await daySheet(ines, clock)).waitsForMe;
    // Limit 100 N; 0.8 of C_D is there already.
    const marginWas = 100 - 0.8 * PREDICTED_PER_CD;
    expect(entry?.margin?.marginWas).toBeCloseTo(marginWas, 1);
    expect(marginShare(entry?.margin ?? null)).toBeCloseTo((0.02 * PREDICTED_PER_CD) / marginWas, 3);
  });

  it("puts first what takes margin where none is left, and last what takes nothing or has no date", () => {
    const entry = (neededBy: string | null, predictedDelta: number, marginWas: number) => {
      return { neededBy, since: "2026-01-01", margin: { operatingPoint: "OP-1", predictedDelta, marginWas } };
    };
    const over = entry(null, 0.1, -2);
    const quarter = entry("2026-03-01", 1, 4);
    const saving = entry("2026-02-01", -5, 1);
    expect(inWaitingOrder([saving, quarter, over], "margin")).toEqual([over, quarter, saving]);
    expect(inWaitingOrder([over, quarter, saving], "needed")).toEqual([saving, quarter, over]);
  });
});

describe("the reader's items", () => {
  it("say what became of each since the last visit", async () => {
    const people = await team();
    const { tansy, ines, lusia, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", tansy.userId, 0.3)]);
    await noteVisit(tansy, () => new Date(clock()));
    const later = (minutes: number) => () => new Date(clock().getTime() + minutes * 60_000);
    const change = [revising("010", "–", tansy.userId, 0.49), adding("030", tansy.userId, 0.1)];
    const proposalId = await proposed(tansy, clock, { edits: change });
    await approves(ines, proposalId, "reviewer", clock);
    await approves(lusia, proposalId, "program_manager", clock);
    await noteVisit(tansy, later(45));

    const { myItems } = await daySheet(tansy, later(46));
    expect(myItems.map(({ number, since }) => [number, since])).toEqual([
      ["010", { letterWas: "–", predictedDelta: expect.closeTo(-0.01 * PREDICTED_PER_CD, 2), allocationDelta: 0 }],
      ["020", null],
      ["030", { letterWas: null, predictedDelta: null, allocationDelta: null }],
    ]);
  });
});

describe("the count in the head of every page", () => {
  it("is what the day sheet lists, is read from memory while nothing happened, and follows the next act", async () => {
    const people = await team();
    const { tansy, ines, elske, lusia } = people;
    const moment = new Date("2026-04-01T09:00:00.000Z");
    const clock = () => moment;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const proposalId = await proposed(tansy, people.clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    expect(await waitingCount(ines, clock)).toBe(1);
    expect((await daySheet(ines, clock)).waitsForMe).toHaveLength(1);

    const queries = vi.spyOn(database, "query");
    expect(await waitingCount(ines, clock)).toBe(1);
    expect(queries.mock.calls.filter(([sql]) => String(sql).includes("proposals"))).toEqual([]);
    queries.mockRestore();

    await approves(elske, proposalId, "reviewer", people.clock);
    expect(await waitingCount(ines, clock)).toBe(0);

    const pending = await proposed(tansy, people.clock, { edits: [adding("020", tansy.userId, 0.2)] });
    expect(pending).toBeGreaterThan(proposalId);
    const named = { productCode: CODE, deputyId: ines.userId, fromDay: "2026-04-02", untilDay: "2026-04-03" };
    await nameDeputy(lusia, named, clock);
    expect(await waitingCount(ines, clock)).toBe(1);
    // Midnight in Amsterdam (UTC + 2 h in summer): from then on she may sign for Lusia too.
    expect(await waitingCount(ines, () => new Date("2026-04-01T22:00:00.000Z"))).toBe(2);
  });
});
