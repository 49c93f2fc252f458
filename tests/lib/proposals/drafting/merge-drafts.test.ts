import { describe, expect, it } from "vitest";
import { asStored, mergeDrafts } from "@/lib/proposals/drafting/merge-drafts";
import type { DraftContent } from "@/lib/proposals/schema";
import { adding, content, editOf } from "../review-cycle";

const mirror = adding("010", 1, 0.5, { name: "Mirror" });
const base = content({ title: "Round it", edits: [mirror] });

function withBody(change: object, from: DraftContent = base): DraftContent {
  const [edit = mirror] = from.edits;
  return { ...from, edits: [editOf({ ...edit, body: { ...edit.body, ...change } })] };
}

describe("what two editors made of one saved draft", () => {
  it("comes together by itself where each changed another field", () => {
    const theirs = { ...withBody({ name: "Mirror, left" }), reason: "Measured again." };
    const mine = { ...withBody({ dragCoefficient: 0.4 }), title: "Round the mirror" };
    const { content: merged, conflicts } = mergeDrafts(base, theirs, mine, new Map());
    expect(conflicts).toEqual([]);
    expect(merged).toMatchObject({ title: "Round the mirror", reason: "Measured again." });
    expect(merged.edits[0]?.body).toMatchObject({ name: "Mirror, left", dragCoefficient: 0.4 });
  });

  it("is shown with both values where both changed one field, and takes what is chosen", () => {
    const theirs = withBody({ dragCoefficient: 0.45 });
    const mine = withBody({ dragCoefficient: 0.4 });
    const key = "item 010 dragCoefficient";
    const { content: merged, conflicts } = mergeDrafts(base, theirs, mine, new Map());
    expect(conflicts).toEqual([
      { key, line: { kind: "item", number: "010" }, field: "dragCoefficient", mine: 0.4, theirs: 0.45 },
    ]);
    expect(merged.edits[0]?.body?.["dragCoefficient"]).toBe(0.45);
    const chosen = mergeDrafts(base, theirs, mine, new Map([[key, "mine"]]));
    expect(chosen.content.edits[0]?.body?.["dragCoefficient"]).toBe(0.4);
  });

  it("asks about a line that one took out and the other changed, and follows whoever alone touched it", () => {
    const without = { ...base, edits: [] };
    const changed = withBody({ dragCoefficient: 0.4 });
    expect(mergeDrafts(base, without, base, new Map()).content.edits).toEqual([]);
    const { content: merged, conflicts } = mergeDrafts(base, without, changed, new Map());
    expect(conflicts.map(({ key, field }) => [key, field])).toEqual([["item 010", null]]);
    expect(merged.edits).toEqual([]);
    const kept = mergeDrafts(base, without, changed, new Map([["item 010", "mine"]]));
    expect(kept.content.edits[0]?.body?.["dragCoefficient"]).toBe(0.4);
  });

  it("keeps lines that either of them added, and sees no conflict in the same change made twice", () => {
    const theirs = { ...base, edits: [mirror, adding("020", 1, 0.1)] };
    const mine = { ...base, title: "Both", edits: [mirror, adding("030", 1, 0.2)] };
    const { content: merged, conflicts } = mergeDrafts(base, { ...theirs, title: "Both" }, mine, new Map());
    expect(conflicts).toEqual([]);
    expect(merged.edits.map(({ number }) => number)).toEqual(["010", "020", "030"]);
  });

  it("takes a text as the server keeps it: blanks at its ends are no change", () => {
    expect(asStored({ ...base, title: "Round it  " })).toEqual(base);
  });
});
