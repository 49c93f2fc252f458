import { readFileSync } from "node:fs";
import { parsePatch } from "diff";
import { DEMO_PASSWORD, DEMO_PEOPLE, type DemoPerson } from "@/scripts/demo/people";
import {
  figure,
  firstNumber,
  newestIssue,
  openWorking,
  printedStanding,
  titleBlockField,
} from "./support/budget-sheet";
import { decide, fieldRow, openDialog, sheetPath, signSheet } from "./support/change-sheet";
import {
  addLine,
  citeEvidence,
  isSaved,
  lineForm,
  previewedTotal,
  propose,
  reviseLine,
  startDraft,
  writeReason,
} from "./support/draft-sheet";
import { test } from "./support/journey-test";
import { expect } from "./support/patient-expect";
import { mailsArrived } from "./support/mail";
import { open, signInAs, signOut } from "./support/sign-in";
import { drawnStave, misplacedParts } from "./support/stave";

const CODE = "TF2";
const ITEM = "030 Rear panels, outer";
const LENGTH = "Length along the flow, L";
const email = (person: DemoPerson) => DEMO_PEOPLE[person].email;

/** What the tests of this file hand on to the next. */
const so = { firstIssue: 0, number: 0, label: "", total: "" };

test.describe.configure({ mode: "serial", timeout: 400_000 });

test("two signatures give the sheet a second operating point, and its proposer is told why theirs is none", async ({
  pageOf,
}) => {
  const fenno = await pageOf("fenno");
  await open(fenno, `/products/${CODE}/proposals`);
  const link = fenno.getByRole("row", { name: /winter at −15 °C/ }).getByRole("link");
  const path = (await link.getAttribute("href")) ?? "";
  await open(fenno, path);
  await expect(fenno.getByText("Nobody signs their own change: you are barred as its proposer")).toBeVisible();
  await expect(fenno.getByRole("button", { name: /^Sign as/ })).toHaveCount(0);

  const lusia = await pageOf("lusia");
  await signSheet(await pageOf("ines"), path, { as: "reviewer", password: DEMO_PASSWORD });
  await signSheet(lusia, path, { as: "program manager", password: DEMO_PASSWORD });
  await open(lusia, `/products/${CODE}/budget`);
  await expect(lusia.getByRole("navigation", { name: "Operating point" }).getByRole("link")).toHaveCount(2);
});

test("the owner reads standing, stave and the working of a number", async ({ pageOf }) => {
  const page = await pageOf("tansy");
  so.firstIssue = await newestIssue(page, CODE);
  const points = page.getByRole("navigation", { name: "Operating point" });
  await points.getByRole("link", { name: /^OP-2/ }).click();
  await expect(page).toHaveURL(/point=OP-2/);
  await expect(page.locator("[data-standing]")).toContainText("Over the limit by");
  await points.getByRole("link", { name: /^OP-1/ }).click();
  await expect(page.locator("[data-standing]")).toContainText("Inside by");
  const standing = await printedStanding(page);
  // "Inside by" is what is clear of the reserve: limit − predicted − reserve.
  expect(standing.distance).toBeCloseTo(standing.limit - standing.predicted - standing.reserve, 6);

  const working = await openWorking(page, "Basic estimate of 030");
  await expect(working).toContainText("D = ");
  await expect(working).toContainText(/1\.5/);
  await expect(working.getByText(/Prandtl/).first()).toBeVisible();
  await page.keyboard.press("Escape");
  await expect(working).toBeHidden();
});

test("the stave is drawn to scale, to the pixel", async ({ pageOf }) => {
  const page = await pageOf("tansy");
  await open(page, `/products/${CODE}/budget?point=OP-1`);
  const stave = await drawnStave(page);
  expect(stave.parts.map(({ part }) => part)).toEqual(expect.arrayContaining(["item", "growth", "limit", "reserve"]));
  expect(misplacedParts(stave)).toEqual([]);
  for (const { at, text } of stave.ticks) expect(firstNumber(text)).toBe(at);

  const one = (part: string) => stave.parts.filter((drawn) => drawn.part === part);
  const { limit, reserve, predicted } = await printedStanding(page);
  expect(one("limit").map(({ from }) => from)).toEqual([limit]);
  expect(one("reserve")[0]?.from).toBeCloseTo(limit - reserve, 6);
  expect(one("growth")[0]?.to).toBeCloseTo(predicted, 2);
  const widths = one("item").map(({ from, to }) => to - from);
  expect(widths.reduce((sum, width) => sum + width, 0)).toBeCloseTo(await figure(page, "Total, basic"), 1);
});

