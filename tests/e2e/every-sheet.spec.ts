import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { DEMO_PEOPLE, type DemoPerson } from "@/scripts/demo/people";
import { expect, hydrated, test } from "./support/leeboard-test";

const OWN_SHEETS = ["/", "/products", "/account"];
const PRODUCT_SHEETS = ["budget", "proposals", "operating-points", "issues", "history", "people", "proposals/5"];

function sheetsOf(code: string, item: string): string[] {
  return [...PRODUCT_SHEETS, `items/${item}`].map((sheet) => `/products/${code}/${sheet}`);
}

const READINGS: readonly { person: DemoPerson; what: string; sheets: readonly string[] }[] = [
  { person: "lusia", what: "the sheets of their own", sheets: OWN_SHEETS },
  { person: "lusia", what: "the sheets of the fairing", sheets: sheetsOf("TF2", "010") },
  { person: "tansy", what: "the sheets of the duct", sheets: sheetsOf("PD7", "100") },
  { person: "maud", what: "the sheets of the sign", sheets: sheetsOf("GS4", "060") },
  { person: "wilmot", what: "the administration", sheets: ["/administration/accounts", "/administration/history"] },
];

/** What the browser reports while a page is open: thrown errors, refused styles and scripts, failed requests. */
function complaintsOf(page: Page): string[] {
  const complaints: string[] = [];
  page.on("pageerror", (error) => complaints.push(error.message));
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  return complaints;
}

for (const { person, what, sheets } of READINGS) {
  test(`${DEMO_PEOPLE[person].name} opens ${what} without a complaint of the browser or of axe`, async ({
    page,
    signIn,
  }) => {
    test.setTimeout(180_000);
    await signIn(page, DEMO_PEOPLE[person].email);
    const complaints = complaintsOf(page);
    for (const sheet of sheets) {
      await test.step(sheet, async () => {
        const response = await page.goto(sheet);
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
