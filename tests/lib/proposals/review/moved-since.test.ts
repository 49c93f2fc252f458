import { describe, expect, it } from "vitest";
import { noteSheetSeen } from "@/lib/proposals/reading/note-sheet-seen";
import { propose } from "@/lib/proposals/submitting/propose";
import { proposalView } from "@/lib/proposals/queries";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import type { DraftContent } from "@/lib/proposals/schema";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, approves, CODE, content, formKey, proposed, revising, team } from "../review-cycle";

withDatabase();

const KEY = "2";
const REASON = "The mirror is smaller.\nSee the drawing.";

async function submitted() {
  const people = await team();
  const { tansy, fenno, clock } = people;
  await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", tansy.userId, 0.3)], fenno);
  const edits = [revising("010", "–", tansy.userId, 0.45)];
  const proposalId = await proposed(tansy, clock, { title: "Smaller mirror", reason: REASON, edits });
  const nextRound = async (lockVersion: number, more: Partial<DraftContent>) => {
    const typed = content({ title: "Smaller mirror", reason: REASON, edits, ...more });
    await saveDraft(tansy, { proposalId, lockVersion, content: typed }, clock);
    await propose(tansy, { proposalId, lockVersion: lockVersion + 1, key: formKey(), password: null }, clock);
  };
  return { ...people, proposalId, nextRound };
}

/** Opens the sheet, as its page does. */
async function looks(actor: Actor, clock: Clock) {
  const view = await proposalView(actor, CODE, KEY, undefined, clock);
  if (!view) throw new Error("no sheet");
  return noteSheetSeen(actor, view, clock);
}

describe("moved since my last look", () => {
  it("says nothing on a first look, and on the next that nothing moved", async () => {
    const { ines, clock } = await submitted();
    const later = new Date(Date.parse("2026-04-01T08:00:00.000Z"));
    expect(await looks(ines, clock)).toBeNull();
    expect(await looks(ines, clock)).toBeNull();
    expect(await looks(ines, () => later)).toMatchObject({
      fields: [],
      sentences: [],
      reason: null,
      signingText: null,
    });
  });

  it("marks the fields that the next round changed, with what they said, and tells what else moved", async () => {
    const { tansy, ines, elske, clock, nextRound } = await submitted();
    await looks(ines, clock);
    await nextRound(2, {
      reason: "The mirror is smaller.\nSee drawing 7731.",
      edits: [revising("010", "–", tansy.userId, 0.4), revising("020", "–", tansy.userId, 0.29)],
    });

    const moved = await looks(ines, clock);
    expect(moved?.round).toBe(1);
    expect(moved?.fields).toEqual([{ kind: "item", number: "010", field: "dragCoefficient", saw: "0.45" }]);
    expect(moved?.sentences).toEqual([
      "Round 2 was submitted; you saw round 1.",
      "Item 020 Mirror was not part of it.",
      // 382.8 Pa (ISO 2533) on 0.1 m² with 20 % growth is 45.94 N per unit of C_D.
      "Its effect was OP-1 −2.30\u2009N on issue 2; it is OP-1 −5.05\u2009N on issue 2.",
    ]);
    expect(moved?.reason?.rows).toEqual([
      { side: "both", text: "The mirror is smaller." },
      { side: "was", text: "See the drawing." },
      { side: "toBe", text: "See drawing 7731." },
    ]);
    expect(moved?.signingText?.rows?.some(({ side, text }) => side === "was" && text.includes("0.45"))).toBe(true);
    // A reader who was not there before has nothing to be told.
    expect(await looks(elske, clock)).toBeNull();
  });

  it("keeps the marks while the reader reads on, and takes them away at the next visit", async () => {
    const { tansy, ines, clock, nextRound } = await submitted();
    await looks(ines, clock);
    await nextRound(2, { edits: [revising("010", "–", tansy.userId, 0.4)] });

    expect((await looks(ines, clock))?.fields).toHaveLength(1);
    expect((await looks(ines, clock))?.fields).toHaveLength(1);
    const tomorrow = new Date(clock().getTime() + 24 * 60 * 60_000);
    expect((await looks(ines, () => tomorrow))?.fields).toEqual([]);
  });

  it("tells that today's issue moved under an unchanged round", async () => {
    const { tansy, ines, clock } = await submitted();
    await looks(ines, clock);
    const other = await proposed(tansy, clock, { edits: [revising("020", "–", tansy.userId, 0.29)] });
    await approves(ines, other, "reviewer", clock);

    expect(await looks(ines, clock)).toMatchObject({
      fields: [],
      sentences: ["Its effect was OP-1 −2.30\u2009N on issue 2; it is OP-1 −2.30\u2009N on issue 3."],
    });
  });
});
