import { type Locator, type Page } from "@playwright/test";
import { expect } from "./patient-expect";
import { open } from "./sign-in";

/** "Inside by 1.41 N" with the numbers that stand beside it, in newtons. */
export interface PrintedStanding {
  words: string;
  /** What the words name: clear of the reserve, into it, or beyond the limit. */
  distance: number;
  predicted: number;
  reserve: number;
  limit: number;
}

export async function printedStanding(page: Page): Promise<PrintedStanding> {
  const words = await page.locator("[data-standing]").innerText();
  return {
    words: words.split(",")[0]?.trim() ?? "",
    distance: firstNumber(words),
    predicted: await figure(page, "Total, predicted"),
    reserve: await figure(page, "Reserve"),
    limit: await figure(page, "Limit"),
  };
}

/** A number of the sheet by what it is: "Total, predicted", "Basic estimate of 030". */
export async function figure(page: Page, title: string): Promise<number> {
  return firstNumber(await page.getByTitle(title, { exact: true }).innerText());
}

/** Numbers are printed with a true minus and thin spaces. */
export function firstNumber(text: string): number {
  const plain = text.replaceAll("−", "-").replace(/[\u2009\u202f\u00a0]/g, "");
  return Number(/-?\d+(\.\d+)?/.exec(plain)?.[0]);
}

/** Presses a number and answers the sheet that says how it came about. */
export async function openWorking(page: Page, title: string): Promise<Locator> {
  await page.getByTitle(title, { exact: true }).click();
  const working = page.getByRole("dialog");
  await expect(working.getByRole("listitem").first()).toBeVisible();
  return working;
}

/** The number of the newest issue, as the title block of the budget sheet has it. */
export async function newestIssue(page: Page, productCode: string): Promise<number> {
  await open(page, `/products/${productCode}/budget`);
  return firstNumber(await titleBlockField(page, "Issue").innerText());
}

export function titleBlockField(page: Page, label: string): Locator {
  return page
    .locator("dl > div")
    .filter({ has: page.locator("dt", { hasText: new RegExp(`^${label}$`) }) })
    .locator("dd");
}