test("what the owner types is computed at once, kept, and never lost", async ({ pageOf, application }) => {
  const page = await pageOf("tansy");
  await startDraft(page, CODE, "Rear panels released");
  const address = page.url();
  const form = await reviseLine(page, ITEM);
  const length = form.getByLabel(LENGTH);
  const panel = page.getByRole("region", { name: /^Effect on issue/ });

  await length.fill("820 cm");
  await expect(form.locator("output", { hasText: "8.2" })).toBeVisible();
  const here = panel.getByRole("table", { name: /^OP-1/ });
  await expect(panel.getByTestId("effect-sentence")).toContainText(/^Predicted rises by [0-9.]+\sN;/);
  await expect(here.getByRole("row", { name: /^030/ })).toContainText("+");
  await expect(here.getByRole("row", { name: /^Margin to limit/ })).toContainText(/inside → over/i);
  const longest = await previewedTotal(page);
  await length.fill("27 ft");
  // 1 ft = 0.3048 m exactly (international foot).
  await expect(form.locator("output", { hasText: "8.2296" })).toBeVisible();
  await expect(page.getByTestId("total-OP-1")).not.toHaveText(longest);
  await length.fill("2 kg");
  await length.blur();
  await expect(form.getByText("kg is a mass; a length is needed, for example 8.2 m.")).toBeVisible();
  await expect(length).toHaveAttribute("aria-invalid", "true");
  await expect(page.getByRole("button", { name: "Propose…" })).toBeDisabled();
  await length.fill("160 cm");

  const tried = await addLine(page, "item");
  await tried.getByLabel("Method").selectOption({ label: "Measured" });
  await tried.getByLabel(/^Speed of the test/).fill("90 km/h");
  await expect(tried.locator("output", { hasText: /25\sm\/s/ })).toBeVisible();
  await tried.getByRole("button", { name: "Take out of the proposal" }).click();

  await isSaved(page);
  await signOut(page);
  await signInAs(page, application.address, { email: email("tansy"), password: DEMO_PASSWORD });
  await open(page, `/products/${CODE}/proposals`);
  await page
    .getByRole("row", { name: /Rear panels released/ })
    .getByRole("link")
    .click();
  await expect(lineForm(page, ITEM).getByLabel(LENGTH)).toHaveValue("160 cm");

  await page.context().setOffline(true);
  await lineForm(page, ITEM).getByLabel("Breadth, b").fill("78 cm");
  await expect(page.getByTestId("save-state")).toContainText("no connection to the server");
  await page.goto("about:blank");
  await page.context().setOffline(false);
  await open(page, address);
  await expect(lineForm(page, ITEM).getByLabel("Breadth, b")).toHaveValue("78 cm");
  await isSaved(page);

  await page.context().clearCookies();
  await page.getByLabel("Title", { exact: true }).fill("Rear panels: longer, narrower and released");
  await expect(page.getByTestId("save-state")).toContainText("It is kept on this device");
  await signInAs(page, application.address, { email: email("tansy"), password: DEMO_PASSWORD });
  await open(page, address);
  await expect(page.getByLabel("Title", { exact: true })).toHaveValue("Rear panels: longer, narrower and released");
  await isSaved(page);
});

