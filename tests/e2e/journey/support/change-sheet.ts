import { type Locator, type Page } from "@playwright/test";
import { expect } from "./patient-expect";
import { open } from "./sign-in";

export const sheetPath = (productCode: string, number: number) => `/products/${productCode}/proposals/${number}`;

interface Signing {
  as: "reviewer" | "program manager";
  password: string;
}

/** Opens the sheet and signs it there; the dialog is gone once the signature is taken. */
export async function signSheet(page: Page, path: string, { as, password }: Signing): Promise<void> {
  await open(page, path);
  const dialog = await openDialog(page, `Sign as ${as}…`);
  await dialog.getByLabel("Your password").fill(password);
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(dialog).toBeHidden();
}

/** Presses a button that asks more, and answers what it opened. */
export async function openDialog(page: Page, trigger: string): Promise<Locator> {
  await page.getByRole("button", { name: trigger, exact: true }).click();
  const dialog = page.getByRole("dialog");
  await expect(dialog).toBeVisible();
  return dialog;
}

/** Fills the one reason that a dialog asks for, and confirms. */
export async function decide(page: Page, { trigger, label, reason, confirm, password }: DecisionInput): Promise<void> {
  const dialog = await openDialog(page, trigger);
  await dialog.getByLabel(label).fill(reason);
  if (password !== undefined) await dialog.getByLabel("Your password").fill(password);
  await dialog.getByRole("button", { name: confirm, exact: true }).click();
  await expect(dialog).toBeHidden();
}

interface DecisionInput {
  trigger: string;
  label: string | RegExp;
  reason: string;
  confirm: string;
  password?: string;
}

/** The row of a field on the change sheet. */
export function fieldRow(page: Page, line: string, field: string): Locator {
  return page
    .getByRole("table", { name: `Fields of ${line}` })
    .getByRole("row")
    .filter({ has: page.getByRole("rowheader", { name: new RegExp(`^${field}( , changed)?$`) }) });
}
