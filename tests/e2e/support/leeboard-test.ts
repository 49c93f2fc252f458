import { test as base, expect, type Page } from "@playwright/test";
import { DEMO_PASSWORD } from "@/scripts/demo/people";
import { caughtMails, type CaughtMail } from "./caught-mails";
import { runningApplication, type RunningApplication } from "./running-application";

interface Fixtures {
  /** Signs a person of the demo in and waits for their first page. */
  signIn: (page: Page, email: string) => Promise<void>;
  mails: () => Promise<CaughtMail[]>;
}

/** Browser tests run against the built application with the demo's data. */
export const test = base.extend<Fixtures, { application: RunningApplication }>({
  application: [
    async ({}, use) => {
      const template = process.env.LEEBOARD_DEMO_TEMPLATE;
      if (!template) throw new Error("The global set-up prepares the demo; it did not run.");
      const application = await runningApplication(template);
      await use(application);
      await application.stop();
    },
    { scope: "worker", timeout: 90_000 },
  ],
  baseURL: async ({ application }, use) => use(application.address),
  signIn: async ({ application }, use) => {
    await use(async (page, email) => {
      await page.goto(`${application.address}/sign-in`);
      await hydrated(page);
      await page.getByLabel("E-mail").fill(email);
      await page.getByLabel("Password").fill(DEMO_PASSWORD);
      await page.getByRole("button", { name: "Sign in" }).click();
      await expect(page).not.toHaveURL(/sign-in/);
      await hydrated(page);
    });
  },
  mails: async ({ application }, use) => use(() => caughtMails(application.mailAddress)),
});

export { expect };

/** React has taken over the page: what is typed or pressed before would be lost. */
export async function hydrated(page: Page): Promise<void> {
  await page.waitForFunction(() => Object.keys(document).some((key) => key.startsWith("__reactContainer")));
}
