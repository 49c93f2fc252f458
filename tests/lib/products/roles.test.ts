import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { membersAt } from "@/lib/budget/members";
import { createProduct } from "@/lib/products/create-product";
import { endRole } from "@/lib/products/end-role";
import { giveRole } from "@/lib/products/give-role";
import { CreateProductInput } from "@/lib/products/schema";
import { inSnapshot } from "@/models/database";
import { Membership } from "@/models/membership";
import { Product } from "@/models/product";
import { withDatabase } from "@/tests/support/database";
import { person, product } from "@/tests/support/people";

withDatabase();

const at = (time: string) => () => new Date(time);
const MARCH = at("2026-03-01T09:00:00.000Z");
const NEW = CreateProductInput.parse({ code: "TF-2", name: "Side fairing", kind: "vehicle_fairing", timeZone: "UTC" });

describe("a product", () => {
  it("is made by an administrator and stands in the history of the house", async () => {
    const admin = await person("Anke Post", { isAdministrator: true });
    await createProduct(admin, NEW, MARCH);
    expect(await Product.findAll({ raw: true })).toMatchObject([
      { code: "TF-2", createdAt: "2026-03-01T09:00:00.000Z" },
    ]);
    expect((await historyPage({})).rows).toMatchObject([
      { chain: "house", act: "create_product", subjectId: "TF-2", outcome: "done", printedName: "Anke Post" },
    ]);
  });

  it("never takes a code twice: the sentence stands at the field, and no act was done", async () => {
    const admin = await person("Anke Post", { isAdministrator: true });
    await createProduct(admin, NEW, MARCH);
    await expect(createProduct(admin, NEW, MARCH)).rejects.toMatchObject({
      code: "duplicate",
      faults: [{ path: "code" }],
    });
    expect((await historyPage({})).total).toBe(1);
  });

  it("is refused to anybody else, which the history keeps", async () => {
    const owner = await person("Tom Veer");
    await expect(createProduct(owner, NEW, MARCH)).rejects.toMatchObject({ code: "forbidden" });
    expect(await Product.count()).toBe(0);
    expect((await historyPage({})).rows).toMatchObject([{ act: "create_product", outcome: "refused" }]);
  });
});

describe("a role", () => {
  it("is given from now on, in the product's history, and ends with its dates kept", async () => {
    const admin = await person("Anke Post", { isAdministrator: true });
    const ines = await person("Ines Maat");
    const productId = await product("TF-2");
    const given = { productCode: "TF-2", userId: ines.userId, role: "reviewer", reason: "" } as const;
    const { membershipId } = await giveRole(admin, given, MARCH);
    await endRole(admin, { membershipId, reason: "Moved to another team." }, at("2026-04-01T09:00:00.000Z"));

    const rolesAt = (time: string) => inSnapshot((tx) => membersAt(productId, time, tx));
    expect(await rolesAt("2026-02-28T00:00:00.000Z")).toEqual([]);
    expect(await rolesAt("2026-03-15T00:00:00.000Z")).toEqual([
      { userId: ines.userId, printedName: "Ines Maat", roles: ["reviewer"] },
    ]);
    expect(await rolesAt("2026-04-01T09:00:00.000Z")).toEqual([]);
    expect((await historyPage({ chain: "TF-2" })).rows.map(({ act, reason }) => [act, reason])).toEqual([
      ["end_role", "Moved to another team."],
      ["give_role", null],
    ]);
    await expect(endRole(admin, { membershipId, reason: "Again." }, MARCH)).rejects.toMatchObject({
      code: "wrong_state",
    });
  });

  it("is not given twice, and not to a closed account", async () => {
    const admin = await person("Anke Post", { isAdministrator: true });
    const ines = await person("Ines Maat");
    await product("TF-2");
    const given = { productCode: "TF-2", userId: ines.userId, role: "reviewer", reason: "" } as const;
    await giveRole(admin, given, MARCH);
    await expect(giveRole(admin, given, MARCH)).rejects.toMatchObject({ code: "duplicate" });
    await expect(giveRole(admin, { ...given, userId: 999 }, MARCH)).rejects.toMatchObject({ code: "not_found" });
    expect(await Membership.count()).toBe(1);
  });

  it("is refused to a program manager who gives it, and nothing changes", async () => {
    const manager = await person("Lusia Brand");
    await product("TF-2");
    const asked = { productCode: "TF-2", userId: manager.userId, role: "program_manager", reason: "" } as const;
    await expect(giveRole(manager, asked, MARCH)).rejects.toMatchObject({ code: "forbidden" });
    expect(await Membership.count()).toBe(0);
    expect((await historyPage({ chain: "TF-2" })).rows).toMatchObject([{ act: "give_role", outcome: "refused" }]);
  });
});
