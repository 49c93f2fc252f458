import { expect as baseExpect } from "@playwright/test";

/** Pages are waited for as long as a loaded machine needs. */
export const expect = baseExpect.configure({ timeout: 45_000 });
