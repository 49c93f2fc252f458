import type { Locator, Page } from "@playwright/test";
import { isSaved } from "./support/draft-sheet";
import { test } from "./support/journey-test";
import { expect } from "./support/patient-expect";
import { open } from "./support/sign-in";

test.describe.configure({ mode: "serial", timeout: 240_000 });

function setting(page: Page, letter: "A" | "B"): Locator {
  return page.getByRole("region", { name: `Setting ${letter}`, exact: true });
}

function drags(page: Page): Locator {
  return page.getByRole("table", { name: "What the two settings give" }).getByRole("row", { name: /^Drag D / });
}

test("two settings stand side by side, in numbers and in one picture", async ({ pageOf }) => {
  const page = await pageOf("tansy");
  await open(page, "/trial");
  for (const letter of ["A", "B"] as const) {
    await setting(page, letter).getByLabel("Method").selectOption({ label: "Bluff body" });
    await setting(page, letter).getByLabel("Drag coefficient", { exact: false }).first().fill("1.2");
    await setting(page, letter).getByLabel("Speed", { exact: false }).first().fill("20 m/s");
  }
  await setting(page, "A").getByLabel("Reference area").fill("0.5 m²");
  await setting(page, "B").getByLabel("Reference area").fill("1 m²");

  // q = ½ · 1.2250 · 20² = 245.0 Pa at 15 °C and 1013.25 hPa (ISO 2533), times 1.2 times the area.
  await expect(drags(page)).toContainText("147.00");
  await expect(drags(page)).toContainText("294.00");
  await expect(page.getByTestId("trial-difference")).toContainText("100.0");
  await expect(page.getByRole("img", { name: /^Drag of both settings over speed: A has 147.00/ })).toBeVisible();

  await setting(page, "B").getByLabel("Reference area").fill("0 m²");
  await expect(setting(page, "B").getByText("Must be greater than 0.")).toBeVisible();
  await expect(page.getByTestId("trial-difference")).toContainText("No difference to tell");
  await setting(page, "B").getByLabel("Reference area").fill("1 m²");
});

test("B becomes a draft whose editor has the same inputs", async ({ pageOf }) => {
  const page = await pageOf("tansy");
  await page.getByRole("button", { name: "Turn B into a proposal…" }).click();
  const dialog = page.getByRole("dialog", { name: "Turn B into a proposal" });
  await dialog.getByLabel("Product").selectOption({ value: "TF2" });
  await dialog.getByLabel("Name of the item").fill("Tried bluff body");
  await dialog.getByLabel("Title").fill("What was tried");
  await dialog.getByRole("button", { name: "Start the draft" }).click();
  await expect(page).toHaveURL(/\/proposals\/draft-\d+\/edit$/);
  await isSaved(page);

  const form = page.getByRole("region", { name: /Tried bluff body/ });
  await expect(form.getByLabel("Reference area")).toHaveValue("1 m²");
  await expect(form.getByLabel("Drag coefficient", { exact: false }).first()).toHaveValue("1.2");
});
