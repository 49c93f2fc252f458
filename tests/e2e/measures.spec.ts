import { expect, hydrated, test } from "./support/leeboard-test";

/** ρ at 15 °C and 101 325 Pa by ISO 2533 is 1.225 kg/m³; at 25 m/s q = 382.8 Pa, and 66 N over q is 0.1724 m². */
test("a measure chosen on the budget sheet stays in the address and with the person", async ({ page, signIn }) => {
  await signIn(page, "maud@thistlemere.example");
  await page.goto("/products/TF2/budget?point=OP-1");
  await hydrated(page);
  await page
    .getByRole("navigation", { name: "Measure" })
    .getByRole("link", { name: /Drag area/ })
    .click();

  await expect(page).toHaveURL(/measure=drag-area/);
  await expect(page.getByText(/limit 0\.1724\d/).first()).toBeVisible();

  await page.goto("/products/TF2/budget?point=OP-1");
  await expect(page.getByText(/limit 0\.1724\d/).first()).toBeVisible();

  await page.goto("/products/TF2/budget?point=OP-1&measure=pascals");
  await expect(page.getByText("Only a duct has a pressure loss.")).toBeVisible();
  await expect(page.getByText(/limit 66\.00/).first()).toBeVisible();
});
