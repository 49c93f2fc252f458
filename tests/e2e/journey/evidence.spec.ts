import { readFileSync } from "node:fs";
import { writtenPdf } from "@/scripts/demo/written-files";
import { citeEvidence, isSaved, propose, reviseLine, startDraft, writeReason } from "./support/draft-sheet";
import { test } from "./support/journey-test";
import { expect } from "./support/patient-expect";
import { open } from "./support/sign-in";

const LINE = "110 Side-marker lamps (8)";
const FILE = "layout 88.png";

test("an owner cites a file, a reviewer downloads it, and the sheet says who opened it", async ({ pageOf }) => {
  test.setTimeout(300_000);
  const content = writtenPdf(["Invented for a test: layout of the side-marker lamps"]);

  const owner = await pageOf("odo");
  await startDraft(owner, "TF2", "Side-marker lamps as laid out");
  const form = await reviseLine(owner, LINE);
  await citeEvidence(form, { document: "Layout 88", revision: "B", date: "2026-11-02" });
  const picked = { name: FILE, mimeType: "image/png", buffer: content };
  await form.locator("input[type=file]").last().setInputFiles(picked);
  await expect(form.getByRole("link", { name: FILE })).toBeVisible();
  await writeReason(owner, "The layout is drawn now.");
  await isSaved(owner);
  const path = `/products/TF2/proposals/${await propose(owner)}`;

  const reviewer = await pageOf("bram");
  await open(reviewer, path);
  const mine = reviewer.getByRole("row", { name: /Bram/ }).filter({ hasText: FILE });
  await expect(mine).toContainText(`${FILE}: not opened`);
  const download = reviewer.waitForEvent("download");
  await reviewer.getByRole("table", { name: "Evidence" }).getByRole("link", { name: FILE }).click();
  const saved = await download;
  // A PDF by its content, whatever its name says.
  expect(saved.suggestedFilename()).toBe(`${FILE}.pdf`);
  expect(readFileSync(await saved.path()).equals(content)).toBe(true);
  await reviewer.getByRole("button", { name: `Change history of ${LINE}…` }).click();
  await expect(reviewer.getByRole("dialog").getByRole("table", { name: "Revisions" })).toBeVisible();

  const auditor = await pageOf("maud");
  await open(auditor, path);
  const seen = auditor.getByRole("row", { name: /Bram/ }).filter({ hasText: FILE });
  await expect(seen).toContainText(`${FILE}: opened`);
  await expect(seen).toContainText(`${LINE}: opened`);
});
