import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { editorView } from "@/lib/proposals/reading/editor-view";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { unshareDraft } from "@/lib/proposals/drafting/unshare-draft";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, CODE, content, formKey, revising, team } from "./review-cycle";

withDatabase();

async function sharedDraft() {
  const people = await team();
  const { tansy, lusia, clock } = people;
  const { proposalId, key } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
  const edits = [adding("010", tansy.userId, 0.5)];
  await saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
  await shareDraft(tansy, { proposalId, userId: lusia.userId }, clock);
  return { ...people, proposalId, key };
}

describe("two drafts that touch the same line", () => {
  it("warn each other as soon as they are saved; whose a draft is stays untold until it is proposed", async () => {
    const people = await team();
    const { tansy, fenno, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)], fenno);
    const drafted = async (actor: typeof tansy, coefficient: number) => {
      const { proposalId, key } = await startDraft(actor, { productCode: CODE, title: "", key: formKey() }, clock);
      const edits = [revising("010", "–", tansy.userId, coefficient)];
      const saved = await saveDraft(actor, { proposalId, lockVersion: 0, content: content({ edits }) }, clock);
      return { proposalId, key, elsewhere: saved.outcome === "saved" ? saved.touchedElsewhere : null };
    };
    const first = await drafted(tansy, 0.49);
    const second = await drafted(fenno, 0.48);
    const warning = { line: { kind: "item", number: "010", name: "Mirror" }, by: null, state: "draft", number: null };
    expect([first.elsewhere, second.elsewhere]).toEqual([[], [warning]]);
    expect((await editorView(tansy, CODE, first.key, clock)).draft.touchedElsewhere).toEqual([warning]);

    await propose(tansy, { proposalId: first.proposalId, lockVersion: 1, key: formKey(), password: null }, clock);
    expect((await editorView(fenno, CODE, second.key, clock)).draft.touchedElsewhere).toEqual([
      { ...warning, by: { id: tansy.userId, name: "Tansy Owner" }, state: "proposed", number: 2 },
    ]);
  });
});

describe("a shared draft", () => {
  it("says of each field who changed it last, and of each line who put it in", async () => {
    const { tansy, lusia, clock, proposalId, key } = await sharedDraft();
    const edits = [adding("010", tansy.userId, 0.4), adding("020", tansy.userId, 0.1)];
    await saveDraft(lusia, { proposalId, lockVersion: 1, content: content({ edits }) }, clock);
    const { draft } = await editorView(tansy, CODE, key, clock);
    expect(draft.touched.map(({ line, field, by }) => [line, field, by.name])).toEqual([
      ["item 010", "", "Tansy Owner"],
      ["item 010", "dragCoefficient", "Lusia Manager"],
      ["item 020", "", "Lusia Manager"],
    ]);
  });

  it("answers a save on an older state with what is stored and who changed it, and overwrites nothing", async () => {
    const { tansy, lusia, clock, proposalId } = await sharedDraft();
    const save = (actor: typeof tansy, coefficient: number) => {
      const edits = [adding("010", tansy.userId, coefficient)];
      return saveDraft(actor, { proposalId, lockVersion: 1, content: content({ edits }) }, clock);
    };
    expect(await save(lusia, 0.4)).toMatchObject({ outcome: "saved", lockVersion: 2 });
    expect(await save(tansy, 0.3)).toMatchObject({
      outcome: "moved",
      stored: {
        savedBy: { name: "Lusia Manager" },
        content: { edits: [{ body: { dragCoefficient: 0.4 } }] },
        touched: [{ field: "" }, { field: "dragCoefficient", by: { name: "Lusia Manager" } }],
      },
    });
  });

  it("is closed to a co-editor whose part its proposer ended; the history tells both", async () => {
    const { tansy, lusia, odo, clock, proposalId, key } = await sharedDraft();
    const ending = { proposalId, userId: lusia.userId };
    await expect(unshareDraft(lusia, ending, clock)).rejects.toMatchObject({ code: "forbidden" });
    await expect(unshareDraft(tansy, { proposalId, userId: odo.userId }, clock)).rejects.toMatchObject({
      code: "not_found",
    });
    await unshareDraft(tansy, ending, clock);
    await expect(editorView(lusia, CODE, key, clock)).rejects.toMatchObject({ code: "forbidden" });
    const acts = (await historyPage({ chain: CODE })).rows.map(({ act, outcome }) => `${act} ${outcome}`);
    expect(acts.slice(0, 3)).toEqual(["unshare_draft done", "unshare_draft refused", "share_draft done"]);

    await shareDraft(tansy, ending, clock);
    await withdrawProposal(tansy, { proposalId, reason: "Not needed any more" }, clock);
    await expect(unshareDraft(tansy, ending, clock)).rejects.toMatchObject({ code: "wrong_state" });
  });
});
