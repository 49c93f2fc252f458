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
const OTHERS = [
  "/products/PD7/budget?point=OP-2",
  "/products/PD7/growth",
  "/products/TF2/uncertainty",
  "/products/TF2/catalogue",
  "/products/GS4/budget",
  "/products/GS4/items/010",
];

/** Each role with the sheets that it opens; what only one role sees stands with that role. */
const ROUNDS: readonly { person: DemoPerson; paths: readonly string[] }[] = [
  { person: "tansy", paths: [...SHARED, ...READING, "/trial", "/products/TF2/proposals/5/edit"] },
  { person: "ines", paths: [...SHARED, ...READING] },
  { person: "lusia", paths: [...SHARED, ...READING, ...OTHERS, "/products/TF2/issues?from=2&to=3"] },
  {
    person: "maud",
    paths: [
      ...SHARED,
      ...READING,
      "/products/TF2/history",
      "/products/TF2/budget?issue=3",
      "/products/TF2/issues/3/recomputed",
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
      // A page of its own: its width and its console are nobody else's.
      const page = await (await pageOf(person)).context().newPage();
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
      await page.close();
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

/** Reading a page by the rules takes seconds: at every width for the first who opens it, at the widest for the others. */
function isReadByRulesAt(width: number, path: string, person: DemoPerson): boolean {
  const first = ROUNDS.find(({ paths }) => paths.includes(path))?.person;
  return width === Math.max(...WIDTHS) || person === first;
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
