import { type Locator, type Page } from "@playwright/test";
import { expect } from "./patient-expect";
import { open } from "./sign-in";

/** Starts a draft on the proposals sheet and lands in its editor. */
export async function startDraft(page: Page, productCode: string, title: string): Promise<void> {
  await open(page, `/products/${productCode}/proposals`);
  await page.getByRole("button", { name: "Start a draft…" }).click();
  const dialog = page.getByRole("dialog", { name: "Start a draft" });
  await dialog.getByLabel("Title").fill(title);
  await dialog.getByRole("button", { name: "Start", exact: true }).click();
  await expect(page).toHaveURL(/\/proposals\/draft-\d+\/edit$/);
  await expect(page.getByTestId("save-state")).toBeVisible();
}

/** Takes a standing line into the draft; answers its form. */
export async function reviseLine(page: Page, line: string): Promise<Locator> {
  await page.getByLabel("Line", { exact: true }).selectOption({ label: line });
  await page.getByRole("button", { name: "Revise it" }).click();
  return lineForm(page, line);
}

export function lineForm(page: Page, line: string): Locator {
  return page.getByRole("region", { name: line });
}

/** Adds a line of a kind; its form is the last one. */
export async function addLine(page: Page, kind: "item" | "group"): Promise<Locator> {
  await page.getByRole("button", { name: kind === "item" ? "Add an item" : "Add a group" }).click();
  return page
    .getByRole("region")
    .filter({ has: page.getByRole("button", { name: "Take out of the proposal" }) })
    .last();
}

export async function writeReason(page: Page, markdown: string): Promise<void> {
  await page.getByLabel("Reason", { exact: true }).fill(markdown);
}

/** The draft says that the server has it. */
export async function isSaved(page: Page): Promise<void> {
  await expect(page.getByTestId("save-state")).toHaveText(/^Saved \d\d:\d\d UTC$/);
}

export async function citeEvidence(
  form: Locator,
  { document, revision, date }: { document: string; revision: string; date: string },
): Promise<void> {
  await form.getByRole("button", { name: "Add: citation" }).click();
  await form.getByLabel("Document").last().fill(document);
  await form.getByLabel("Revision", { exact: true }).last().fill(revision);
  await form.getByLabel("Date").last().fill(date);
}

/** The predicted total that the open draft would make, as the effect panel prints it. */
export async function previewedTotal(page: Page, operatingPoint = "OP-1"): Promise<string> {
  return (await page.getByTestId(`total-${operatingPoint}`).innerText()).trim();
}

/** Submits the draft as a round; answers the proposal's number. */
export async function propose(page: Page, password?: string): Promise<number> {
  await isSaved(page);
  await page.getByRole("button", { name: "Propose…" }).click();
  const dialog = page.getByRole("dialog", { name: "Propose this change" });
  if (password !== undefined) await dialog.getByLabel("Your password").fill(password);
  await dialog.getByRole("button", { name: "Propose", exact: true }).click();
  await expect(page).toHaveURL(/\/proposals\/\d+$/);
  return Number(new URL(page.url()).pathname.split("/").at(-1));
}
