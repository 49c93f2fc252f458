import { describe, expect, it } from "vitest";
import { productByCode } from "@/lib/budget/load-budget";
import { recomputedToday } from "@/lib/budget/recomputed-today";
import { recomputeIssue } from "@/lib/budget/recompute-issue";
import { adoptVersion } from "@/lib/proposals/drafting/adopt-version";
import { proposalView } from "@/lib/proposals/queries";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { MAX_EDITS } from "@/lib/proposals/schema";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { inSnapshot } from "@/models/database";
import { addItem, newestBudget, plateItem } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, approves, CODE, content, editOf, formKey, proposed, team } from "../review-cycle";

withDatabase();

const FRICTION = "flat-plate-friction";

/** Issue 2: two plates by the one-fifth law, one by another line, and a body that no line touches. */
async function plates() {
  const people = await team();
  const { tansy, odo, fenno } = people;
  const other = { order: 30, name: "Lid", surface: "lid", frictionLine: "prandtl-schlichting" };
  await approvedItems(
    people,
    [
      editOf(addItem("010", plateItem(tansy.userId, 1, { surface: "outer" }))),
      editOf(addItem("020", plateItem(odo.userId, 1, { order: 20, name: "Inner panel", surface: "inner" }))),
      editOf(addItem("030", plateItem(odo.userId, 1, other))),
      adding("040", odo.userId, 0.5, { order: 40 }),
    ],
    fenno,
  );
  return people;
}

const ofEverybody = () => true;

describe("another version of a method", () => {
  it("is adopted by a proposal that lists what it does to every item, and moves nothing before it is signed", async () => {
    const people = await plates();
    const { ines, fenno, clock } = people;
    const { state, results } = await newestBudget(CODE);
    const adoption = adoptVersion(state, [], { method: FRICTION, version: 2, mayEdit: ofEverybody });
    expect(adoption).toMatchObject({ items: ["010", "020", "030"], left: [] });
    await proposed(fenno, clock, { title: "Constants of one set", edits: adoption.edits });

    const sheet = await proposalView(ines, CODE, "2", undefined, clock);
    expect(sheet?.lines.map(({ number, rows }) => [number, rows.filter(({ changed }) => changed)])).toMatchObject(
      ["010", "020", "030"].map((number) => [number, [{ field: "methodVersion", was: "1", toBe: "2" }]]),
    );
    const [touch] = sheet?.effectToday?.touches ?? [];
    expect(touch?.title).toBe("Flat-plate friction, version 2");
    expect(touch?.sentence).toBe("is adopted by 3 items: 010, 020, 030. 2 of them move: 010, 020.");
    const before = (item: string) => results.points[0]?.items.find((result) => result.item === item)?.predicted ?? NaN;
    // Every item is listed; those by the one-fifth law move by 0.072/0.074 − 1, the printed constants.
    const factor = 0.072 / 0.074 - 1;
    expect(touch?.effects.map(({ item, predictedWas, delta }) => [item, predictedWas, delta])).toEqual([
      ["010", before("010"), expect.closeTo(before("010") * factor, 9)],
      ["020", before("020"), expect.closeTo(before("020") * factor, 9)],
      ["030", before("030"), 0],
    ]);
    expect((await newestBudget(CODE)).results).toEqual(results);

    await approves(ines, sheet?.proposalId ?? 0, "reviewer", clock);
    expect(await newestBudget(CODE)).toMatchObject({ issue: 3 });
    const after = (await newestBudget(CODE)).results.points[0]?.items ?? [];
    expect(after.map(({ item, methodVersion }) => [item, methodVersion])).toEqual([
      ["010", 2],
      ["020", 2],
      ["030", 2],
      ["040", 1],
    ]);
    expect(after[0]?.predicted).toBeCloseTo((before("010") * 0.072) / 0.074, 9);
  });

  it("leaves old issues computable: each recomputes by the version that it names", async () => {
    const people = await plates();
    const { ines, fenno, clock } = people;
    const { state } = await newestBudget(CODE);
    const { edits } = adoptVersion(state, [], { method: FRICTION, version: 2, mayEdit: ofEverybody });
    const proposalId = await proposed(fenno, clock, { edits });
    await approves(ines, proposalId, "reviewer", clock);

    const { id } = await inSnapshot((tx) => productByCode(CODE, tx));
    for (const issue of [1, 2, 3]) expect(await inSnapshot((tx) => recomputeIssue(id, issue, tx))).toEqual([]);
    const { differences, points } = await recomputedToday(ines, CODE, 2);
    expect(differences).toEqual([]);
    const [panel] = points[0]?.items ?? [];
    expect(panel).toMatchObject({ item: "010", version: 1, newestVersion: 2 });
    expect(panel?.today).toBe(panel?.frozen);
    expect(panel?.newest).toBeCloseTo(((panel?.frozen ?? NaN) * 0.072) / 0.074, 9);
  });

  it("is adopted by an owner for their own items alone; another's are refused by name of who may", async () => {
    const { tansy, clock } = await plates();
    const { state } = await newestBudget(CODE);
    const mayEdit = ({ body }: { body: { ownerId: number } }) => body.ownerId === tansy.userId;
    expect(adoptVersion(state, [], { method: FRICTION, version: 2, mayEdit }).items).toEqual(["010"]);

    const all = adoptVersion(state, [], { method: FRICTION, version: 2, mayEdit: ofEverybody });
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "All", key: formKey() }, clock);
    await expect(
      saveDraft(tansy, { proposalId, lockVersion: 0, content: content({ edits: all.edits }) }, clock),
    ).rejects.toMatchObject({
      code: "forbidden",
      message: "A component owner may revise items that they own; any other line needs a program manager.",
    });
  });

  it("keeps what the draft typed already, and says what one proposal has no room for", async () => {
    await plates();
    const { state } = await newestBudget(CODE);
    const first = adoptVersion(state, [], { method: FRICTION, version: 2, mayEdit: ofEverybody }).edits[0];
    if (!first?.body) throw new Error("no edit");
    const typed = { ...first, body: { ...first.body, faces: 1, methodVersion: 1 } };
    const again = adoptVersion(state, [typed], { method: FRICTION, version: 2, mayEdit: ofEverybody });
    expect(again.edits[0]).toEqual({ ...first, body: { ...first.body, faces: 1 } });
    expect(again.items).toEqual(["010", "020", "030"]);

    const many = Array.from({ length: MAX_EDITS - 1 }, (_, at) => ({ ...first, number: `X${at}`, body: null }));
    const full = adoptVersion(state, many, { method: FRICTION, version: 2, mayEdit: ofEverybody });
    expect(full).toMatchObject({ items: ["010"], left: ["020", "030"] });
    expect(full.edits).toHaveLength(MAX_EDITS);
  });

  it("that nobody published is refused at its field", async () => {
    const { tansy, clock } = await plates();
    const edit = editOf(addItem("050", plateItem(tansy.userId, 3, { order: 50 })));
    await expect(proposed(tansy, clock, { edits: [edit] })).rejects.toMatchObject({
      faults: [{ path: "edits.0.body.methodVersion", sentence: "No method of this version is known." }],
    });
  });
});
