import { describe, expect, it } from "vitest";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { editorView } from "@/lib/proposals/reading/editor-view";
import { previewProposal } from "@/lib/proposals/review/preview-proposal";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import type { Actor } from "@/lib/vocabulary/actor";
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
  type Content,
  type Team,
} from "./review-cycle";

withDatabase();

const unallocated = { kind: "unallocated" as const, number: null };
const evidence = [{ document: "Record 12", revision: "A", date: "2026-02-10" }];

/** Changes that set off one rule each, on lines of their own, so that any two stand in one proposal; new ones are numbered by the time. */
function changes({ tansy }: Team, time: number): Record<string, Content> {
  const item = (number: string, coefficient: number, more: object = {}) =>
    revising(number, "–", tansy.userId, coefficient, more);
  const winter = { ...newOperatingPoint(), name: "Winter", staticTemperature: { value: 258.15 }, speed: { value: 10 } };
  return {
    reviewer: { edits: [item("010", 0.099)] },
    addOrRetire: { edits: [adding(String(100 + time), tansy.userId, 0.01)] },
    operatingPointState: {
      edits: [
        editOf({ operation: "add", kind: "operating_point", number: `OP-${2 + time}`, baseLetter: null, body: winter }),
      ],
    },
    allocations: { transfers: [{ giver: unallocated, receiver: { kind: "item", number: "020" }, hundredths: 10 }] },
    gradeSteps: { edits: [item("030", 0.1, { grade: "preliminary", evidence })] },
    measuredGrade: { edits: [item("040", 0.1, { grade: "measured_like_part", evidence })] },
    // 382.8 Pa on 0.1 m² with 20 % growth: 1.38 N more of a limit of 100 N.
    predictedRisePercent: { edits: [item("050", 0.13)] },
    // 0.92 N more; 0.46 N of the same item were approved within 30 days.
    thirtyDays: { edits: [revising("060", "A", tansy.userId, 0.13)] },
  };
}

async function withItems() {
  const people = await team();
  const { tansy, ines, fenno, clock } = people;
  const numbers = ["010", "020", "030", "040", "050", "060"];
  await approvedItems(
    people,
    numbers.map((number) => adding(number, tansy.userId, 0.1)),
    fenno,
  );
  const slice = await proposed(tansy, clock, { edits: [revising("060", "–", tansy.userId, 0.11)] });
  await approves(ines, slice, "reviewer", clock);
  return people;
}

/** What the editor of the draft shows as to be signed, and what the round then asks for. */
async function shownAndAsked(actor: Actor, { clock }: Team, more: Content, between?: () => Promise<unknown>) {
  const { proposalId } = await startDraft(actor, { productCode: CODE, title: "", key: formKey() }, clock);
  await saveDraft(actor, { proposalId, lockVersion: 0, content: content(more) }, clock);
  await between?.();
  const { draft, budget, routing } = await editorView(actor, CODE, `draft-${proposalId}`, clock);
  const shown = previewProposal(budget, draft.content, routing).routing;
  await propose(actor, { proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
  return { shown, asked: (await reviewOf(proposalId, clock)).required };
}

describe("the routing shown before submission", () => {
  it("is what the submitted round asks for, of every change alone and of every pair, with the 30-day sum", async () => {
    const people = await withItems();
    const names = Object.keys(changes(people, 0));
    const pairs = names.flatMap((one, at) => names.slice(at).map((other) => [one, other] as const));
    const rules = new Set<string>();
    for (const [time, [one, other]] of pairs.entries()) {
      const made = changes(people, time);
      const parts = [...new Set([one, other])].map((name) => made[name] ?? {});
      // A program manager edits any line; what they only transfer they would sign by submitting.
      const plain = parts.some(({ edits }) => edits) ? [] : (made.reviewer?.edits ?? []);
      const { shown, asked } = await shownAndAsked(people.fenno, people, {
        title: `${one} and ${other}`,
        edits: [...parts.flatMap(({ edits }) => edits ?? []), ...plain],
        transfers: parts.flatMap(({ transfers }) => transfers ?? []),
      });
      expect(asked, `${one} and ${other}`).toEqual(shown);
      const found = asked.flatMap(({ reasons }) => reasons.map(({ rule }) => rule));
      if (one === "thirtyDays" && other === one) expect(found).toEqual(["reviewer", "predictedRisePercent"]);
      found.forEach((rule) => rules.add(rule));
    }
    expect([...rules].sort()).toEqual([
      "addOrRetire",
      "allocations",
      "gradeSteps",
      "measuredGrade",
      "operatingPointState",
      "predictedRisePercent",
      // 20 % to 10 % and 20 % to 3 % of 3.83 N each: together 1.03 N of growth are released.
      "releasedGrowthPercent",
      "reviewer",
    ]);
  }, 240_000);

  it("is that of today's issue, also where it moved since the draft was begun", async () => {
    const people = await withItems();
    const { tansy, ines, fenno, lusia, clock } = people;
    // 0.61 · 45.94 N are 28.0 N; 1.36 more predict 90.5 N of 100 N, into the reserve of 10 N: every rise worsens that.
    const filling = async () => {
      const other = await proposed(fenno, clock, { edits: [adding("080", tansy.userId, 1.36)] });
      await approves(ines, other, "reviewer", clock);
      await approves(lusia, other, "program_manager", clock);
    };
    const { shown, asked } = await shownAndAsked(
      tansy,
      people,
      { edits: [revising("010", "–", tansy.userId, 0.101)] },
      filling,
    );
    expect(asked).toEqual(shown);
    expect(asked.flatMap(({ reasons }) => reasons.map(({ rule }) => rule))).toEqual(["reviewer", "standingWorse"]);
  });
});
