import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { propose } from "@/lib/proposals/submitting/propose";
import { proposalView } from "@/lib/proposals/queries";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { Comment } from "@/models/comment";
import { OutboxMessage } from "@/models/outbox-message";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";
import { adding, CODE, content, formKey, proposed, team } from "./review-cycle";

withDatabase();

const WORDS = { parentId: null, suggestion: null, text: "Which gauge?", asksForAction: false };
const FIELD = { line: { kind: "item", number: "010" } as const, field: "dragCoefficient" };

describe("a remark", () => {
  it("goes by mail to those to whom it is addressed, once each, and names them on the sheet and in the history", async () => {
    const { tansy, odo, ines, clock } = await team();
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const to = [odo.userId, tansy.userId];
    await addRemark(ines, { proposalId, ...WORDS, ...FIELD, asksForAction: true, to, key: formKey() }, clock);
    const mails = await OutboxMessage.findAll({ order: [["id", "ASC"]] });
    expect(
      mails
        .filter(({ template }) => template.startsWith("remark"))
        .map(({ template, toUserId }) => [template, toUserId]),
    ).toEqual([
      ["remark_asks_action", tansy.userId],
      ["remark_addressed", odo.userId],
    ]);
    const sheet = await proposalView(odo, CODE, "1", undefined, clock);
    expect(sheet?.remarks[0]?.to.map(({ name }) => name)).toEqual(["Odo Owner", "Tansy Owner"]);
    expect(sheet?.addressable.map(({ name }) => name)).not.toContain("Odo Owner");
    expect((await historyPage({ chain: CODE })).rows[0]).toMatchObject({
      act: "add_remark",
      now: { to: ["Odo Owner", "Tansy Owner"] },
    });
  });

  it("is addressed to members alone; otherwise nothing of it is kept", async () => {
    const { tansy, ines, clock } = await team();
    const stranger = await person("Someone Else");
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const remark = { proposalId, ...WORDS, ...FIELD, to: [tansy.userId, stranger.userId], key: formKey() };
    await expect(addRemark(ines, remark, clock)).rejects.toMatchObject({ code: "invalid", faults: [{ path: "to" }] });
    expect(await Comment.count()).toBe(0);
  });

  it("stays with what its field said when a later round says something else or took the line out", async () => {
    const { tansy, ines, clock } = await team();
    const edits = [adding("010", tansy.userId, 0.5), adding("020", tansy.userId, 0.1)];
    const proposalId = await proposed(tansy, clock, { edits });
    await addRemark(ines, { proposalId, ...WORDS, ...FIELD, to: [], key: formKey() }, clock);
    const seen = async () => (await proposalView(ines, CODE, "1", undefined, clock))?.remarks[0];
    expect(await seen()).toMatchObject({ referredTo: null, round: 1 });

    const lock = async () => (await proposalView(tansy, CODE, "1", undefined, clock))?.lockVersion ?? 0;
    const nextRound = async (edited: typeof edits) => {
      await saveDraft(tansy, { proposalId, lockVersion: await lock(), content: content({ edits: edited }) }, clock);
      await propose(tansy, { proposalId, lockVersion: await lock(), key: formKey(), password: null }, clock);
    };
    await nextRound([adding("010", tansy.userId, 0.4), adding("020", tansy.userId, 0.1)]);
    expect(await seen()).toMatchObject({ referredTo: "0.5", round: 1, line: { number: "010", name: "Mirror" } });
    await nextRound([adding("020", tansy.userId, 0.1)]);
    expect(await seen()).toMatchObject({ referredTo: "0.5", line: { number: "010", name: "Mirror" } });
  });
});
