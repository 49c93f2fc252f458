import { type ConsoleMessage, type Page } from "@playwright/test";
import { source as axe } from "axe-core";
import { type DemoPerson } from "@/scripts/demo/people";
import { hydrated } from "../support/leeboard-test";
import { test } from "./support/journey-test";
import { expect } from "./support/patient-expect";

const WIDTHS = [1280, 390];
const RULES = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];

const SHARED = ["/", "/products", "/account", "/products/TF2/budget", "/products/TF2/proposals"];
const READING = [
  "/products/TF2/proposals/5",
  "/products/TF2/items/030",
  "/products/TF2/operating-points",
  "/products/TF2/issues",
  "/products/TF2/people",
];
const MANAGED = [
  ...["/products", "/products/TF2/proposals", "/products/TF2/operating-points", "/products/TF2/people"],
  ...["/products/TF2/issues?from=2&to=3", "/products/TF2/catalogue", "/products/TF2/report", "/products/TF2/pictures"],
  ...["/products/TF2/what-if", "/products/TF2/uncertainty", "/products/PD7/growth", "/products/PD7/budget?point=OP-2"],
  ...["/products/GS4/budget", "/products/GS4/items/010"],
];
/** Here a role puts other controls than another. */
const DIFFERS_BY_ROLE = ["/", "/products/TF2/budget", "/products/TF2/proposals/5", "/products/TF2/items/030"];
const SHEET_PAGES = new WeakMap<Page, Page>();

/** Each role with the sheets that look otherwise to it, and those that it alone opens. */
const ROUNDS: readonly { person: DemoPerson; paths: readonly string[] }[] = [
  { person: "tansy", paths: [...SHARED, ...READING, "/trial", "/products/TF2/proposals/5/edit"] },
  { person: "ines", paths: [...DIFFERS_BY_ROLE, "/sign"] },
  { person: "lusia", paths: [...DIFFERS_BY_ROLE, ...MANAGED] },
  {
    person: "maud",
    paths: [
      ...DIFFERS_BY_ROLE,
      ...["/products/TF2/history", "/products/TF2/budget?issue=3", "/products/TF2/issues/3/recomputed"],
      "/products/TF2/uncertainty?issue=3",
    ],
  },
  {
    person: "wilmot",
    paths: [
      ...["/", "/products", "/account", "/administration/accounts", "/administration/products"],
      ...["/administration/roles?product=TF2", "/administration/history"],
    ],
  },
];

// Nothing here changes anything, so that any worker can take any sheet.
test.describe.configure({ mode: "parallel", timeout: 180_000 });

for (const { person, paths } of ROUNDS) {
  for (const path of paths) {
    test(`${path} stands, is quiet and can be read by everyone, as ${person} sees it`, async ({ pageOf }) => {
      const page = await sheetPageBeside(await pageOf(person));
      await page.setViewportSize({ width: Math.max(...WIDTHS), height: 900 });
      const complaints = await complaintsDuring(page, async () => {
        const response = await page.goto(path);
        expect(response?.status()).toBe(200);
        await hydrated(page);
        await expect(page).toHaveTitle(/\S.*Leeboard/);
        await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
        for (const width of WIDTHS) {
          await page.setViewportSize({ width, height: 900 });
          expect.soft(await overhang(page), `pixels beyond ${width}`).toBeLessThanOrEqual(0);
          if (!isReadByRulesAt(width, path, person)) continue;
          expect.soft(await violations(page), `at ${width} px`).toEqual([]);
        }
      });
      expect(complaints).toEqual([]);
    });
  }
}

test("a sheet that is not one's own says so plainly", async ({ pageOf }) => {
  const page = await pageOf("tansy");
  for (const [path, status] of [
    ["/administration/accounts", 403],
    ["/products/NONE-1/budget", 404],
    ["/products/TF2/items/999", 404],
  ] as const) {
    const response = await page.goto(path);
    expect(response?.status(), path).toBe(status);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  }
});

/**
 * Reading a page by the rules takes seconds: at every width for the first who opens it; for the others at the widest,
 * and only where their role puts other controls on it.
 */
function isReadByRulesAt(width: number, path: string, person: DemoPerson): boolean {
  const first = ROUNDS.find(({ paths }) => paths.includes(path))?.person;
  return person === first || (width === Math.max(...WIDTHS) && DIFFERS_BY_ROLE.includes(path));
}

/** A second page of the same person, kept for all their sheets: its width and its console are nobody else's. */
async function sheetPageBeside(page: Page): Promise<Page> {
  const known = SHEET_PAGES.get(page);
  if (known) return known;
  const beside = await page.context().newPage();
  SHEET_PAGES.set(page, beside);
  return beside;
}

/** Errors of the console, uncaught ones and what the content security policy blocked. */
async function complaintsDuring(page: Page, work: () => Promise<void>): Promise<string[]> {
  const complaints: string[] = [];
  const said = (message: ConsoleMessage) => {
    if (message.type() === "error") complaints.push(message.text());
  };
  const thrown = (error: Error) => complaints.push(error.message);
  page.on("console", said).on("pageerror", thrown);
  await work();
  page.off("console", said).off("pageerror", thrown);
  return complaints;
}

function overhang(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
}

/** The rules run in the page, and only what breaks one comes back: the list of all that holds is long and slow to carry. */
async function violations(page: Page): Promise<string[]> {
  await page.evaluate(axe);
  const options = { runOnly: { type: "tag", values: RULES }, resultTypes: ["violations"] };
  return page.evaluate(`axe.run(document, ${JSON.stringify(options)}).then(({ violations }) =>
    violations.map(({ id, nodes }) => id + ": " + nodes.map(({ target }) => target.join(" ")).join(", ")))`);
}
