import { type Page } from "@playwright/test";
import { DEMO_PASSWORD, DEMO_PEOPLE, type DemoPerson } from "@/scripts/demo/people";
import { test as base } from "@/tests/e2e/support/leeboard-test";
import { signInAs } from "./sign-in";

interface WorkerFixtures {
  /** The page of a person of the demo, signed in once and kept: each works in a browser of their own. */
  pageOf: (person: DemoPerson) => Promise<Page>;
}

/** The people of the demo at work side by side. */
export const test = base.extend<object, WorkerFixtures>({
  pageOf: [
    async ({ browser, application }, use) => {
      const pages = new Map<DemoPerson, Page>();
      await use(async (person) => {
        const known = pages.get(person);
        if (known && !known.isClosed()) return known;
        const viewport = { width: 1280, height: 900 };
        const context = await browser.newContext({ baseURL: application.address, viewport, locale: "en-GB" });
        context.setDefaultTimeout(60_000);
        const page = await context.newPage();
        pages.set(person, page);
        await signInAs(page, application.address, { email: DEMO_PEOPLE[person].email, password: DEMO_PASSWORD });
        return page;
      });
      for (const page of pages.values()) await page.context().close();
    },
    { scope: "worker", timeout: 240_000 },
  ],
});
