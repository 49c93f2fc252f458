import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { DEMO_PEOPLE, type DemoPerson } from "@/scripts/demo/people";
import { expect, hydrated, test } from "./support/leeboard-test";

const SHEETS = ["", "/products", "/account"];
const PRODUCT_SHEETS = ["budget", "proposals", "operating-points", "issues", "history", "people", "proposals/5"];
const ITEMS = ["/products/TF2/items/010", "/products/PD7/items/100", "/products/GS4/items/060"];

const READERS: readonly { person: DemoPerson; sheets: readonly string[] }[] = [
  { person: "lusia", sheets: [...SHEETS, ...["TF2", "PD7", "GS4"].flatMap(sheetsOf), ...ITEMS] },
  { person: "ines", sheets: sheetsOf("TF2") },
  { person: "tansy", sheets: [...sheetsOf("TF2"), ...ITEMS] },
  { person: "maud", sheets: [...SHEETS, ...sheetsOf("GS4")] },
  { person: "wilmot", sheets: [...SHEETS, "/administration/accounts", "/administration/history"] },
];

function sheetsOf(code: string): string[] {
  return PRODUCT_SHEETS.map((sheet) => `/products/${code}/${sheet}`);
}

/** What the browser reports while a page is open: thrown errors, refused styles and scripts, failed requests. */
function complaintsOf(page: Page): string[] {
  const complaints: string[] = [];
  page.on("pageerror", (error) => complaints.push(error.message));
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  return complaints;
}

for (const { person, sheets } of READERS) {
  test(`${DEMO_PEOPLE[person].name} opens each sheet without a complaint of the browser or of axe`, async ({
    page,
    signIn,
  }) => {
    test.setTimeout(300_000);
    await signIn(page, DEMO_PEOPLE[person].email);
    const complaints = complaintsOf(page);
    for (const sheet of sheets) {
      await test.step(sheet || "/", async () => {
        const response = await page.goto(sheet || "/");
        expect(response?.status(), sheet).toBe(200);
        await hydrated(page);
        await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
        await expect(page).toHaveTitle(/./);
        const { violations } = await new AxeBuilder({ page }).analyze();
        expect(violations.map(({ id, nodes }) => `${sheet}: ${id} at ${nodes[0]?.target.join(" ")}`)).toEqual([]);
      });
    }
    expect(complaints).toEqual([]);
  });
}
