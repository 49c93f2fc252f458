import { figure, openWorking, printedStanding } from "./support/budget-sheet";
import { openDialog, sheetPath, signSheet } from "./support/change-sheet";
import { addLine, isSaved, lineForm, previewedTotal, propose, startDraft, writeReason } from "./support/draft-sheet";
import { test } from "./support/installation-test";
import { expect } from "./support/patient-expect";
import { plateInWater } from "./support/plate-by-hand";
import { open, signInAs } from "./support/sign-in";

const CODE = "RB-1";
const PRODUCT = `/products/${CODE}`;
const PEOPLE = {
  mina: {
    name: "Mina Farrowdale",
    email: "mina@example.org",
    password: "mina first password",
    role: "Program manager",
  },
  jory: {
    name: "Jory Applegarth",
    email: "jory@example.org",
    password: "jory first password",
    role: "Program manager",
  },
  orla: {
    name: "Orla Twelvetree",
    email: "orla@example.org",
    password: "orla first password",
    role: "Component owner",
  },
  rhona: { name: "Rhona Stellwood", email: "rhona@example.org", password: "rhona first password", role: "Reviewer" },
} as const;

test.describe.configure({ mode: "serial", timeout: 400_000 });

test("the first administrator changes the printed password and makes the accounts", async ({
  pageFor,
  installation,
}) => {
  const { administrator } = installation;
  const page = await pageFor(administrator);
  await open(page, "/account");
  await page.getByLabel("Present password").fill(administrator.password);
  await page.getByLabel("New password", { exact: true }).fill("a password of her own");
  await page.getByLabel("New password again").fill("a password of her own");
  await page.getByRole("button", { name: "Change the password" }).click();
  await expect(page).toHaveURL(/sign-in/);
  await signInAs(page, installation.address, { email: administrator.email, password: "a password of her own" });

  await open(page, "/administration/accounts");
  for (const { name, email, password } of Object.values(PEOPLE)) {
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Name").fill(name);
    await page.getByLabel("First password").fill(password);
    await page.getByRole("button", { name: "Make the account" }).click();
    await expect(page.getByText(`The account of ${name} is made.`)).toBeVisible();
  }
});

test("the administrator makes a product and gives its roles", async ({ pageFor, installation }) => {
  const page = await pageFor(installation.administrator);
  await open(page, "/administration/products");
  await page.getByLabel("Code").fill(CODE);
  await page.getByLabel("Name").fill("Rudder blade, towed");
  await page.getByLabel("Kind").selectOption({ label: "Other body" });
  await page.getByRole("button", { name: "Make the product" }).click();
  await expect(page.getByText(`${CODE} is made.`)).toBeVisible();

  await open(page, `/administration/roles?product=${CODE}`);
  for (const { name, role } of Object.values(PEOPLE)) {
    await page.getByLabel("Person").selectOption({ label: name });
    await page.getByLabel("Role", { exact: true }).selectOption({ label: role });
    await page.getByRole("button", { name: "Give the role" }).click();
    await expect(page.getByRole("table", { name: "Roles" }).getByRole("row", { name })).toContainText(role);
  }
  await open(page, `${PRODUCT}/budget`);
  await expect(page.getByRole("link", { name: /stablish/ })).toHaveCount(0);
});

test("a program manager establishes it with their password", async ({ pageFor }) => {
  const page = await pageFor(PEOPLE.mina);
  await page
    .getByRole("link", { name: `Establish ${CODE}` })
    .first()
    .click();
  await expect(page).toHaveURL(/establish$/);
  await open(page, `${PRODUCT}/establish`);
  await page.getByLabel("Name").fill("Towed, 18 km/h");
  await page.getByLabel("Fluid").selectOption({ label: "Custom" });
  await page.getByLabel("Density").fill("1000 kg/m³");
  await page.getByLabel("Dynamic viscosity").fill("0.001 Pa·s");
  await page.getByLabel("Speed").fill("18 km/h");
  await expect(page.locator("output", { hasText: /= 5\sm\/s/ })).toBeVisible();
  await page.getByLabel("Limit").fill("0.4 kN");
  await page.getByLabel("Reserve").fill("20 N");
  const dialog = await openDialog(page, "Sign and establish…");
  await dialog.getByLabel("Your password").fill(PEOPLE.mina.password);
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(page).toHaveURL(/\/budget$/);
  await expect(page.getByText("No items yet.")).toBeVisible();
  expect([await figure(page, "Limit"), await figure(page, "Reserve")]).toEqual([400, 20]);
});

test("a group and a plate come by proposal, with allocation from the unallocated rest", async ({ pageFor }) => {
  const page = await pageFor(PEOPLE.mina);
  await startDraft(page, CODE, "The blade");
  const group = await addLine(page, "group");
  await group.getByLabel("Name").fill("Wetted surfaces");
  const item = await addLine(page, "item");
  await item.getByLabel("Name").fill("Blade, both faces");
  const form = lineForm(page, "010 Blade, both faces");
  await form.getByLabel("Owner").selectOption({ label: PEOPLE.orla.name });
  await form.getByLabel("Group").selectOption({ label: "G10 Wetted surfaces" });
  await form.getByLabel("Length along the flow, L").fill("200 cm");
  await form.getByLabel("Breadth, b").fill("500 mm");
  await form.getByLabel("Wetted faces, n").fill("2");
  await form.getByLabel("Transition").selectOption({ label: "Tripped" });
  await form.getByLabel("Friction line").selectOption({ label: "Prandtl–Schlichting" });
  await page.getByRole("button", { name: "Add a transfer" }).click();
  await page.getByLabel("To", { exact: true }).selectOption({ label: "010 Blade, both faces" });
  await page.getByLabel("Moves").fill("95");
  await writeReason(page, "First sheet of the blade.");
  await isSaved(page);

  const basic = plateInWater({ length: 2, breadth: 0.5, faces: 2, speed: 5, density: 1000, viscosity: 0.001 });
  // Estimated grows by 20 %.
  expect(Math.abs(Number(await previewedTotal(page)) - 1.2 * basic)).toBeLessThanOrEqual(0.006);
  const number = await propose(page);
  await expect(page.getByText("Nobody signs their own change").first()).toBeVisible();

  for (const [person, as] of [
    ["rhona", "reviewer"],
    ["jory", "program manager"],
  ] as const) {
    const signer = await pageFor(PEOPLE[person]);
    await signSheet(signer, sheetPath(CODE, number), { as, password: PEOPLE[person].password });
  }
  await open(page, `${PRODUCT}/budget`);
  expect(Math.abs((await figure(page, "Basic estimate of 010")) - basic)).toBeLessThanOrEqual(0.006);
  expect(Math.abs((await printedStanding(page)).predicted - 1.2 * basic)).toBeLessThanOrEqual(0.006);
  expect(await figure(page, "Allocation of 010")).toBe(95);
  await expect(page.getByText("Wetted surfaces").first()).toBeVisible();
  const working = await openWorking(page, "Basic estimate of 010");
  await expect(working).toContainText("Prandtl");
});
