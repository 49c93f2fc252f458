import { describe, expect, it } from "vitest";
import { keepPreferences } from "@/lib/accounts/keep-preferences";
import { KeepPreferencesInput } from "@/lib/accounts/schema";
import { actorById } from "@/lib/users/queries";
import { HistoryEntry } from "@/models/history-entry";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";

withDatabase();

const AT = "2026-12-01T09:00:00.000Z";

describe("how a person reads", () => {
  it("is newtons in SI at first, and what they keep afterwards, each part by itself", async () => {
    const [eva, tom] = [await person("Eva"), await person("Tom")];
    const preferences = async (userId: number) => (await actorById(userId, AT))?.preferences;
    expect(await preferences(eva.userId)).toEqual({ measure: "newtons", units: "si" });

    await keepPreferences(eva, { measure: "counts" });
    await keepPreferences(eva, { units: "us" });

    expect(await preferences(eva.userId)).toEqual({ measure: "counts", units: "us" });
    expect(await preferences(tom.userId)).toEqual({ measure: "newtons", units: "si" });
  });

  it("is no act: the history of the house stays as it was", async () => {
    const eva = await person("Eva");
    const before = await HistoryEntry.count();
    await keepPreferences(eva, { measure: "power" });
    expect(await HistoryEntry.count()).toBe(before);
  });

  it("takes only measures and units that there are", () => {
    expect(KeepPreferencesInput.safeParse({ measure: "furlongs" }).success).toBe(false);
    expect(KeepPreferencesInput.safeParse({ units: "cgs" }).success).toBe(false);
    expect(KeepPreferencesInput.safeParse({ userId: 1, units: "us" }).success).toBe(false);
    expect(KeepPreferencesInput.safeParse({ units: "us" }).success).toBe(true);
  });
});
