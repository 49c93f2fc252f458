import { DEMO_PASSWORD } from "@/scripts/demo/people";
import { expect, hydrated, test } from "./support/leeboard-test";

test("a person signs in, sees their day sheet and signs out", async ({ page, signIn }) => {
  await signIn(page, "ines@thistlemere.example");
  await expect(page.getByRole("heading", { level: 1, name: "Day sheet" })).toBeVisible();
  await expect(page.getByRole("banner")).toContainText("Ines Quarrymead");

  await page.getByRole("button", { name: "Sign out" }).click();
  await expect(page).toHaveURL(/\/sign-in/);
  await page.goto("/products");
  await expect(page).toHaveURL(/\/sign-in/);
});

test("a wrong password is refused in a sentence that does not say which of the two is wrong", async ({ page }) => {
  for (const email of ["ines@thistlemere.example", "nobody@thistlemere.example"]) {
    await page.goto("/sign-in");
    await hydrated(page);
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill(`${DEMO_PASSWORD} not`);
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByText("E-mail address and password do not belong together.")).toBeVisible();
  }
});
