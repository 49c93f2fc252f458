import { describe, expect, it } from "vitest";
import { performAct } from "@/lib/audit/perform-act";
import { checkHistory, exportedHistory, productHistory } from "@/lib/budget/product-history";
import { withDatabase } from "@/tests/support/database";
import { CODE, recordedProduct } from "@/tests/support/recorded-product";
import { person, withRole } from "@/tests/support/people";

withDatabase();

describe("the history of a product", () => {
  it("is shown to an auditor of the product, newest first and with where its chain ends", async () => {
    const { eva, clock } = await recordedProduct();
    const auditor = await withRole(await person("Ada Auditor"), CODE, "auditor");
    await performAct(eva, clock, { act: "check_history", chain: CODE }, async (_tx, record) => {
      record({ act: "check_history", subject: { type: "product", id: CODE, label: CODE } });
    });

    const history = await productHistory(auditor, CODE, {}, 1);

    expect(history.rows[0]).toMatchObject({ act: "check_history", printedName: "Eva", outcome: "done" });
    expect(history.rows[0]?.sequence).toBe(history.head?.sequence);
    expect(history.rows.map(({ chain }) => chain)).toEqual(history.rows.map(() => CODE));
  });

  it("is refused to a person without a role there, its check and its export too", async () => {
    await recordedProduct();
    const stranger = await person("Sam Stranger", { isAdministrator: true });

    await expect(productHistory(stranger, CODE, {}, 1)).rejects.toMatchObject({ code: "forbidden" });
    await expect(checkHistory(stranger, CODE)).rejects.toMatchObject({ code: "forbidden" });
    await expect(exportedHistory(stranger, CODE)).rejects.toMatchObject({ code: "forbidden" });
  });

  it("is found to lack a head that was noted elsewhere and is not in it", async () => {
    await recordedProduct();
    const auditor = await withRole(await person("Ada Auditor"), CODE, "auditor");
    const head = (await productHistory(auditor, CODE, {}, 1)).head;
    const noted = { sequence: (head?.sequence ?? 0) + 1, hash: "0".repeat(64) };

    const codes = (await checkHistory(auditor, CODE, noted)).faults.map(({ code }) => code);

    expect(codes).toContain("known_head");
  });
});
