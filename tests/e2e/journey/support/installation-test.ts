import { test as base, type Page } from "@playwright/test";
import { emptyInstallation, type EmptyInstallation } from "@/tests/e2e/support/empty-installation";
import { signInAs, type Credentials } from "./sign-in";

interface WorkerFixtures {
  installation: EmptyInstallation;
  /** The page of an account, signed in once and kept. */
  pageFor: (account: Credentials) => Promise<Page>;
}

/** An installation that nobody has used yet, and the people who take it into use. */
export const test = base.extend<object, WorkerFixtures>({
  installation: [
    async ({}, use) => {
      const installation = await emptyInstallation();
      await use(installation);
      await installation.stop();
    },
    { scope: "worker", timeout: 240_000 },
  ],
  pageFor: [
    async ({ browser, installation }, use) => {
      const pages = new Map<string, Page>();
      await use(async (account) => {
        const known = pages.get(account.email);
        if (known) return known;
        const viewport = { width: 1280, height: 900 };
        const context = await browser.newContext({ baseURL: installation.address, viewport, locale: "en-GB" });
        context.setDefaultTimeout(60_000);
        const page = await context.newPage();
        pages.set(account.email, page);
        await signInAs(page, installation.address, account);
        return page;
      });
      for (const page of pages.values()) await page.context().close();
    },
    { scope: "worker", timeout: 240_000 },
  ],
});
