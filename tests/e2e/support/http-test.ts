import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { test as base, expect } from "@playwright/test";
import type { HttpAnswer } from "./http-answer";
import type { PersonName } from "./http-people";
import { signInOverHttp, type HttpPerson } from "./http-person";
import { storedState } from "./http-tables";
import { runningApplication, type RunningApplication } from "./running-application";

interface Refused {
  code: string;
  sentence: string | RegExp;
  /** Status of the answer; an action answers 200 and says no in its text. */
  status?: number;
  /** Where the sentence stands in the form, for faults of typing. */
  at?: string;
  /** The one entry that the history gets: refusals of right, state and independence. */
  recorded?: { act: string; by: HttpPerson };
}

interface WorkerFixtures {
  /** The script that fills the database of the application before it starts. */
  scene: string;
  application: RunningApplication;
  /** A person who is signed in; once for all tests of a file. */
  as: (name: PersonName) => Promise<HttpPerson>;
}

interface Fixtures {
  /** Does the act and demands that it is refused in these words and leaves everything as it was. */
  refuses: (act: () => Promise<HttpAnswer>, refused: Refused) => Promise<void>;
}

/** Tests over HTTP run against the built application with a small product of their own. */
export const test = base.extend<Fixtures, WorkerFixtures>({
  scene: ["tests/e2e/support/http-scene.ts", { option: true, scope: "worker" }],
  application: [
    async ({ scene }, use) => {
      const application = await applicationWithScene(scene);
      await use(application);
      await application.stop();
    },
    { scope: "worker", timeout: 300_000 },
  ],
  as: [
    async ({ application }, use) => {
      const people = new Map<PersonName, Promise<HttpPerson>>();
      await use((name) => {
        const person = people.get(name) ?? signInOverHttp(application.address, name);
        people.set(name, person);
        return person;
      });
    },
    { scope: "worker" },
  ],
  refuses: async ({ application }, use) => {
    await use(async (act, refused) => {
      const before = await storedState(application.dataFolder);
      expectRefusal(await act(), refused);
      const after = await storedState(application.dataFolder);

      expect(after.tables).toEqual(before.tables);
      expect(after.mails).toEqual(before.mails);
      const { recorded } = refused;
      const entry = recorded && {
        act: recorded.act,
        outcome: "refused",
        personId: recorded.by.userId,
        reason: typeof refused.sentence === "string" ? refused.sentence : expect.stringMatching(refused.sentence),
      };
      expect(after.history.slice(before.history.length)).toEqual(entry ? [expect.objectContaining(entry)] : []);
    });
  },
});

function expectRefusal(answer: HttpAnswer, { code, sentence, status = 200, at }: Refused): void {
  const words = typeof sentence === "string" ? sentence : expect.stringMatching(sentence);
  expect(answer).toMatchObject({ ok: false, status, code, sentence: words });
  if (at !== undefined) expect(answer).toHaveProperty("faults", [{ path: at, sentence: words }]);
}

async function applicationWithScene(scene: string): Promise<RunningApplication> {
  const { runTypeScript } = await import("@/scripts/readiness/run-typescript.mjs");
  const template = mkdtempSync(path.join(os.tmpdir(), "leeboard-http-"));
  try {
    const code = await runTypeScript(scene, [], { LEEBOARD_DATA: template });
    if (code !== 0) throw new Error("The scene of the tests could not be set; the reason stands above.");
    return await runningApplication(template);
  } finally {
    rmSync(template, { recursive: true, force: true });
  }
}
