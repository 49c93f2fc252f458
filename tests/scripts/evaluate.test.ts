import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { EXAMPLE } from "@/tests/lib/evaluation/document/example";

const ROOT = path.resolve(__dirname, "../..");
let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), "evaluate-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

function run(args: string[], input?: string) {
  const { status, stdout, stderr } = spawnSync("npm", ["run", "-s", "evaluate", "--", ...args], {
    cwd: ROOT,
    input,
    encoding: "utf8",
  });
  return { status, stdout, stderr };
}

function file(text: string): string {
  const name = path.join(folder, "document.json");
  writeFileSync(name, text);
  return name;
}

describe("npm run -s evaluate", () => {
  it("reads a file or standard input and writes one JSON document in full precision", () => {
    const byFile = run([file(JSON.stringify(EXAMPLE))]);
    expect(byFile).toMatchObject({ status: 0, stderr: "" });
    expect(run([], JSON.stringify(EXAMPLE))).toEqual(byFile);
    const answer = JSON.parse(byFile.stdout);
    // q of the tow tank is ½·998.2·2² = 1996.4 Pa; the trim has 0.3·0.06 m².
    expect(answer.operatingPoints[1].items[1].drag).toBeCloseTo(1996.4 * 0.018, 12);
  });

  it("exits with 2 and one line per fault on standard error, and writes nothing else", () => {
    const items = [{ ...EXAMPLE.items[0], length: 0, breadth: -1 }];
    const { status, stdout, stderr } = run([], JSON.stringify({ ...EXAMPLE, items }));
    expect(status).toBe(2);
    expect(stdout).toBe("");
    expect(stderr).toBe("items[0].length: must be greater than 0\nitems[0].breadth: must be greater than 0\n");
  });

  it.each(["{", "", "not JSON\nat all"])("exits with 2 where the text is no JSON: %j", (text) => {
    const { status, stdout, stderr } = run([], text);
    expect(status).toBe(2);
    expect(stdout).toBe("");
    expect(stderr).toMatch(/^document: must be JSON .*\n$/);
  });

  it("exits with 2 where the file cannot be read", () => {
    const { status, stderr } = run([path.join(folder, "nowhere.json")]);
    expect(status).toBe(2);
    expect(stderr).toMatch(/^document: cannot be read .*\n$/);
  });

  it("exits with 3 where an item is refused, with the sentence in its place and the others given", () => {
    const items = [
      { id: "plate", method: "flat-plate-friction", length: 1e6, breadth: 1, faces: 1 },
      { id: "fixed", method: "fixed", force: 2 },
    ];
    const { status, stdout, stderr } = run([], JSON.stringify({ ...EXAMPLE, items }));
    expect(status).toBe(3);
    expect(stderr).toBe("");
    const [point] = JSON.parse(stdout).operatingPoints;
    expect(point.items[0].refused).toMatch(/^Re .* is outside every friction line/);
    expect(point.items[1].drag).toBe(2);
    expect(point).not.toHaveProperty("totalDrag");
  });
});
