import type { Page } from "@playwright/test";
import { expect, hydrated, test } from "./support/leeboard-test";

/** Width between margins of 10 mm on A4 (ISO 216: 210 mm), at 96 px to the inch. */
const A4_WIDTH = Math.round(((210 - 20) / 25.4) * 96);

test("budget, change sheet and report print clean on A4, the report on one page", async ({ page, signIn }) => {
  await signIn(page, "lusia@thistlemere.example");
  await page.emulateMedia({ media: "print" });
  await page.setViewportSize({ width: A4_WIDTH, height: 1000 });

  await opened(page, "/products/TF2/budget");
  await expectCleanPrint(page);
  await expect(page.getByRole("row", { name: /^130\s*Interference of panel and wheel/ })).toBeVisible();
  // A note in full, where the screen has its first clause.
  await expect(page.getByText("say why the layer starts anew.")).toBeVisible();

  await opened(page, "/products/GS4/budget");
  await expectCleanPrint(page);
  await expect(page.getByText(/a service-wind estimate, not a structural wind load/)).toBeVisible();

  await opened(page, "/products/TF2/proposals/5");
  await expectCleanPrint(page);
  await expect(page.getByText("Prandtl–Schlichting").first()).toBeVisible();
  // A print shows what stays, too.
  await expect(page.getByRole("rowheader", { name: "Maturity grade" }).first()).toBeVisible();

  await opened(page, "/products/TF2/report");
  await expectCleanPrint(page);
  await expect(page.getByText(/empirical correlations/)).toBeVisible();
  expect(pagesOf(await page.pdf({ preferCSSPageSize: true }))).toBe(1);
});

async function opened(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await hydrated(page);
}

/** The sheet with its title block, without what only a screen needs, within the width of the paper. */
async function expectCleanPrint(page: Page): Promise<void> {
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  await expect(page.locator("dt", { hasText: /^Product$/ })).toBeVisible();
  await expect(page.getByRole("navigation").filter({ visible: true })).toHaveCount(0);
  // A number that opens its working is a number on paper; every other button acts.
  await expect(page.locator("button:not([title])").filter({ visible: true })).toHaveCount(0);
  const overhang = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  expect(overhang).toBeLessThanOrEqual(0);
}

/** Page objects stand uncompressed in what Chromium writes (ISO 32000-1, 7.7.3.3). */
function pagesOf(pdf: Buffer): number {
  return pdf.toString("latin1").match(/\/Type\s*\/Page\b/g)?.length ?? 0;
}
