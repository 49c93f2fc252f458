import { type Page } from "@playwright/test";
import { DEMO_PASSWORD, DEMO_PEOPLE } from "@/scripts/demo/people";
import { figure, firstNumber, newestIssue, printedStanding } from "./support/budget-sheet";
import { decide, sheetPath, signSheet } from "./support/change-sheet";
import { isSaved, previewedTotal, propose, reviseLine, startDraft, writeReason } from "./support/draft-sheet";
import { test } from "./support/journey-test";
import { expect } from "./support/patient-expect";
import { mailsArrived } from "./support/mail";
import { randomNumbers } from "./support/random-numbers";
import { open } from "./support/sign-in";

const CODE = "TF2";

test.describe.configure({ mode: "serial", timeout: 400_000 });

test("a program manager disapproves a proposal, and the budget stays as it was", async ({ pageOf, mails }) => {
  const page = await pageOf("fenno");
  const before = await newestIssue(page, CODE);
  await open(page, `/products/${CODE}/proposals`);
  const link = page.getByRole("row", { name: /Wheel-aperture trim with a radius/ }).getByRole("link");
  const label = await link.innerText();
  await open(page, (await link.getAttribute("href")) ?? "");
  await decide(page, {
    trigger: "Disapprove…",
    label: "Why",
    reason: "The mould is not paid for.",
    confirm: "Disapprove",
    password: DEMO_PASSWORD,
  });
  await expect(page.getByText(/· disapproved ·/)).toBeVisible();
  await expect(page.getByRole("cell", { name: /The mould is not paid for\./ })).toBeVisible();
  await mailsArrived(mails, `${label} is disapproved`, [DEMO_PEOPLE.tansy.email]);
  expect(await newestIssue(page, CODE)).toBe(before);
});

test("what was previewed of a random edit is what its issue has frozen, at every operating point", async ({
  pageOf,
}) => {
  const page = await pageOf("tansy");
  const random = randomNumbers(7);
  for (const round of [1, 2, 3]) {
    const coefficient = (0.2 + 0.1 * random()).toFixed(3);
    const area = `${(350 + 80 * random()).toFixed(1)} cm²`;
    await startDraft(page, CODE, `Recess measured anew, ${round}`);
    const form = await reviseLine(page, "120 Access-step recess (2)");
    await form.getByLabel(/^Drag coefficient,/).fill(coefficient);
    await form.getByLabel(/^Reference area,/).fill(area);
    await writeReason(page, "Measured anew in the workshop.");
    await isSaved(page);
    const previewed = await previewedTotals(page);
    const routing = await page.getByRole("region", { name: "Who must sign" }).first().innerText();
    const path = sheetPath(CODE, await propose(page));
    await signSheet(await pageOf("ines"), path, { as: "reviewer", password: DEMO_PASSWORD });
    if (routing.includes("Program manager")) {
      await signSheet(await pageOf("lusia"), path, { as: "program manager", password: DEMO_PASSWORD });
    }
    await open(page, path);
    await expect(page.getByText(/· approved ·/)).toBeVisible();
    for (const [point, total] of previewed) {
      await open(page, `/products/${CODE}/budget?point=${point}`);
      expect(await figure(page, "Total, predicted"), `${coefficient} on ${area} at ${point}`).toBe(total);
    }
  }
});

async function previewedTotals(page: Page): Promise<[point: string, newtons: number][]> {
  const ids = await page
    .locator("[data-testid^='total-']")
    .evaluateAll((cells) => cells.map((cell) => cell.dataset.testid));
  const points = ids.map((id = "") => id.replace("total-", ""));
  return Promise.all(points.map(async (point) => [point, Number(await previewedTotal(page, point))]));
}

test("the program manager sees the new standing in the register and the trend over all issues", async ({ pageOf }) => {
  const page = await pageOf("lusia");
  const newest = await newestIssue(page, CODE);
  await open(page, `/products/${CODE}/budget?point=OP-1`);
  const { predicted } = await printedStanding(page);
  await open(page, "/products");
  await expect(page.getByRole("row", { name: new RegExp(`^${CODE} `) })).toContainText(String(newest));

  await open(page, `/products/${CODE}/issues?point=OP-1`);
  const trend = page.getByRole("img", { name: /^Predicted total at OP-1: .* at issue 1, / });
  await expect(trend).toHaveAttribute("aria-label", new RegExp(`${predicted.toFixed(2)}\\sN at issue ${newest}`));
  await expect(trend.locator("circle")).toHaveCount(newest);
  await page.getByText("As a table").first().click();
  const numbers = page.getByRole("table", { name: "The numbers of the picture, in N" });
  await expect(numbers.getByRole("row", { name: new RegExp(`^${newest} `) })).toContainText(predicted.toFixed(2));
});

test("the auditor reads who did what, goes back to an issue, and proves the chain", async ({ pageOf }) => {
  const maud = await pageOf("maud");
  await open(maud, `/products/${CODE}/history?act=approve_proposal&outcome=done`);
  const entry = maud.locator("tr[data-entry]").first();
  await expect(entry).toContainText(DEMO_PEOPLE.ines.name);
  await expect(entry).toContainText("as reviewer");
  await expect(entry).toContainText("Sign: approve");
  await expect(entry.locator("time")).toHaveAttribute("datetime", /^\d{4}-\d\d-\d\dT[\d:.]+Z$/);
  await expect(entry.locator("td[data-label=Was]")).toContainText("proposed");
  await expect(entry.locator("td[data-label=Now]")).toContainText("approved");
  await maud.locator("select[name=act]").selectOption({ label: "Sign: disapprove" });
  await maud.getByRole("button", { name: "Show", exact: true }).click();
  await expect(maud.locator("td[data-label=Reason]").first()).toContainText("The mould is not paid for.");

  await open(maud, `/products/${CODE}/issues?point=OP-1`);
  const row = maud.locator("tr[data-issue='3']");
  const stood = firstNumber(await row.getByRole("cell").nth(3).innerText());
  await row.getByRole("link", { name: "Issue 3", exact: true }).click();
  await expect(maud.getByText(/As it stood at issue 3, issued/)).toBeVisible();
  expect(await figure(maud, "Total, predicted")).toBe(stood);

  await open(maud, `/products/${CODE}/history`);
  await maud.getByRole("button", { name: "Check the chain" }).click();
  await expect(maud.getByText(/Unbroken: \d+ entries and \d+ bound rows checked/)).toBeVisible();
});

test("the auditor meets no control that changes anything", async ({ pageOf }) => {
  const maud = await pageOf("maud");
  const sheets = ["budget", "items/010", "operating-points", "proposals", "proposals/5", "issues", "history", "people"];
  for (const sheet of sheets) {
    await open(maud, `/products/${CODE}/${sheet}`);
    // What is left leads on, filters, explains or exports.
    const controls = await maud.locator("main").locator("button, a[href], input[type=submit]").allInnerTexts();
    const acts = controls.filter((text) => CHANGING.test(text.trim()));
    expect(acts, sheet).toEqual([]);
  }
  await maud.goto(`/products/${CODE}/proposals/5/edit`);
  await expect(maud.getByTestId("save-state")).toHaveCount(0);
});

const CHANGING =
  /^(Propose|Start|Sign|Return|Disapprove|Withdraw|Object|Revise|Carry|Take back|Settle|Answer|Remark|Name|End|Give|Make|Edit)\b.*…?$/;
