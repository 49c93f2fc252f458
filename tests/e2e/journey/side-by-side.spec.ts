import { DEMO_PASSWORD, DEMO_PEOPLE } from "@/scripts/demo/people";
import { openDialog } from "./support/change-sheet";
import { isSaved, startDraft } from "./support/draft-sheet";
import { test } from "./support/journey-test";
import { expect } from "./support/patient-expect";
import { open } from "./support/sign-in";

test("two editors of one field see each other's value before either is saved over", async ({ pageOf }) => {
  const [tansy, fenno] = [await pageOf("tansy"), await pageOf("fenno")];
  await startDraft(tansy, "TF2", "Edited by two");
  const dialog = await openDialog(tansy, "Name a co-editor…");
  await dialog.getByRole("combobox").selectOption({ label: DEMO_PEOPLE.fenno.name });
  await dialog.getByRole("button", { name: "Name", exact: true }).click();
  await expect(dialog).toBeHidden();

  await open(fenno, new URL(tansy.url()).pathname);
  await fenno.getByRole("textbox", { name: "Title" }).fill("As Fenno has it");
  await isSaved(fenno);
  await expect(async () => {
    await fenno.reload();
    await expect(fenno.getByRole("textbox", { name: "Title" })).toHaveValue("As Fenno has it", { timeout: 1000 });
  }).toPass();

  await tansy.getByRole("textbox", { name: "Title" }).fill("As Tansy has it");
  await expect(tansy.getByText("changed what you changed too")).toBeVisible();
  await expect(tansy.getByText("As Fenno has it")).toBeVisible();
  await tansy.getByLabel("Yours of Title").check();
  await tansy.getByRole("button", { name: "Save what is chosen" }).click();
  await isSaved(tansy);
  await fenno.reload();
  await expect(fenno.getByRole("textbox", { name: "Title" })).toHaveValue("As Tansy has it");
});

test("several sheets are signed with one password, each only after it was opened as it stands", async ({ pageOf }) => {
  const elske = await pageOf("elske");
  await open(elske, "/sign");
  const unread = elske.getByRole("row").filter({ hasText: "not opened as it stands now" });
  const links = await unread.getByRole("link").evaluateAll((found) => found.map((link) => link.getAttribute("href")));
  // Of two products: an issue that the first signature makes can then not overtake the second sheet.
  const [one = "", other = ""] = new Map(links.map((link) => [link?.split("/")[2], link ?? ""])).values();
  for (const sheet of [one, other]) await open(elske, sheet);

  await open(elske, "/sign");
  await expect(elske.getByRole("checkbox")).toHaveCount(2);
  await elske.getByLabel("Your password").fill("not her password");
  await elske.getByRole("button", { name: "Sign the chosen sheets" }).click();
  await expect(
    elske
      .getByText(/password/i)
      .filter({ hasText: /not|wrong/i })
      .first(),
  ).toBeVisible();
  await elske.getByLabel("Your password").fill(DEMO_PASSWORD);
  await elske.getByRole("button", { name: "Sign the chosen sheets" }).click();
  await expect(elske.getByRole("checkbox")).toHaveCount(0);
  await expect(elske.getByText(/ is signed[;:]/)).toHaveCount(2);
});