test("it is proposed with reason and evidence, and those who must sign are told", async ({
  pageOf,
  mails,
  application,
}) => {
  const page = await pageOf("tansy");
  const form = lineForm(page, ITEM);
  await form.getByLabel("Maturity grade").selectOption({ label: "released" });
  await citeEvidence(form, { document: "Drawing 7714", revision: "C", date: "2026-11-20" });
  await writeReason(page, "As drawn:\n\n- 160 cm long, not 150 cm\n- **released** for tooling");
  const routing = page.getByRole("region", { name: "Who must sign" }).first();
  await expect(routing).toContainText("One independent reviewer always.");
  await expect(routing).toContainText("It raises the grade of item 030 by 2 steps, from layout to released.");
  so.total = await previewedTotal(page);
  so.number = await propose(page);
  so.label = `${CODE}-CP-${String(so.number).padStart(2, "0")}`;
  await expect(page.getByRole("listitem").filter({ hasText: "160 cm long" })).toBeVisible();
  await expect(page.locator("strong", { hasText: "released" })).toBeVisible();

  const reviewers = await mailsArrived(mails, `${so.label} waits for a reviewer's signature`, [
    email("ines"),
    email("bram"),
    email("elske"),
  ]);
  const managers = await mailsArrived(mails, `${so.label} waits for a program manager's signature`, [
    email("lusia"),
    email("fenno"),
  ]);
  for (const { text } of [...reviewers, ...managers]) {
    expect(text).toContain(`${application.address}${sheetPath(CODE, so.number)}`);
    expect(text).not.toMatch(/\d N\b|160 cm|Rear panels/);
  }
});

test("the reviewer reads field by field, asks for action, and can't sign before it is settled", async ({
  pageOf,
  mails,
}) => {
  const [ines, tansy] = [await pageOf("ines"), await pageOf("tansy")];
  const path = sheetPath(CODE, so.number);
  await open(ines, path);
  const row = fieldRow(ines, ITEM, "Length along the flow");
  await expect(row.getByRole("cell").nth(0)).toContainText("1.5\u2009m");
  await expect(row.getByRole("cell").nth(1)).toContainText("1.6\u2009m");
  await expect(fieldRow(ines, ITEM, "Maturity grade")).toContainText("layout");
  const effects = await ines
    .getByRole("table", { name: `Fields of ${ITEM}` })
    .locator("td[data-label=Effect]")
    .allInnerTexts();
  const sum = effects.filter((text) => text.trim() !== "").reduce((total, text) => total + firstNumber(text), 0);
  const heading = await ines.getByText(/^revised, [+−]/).innerText();
  // Each printed to 0.01 N: the three changed fields sum to the line's effect.
  expect(Math.abs(sum - firstNumber(heading))).toBeLessThan(0.02);

  const second = await ines.context().newPage();
  await open(second, path);
  const early = await openDialog(second, "Sign as reviewer…");
  await ines.getByRole("button", { name: "Remark on 030 Length along the flow" }).click();
  const remark = ines.getByRole("dialog");
  await remark.getByLabel("Remark", { exact: true }).fill("Which sheet of **7714** shows the 160 cm?");
  await remark.getByLabel("Ask for action").check();
  await remark.getByRole("button", { name: "Add the remark" }).click();
  await expect(ines.getByText("No approval is taken while a remark asks for action: R1.")).toBeVisible();
  await expect(ines.getByRole("button", { name: "Sign as reviewer…" })).toHaveCount(0);
  await early.getByLabel("Your password").fill(DEMO_PASSWORD);
  await early.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(early.getByRole("alert")).toContainText("Settle what asks for action first: R1.");
  await second.close();

  await mailsArrived(mails, `${so.label}: remark R1 asks for action`, [email("tansy")]);
  await open(tansy, path);
  await tansy.getByRole("button", { name: "Answer remark 1" }).click();
  await tansy.getByRole("dialog").getByLabel("Your answer").fill("Sheet 2, the developed view.");
  await tansy.getByRole("dialog").getByRole("button", { name: "Answer", exact: true }).click();
  await expect(tansy.getByText("Sheet 2, the developed view.")).toBeVisible();
  await mailsArrived(mails, `${so.label}: remark R1 is answered`, [email("ines")]);

  await open(ines, path);
  await decide(ines, { trigger: "Settle…", label: "How it was settled", reason: "Sheet 2 seen.", confirm: "Settle" });
  await expect(ines.getByRole("button", { name: "Sign as reviewer…" })).toBeVisible();
});

