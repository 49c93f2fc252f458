import { type Page } from "@playwright/test";
import { hydrated } from "@/tests/e2e/support/leeboard-test";
import { expect } from "./patient-expect";

export interface Credentials {
  email: string;
  password: string;
}

/** Signs in where the page stands: at the sign-in sheet, or wherever it is sent from there. */
export async function signInAs(page: Page, address: string, { email, password }: Credentials): Promise<void> {
  await page.goto(`${address}/sign-in`);
  await hydrated(page);
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).not.toHaveURL(/sign-in/);
  await hydrated(page);
}

export async function signOut(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Sign out" }).click();
  await expect(page).toHaveURL(/sign-in/);
}

/** Goes to an address and waits until what is pressed there counts. */
export async function open(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await hydrated(page);
}
