import { describe, expect, it } from "vitest";
import { noteOpened } from "@/lib/proposals/records/opened-texts";
import { sheetsToSign } from "@/lib/proposals/reading/sheets-to-sign";
import { signSheets } from "@/lib/proposals/signing/sign-sheets";
import { withDatabase } from "@/tests/support/database";
import { adding, approval, approvedItems, PASSWORD, proposed, revising, team } from "../review-cycle";

withDatabase();

describe("several sheets under one password", () => {
  it("are signed one by one; one that moved meanwhile is told apart and keeps no other from its signature", async () => {
    const people = await team();
    const { tansy, ines, clock } = people;
    const items = [adding("010", tansy.userId, 0.5), adding("020", tansy.userId, 0.3)];
    await approvedItems(people, items);
    const needsBoth = await proposed(tansy, clock, { edits: [adding("030", tansy.userId, 0.1)] });
    const small = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    const smaller = await proposed(tansy, clock, { edits: [revising("020", "–", tansy.userId, 0.29)] });
    const sheets = [];
    for (const proposalId of [needsBoth, small, smaller]) {
      const { password, ...sheet } = await approval(proposalId, "reviewer", clock);
      expect(password).toBe(PASSWORD);
      sheets.push(sheet);
    }
    for (const { textHash } of sheets) await noteOpened(ines, textHash, clock);
    await expect(signSheets(ines, { sheets, password: "no" }, clock)).rejects.toMatchObject({ code: "wrong_password" });
    expect(await signSheets(ines, { sheets, password: PASSWORD }, clock)).toMatchObject({
      signed: [
        { proposalId: needsBoth, state: "proposed", issue: null },
        { proposalId: small, state: "approved", issue: 3 },
      ],
      refused: [{ proposalId: smaller, code: "moved" }],
    });
  });

  it("leaves out a sheet that the signer did not open, or opened before it moved", async () => {
    const people = await team();
    const { tansy, ines, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", tansy.userId, 0.3)]);
    const first = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    const second = await proposed(tansy, clock, { edits: [revising("020", "–", tansy.userId, 0.29)] });
    const openedSheets = await sheetsToSign(ines, clock);
    expect(openedSheets.map(({ proposalId, opened }) => [proposalId, opened])).toEqual([
      [first, false],
      [second, false],
    ]);
    for (const { textHash } of openedSheets) await noteOpened(elske, textHash, clock);
    const [one] = openedSheets;
    if (one) await noteOpened(ines, one.textHash, clock);
    expect((await sheetsToSign(ines, clock)).map(({ opened }) => opened)).toEqual([true, false]);

    const sheets = openedSheets.map(({ proposalId, roundHash, textHash, capacity }) => {
      const words = { decision: "approve", meaning: "Checked", deputyForId: null } as const;
      return { proposalId, roundHash, textHash, capacity, ...words };
    });
    expect(await signSheets(ines, { sheets: [...sheets].reverse(), password: PASSWORD }, clock)).toMatchObject({
      signed: [{ proposalId: first, state: "approved" }],
      refused: [{ proposalId: second, code: "moved", sentence: expect.stringContaining("Open this sheet") }],
    });
    expect((await sheetsToSign(ines, clock)).map(({ proposalId, opened }) => [proposalId, opened])).toEqual([
      [second, false],
    ]);
  });
});
