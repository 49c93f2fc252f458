import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { onTestFinished } from "vitest";

/** A folder with the given files, gone when the test is over. */
export function temporaryTree(files: Readonly<Record<string, string>> = {}): string {
  const folder = mkdtempSync(path.join(os.tmpdir(), "leeboard-tree-"));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  for (const [name, content] of Object.entries(files)) {
    const file = path.join(folder, name);
    mkdirSync(path.dirname(file), { recursive: true });
    writeFileSync(file, content);
  }
  return folder;
}