test("the change can be taken along as a unified patch", async ({ pageOf }) => {
  const ines = await pageOf("ines");
  await open(ines, sheetPath(CODE, so.number));
  await ines.getByText("Export", { exact: true }).click();
  const waiting = ines.waitForEvent("download");
  await ines.getByRole("link", { name: "Change as a unified patch" }).click();
  const download = await waiting;
  expect(download.suggestedFilename()).toBe(`${so.label}.patch`);
  const [patch] = parsePatch(readFileSync(await download.path(), "utf8"));
  expect(patch?.oldFileName).toBe("item 030");
  const rows = patch?.hunks.flatMap(({ lines }) => lines) ?? [];
  for (const row of rows) expect(row).toMatch(/^[ +-][\w.]+: .+$/);
  expect(rows).toEqual(expect.arrayContaining(['-length: 1.5 m, typed "1.50 m"', '+length: 1.6 m, typed "160 cm"']));
  expect(rows).toEqual(expect.arrayContaining(['-breadth: 0.8 m, typed "0.80 m"', "+grade: released"]));
});

test("it is returned, revised and signed twice: the next issue has what was previewed", async ({ pageOf, mails }) => {
  const [ines, tansy, lusia] = [await pageOf("ines"), await pageOf("tansy"), await pageOf("lusia")];
  const path = sheetPath(CODE, so.number);
  await open(ines, path);
  const back = { trigger: "Return for rework…", label: /^What has to be done/, confirm: "Return" };
  await decide(ines, { ...back, reason: "Breadth without the fold, please." });
  await mailsArrived(mails, `${so.label} is returned`, [email("tansy")]);

  await open(tansy, path);
  await expect(tansy.getByText(/returned for rework/).first()).toBeVisible();
  await tansy.getByRole("link", { name: "Revise…" }).click();
  await lineForm(tansy, ITEM).getByLabel("Breadth, b").fill("77 cm");
  await isSaved(tansy);
  so.total = await previewedTotal(tansy);
  expect(await propose(tansy)).toBe(so.number);
  await expect(tansy.getByText(/proposed, round 2/).first()).toBeVisible();
  await expect(tansy.getByText(/^Nobody signs their own change: you are barred as its proposer/)).toBeVisible();
  await expect(tansy.getByRole("button", { name: /^Sign as/ })).toHaveCount(0);

  await open(ines, path);
  const dialog = await openDialog(ines, "Sign as reviewer…");
  await dialog.getByLabel("Your password").fill("not the password");
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(dialog.getByText("This is not your password.").first()).toBeVisible();
  await dialog.getByLabel("Your password").fill(DEMO_PASSWORD);
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(dialog).toBeHidden();
  await mailsArrived(mails, `${so.label}: signed by ${DEMO_PEOPLE.ines.name}`, [email("tansy")]);
  expect(await newestIssue(tansy, CODE)).toBe(so.firstIssue);

  await signSheet(lusia, path, { as: "program manager", password: DEMO_PASSWORD });
  const issue = so.firstIssue + 1;
  await mailsArrived(mails, `${so.label} is approved: issue ${issue}`, [email("tansy"), email("ines")]);
  expect(await newestIssue(tansy, CODE)).toBe(issue);
  await open(tansy, `/products/${CODE}/budget?point=OP-1`);
  expect((await printedStanding(tansy)).predicted).toBe(Number(so.total));
  await expect(tansy.locator("tr[data-item='030']")).toContainText("A");
  await expect(titleBlockField(tansy, "Approved")).toContainText(DEMO_PEOPLE.lusia.name);
  // Drawn from the numbers of the new issue: released grows by 5 %, to the printed hundredth.
  const [basic, growth] = [
    await figure(tansy, "Basic estimate of 030"),
    await figure(tansy, "Growth allowance of 030"),
  ];
  expect(Math.abs(growth - 0.05 * basic)).toBeLessThanOrEqual(0.01);
});
