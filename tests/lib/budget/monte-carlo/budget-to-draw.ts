import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterAll, beforeAll } from "vitest";
import { buildMonteCarloWorker } from "@/scripts/readiness/monte-carlo-worker.mjs";
import type { Actor } from "@/lib/vocabulary/actor";
import { addItem, approve, establish } from "@/tests/support/budget-on-file";
import { person, product, withRole } from "@/tests/support/people";

/** The thread that draws, built for the tests of a file. */
export function withWorker(): { workerFile: string } {
  const folder = mkdtempSync(path.join(os.tmpdir(), "leeboard-draw-"));
  const workerFile = path.join(folder, "worker.mjs");
  beforeAll(() => buildMonteCarloWorker(workerFile));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  return { workerFile };
}

export interface Cast {
  tansy: Actor;
  ines: Actor;
  lusia: Actor;
  maud: Actor;
  otto: Actor;
}

/** TF-2 at issue 2 with these items, its four roles, and Otto who holds none. */
export async function budgetOnFile(
  items: (ownerId: number) => Record<string, object>,
  first: { limit?: number; point?: object } = {},
): Promise<Cast> {
  await product("TF-2");
  const tansy = await withRole(await person("Tansy Merle"), "TF-2", "component_owner");
  const ines = await withRole(await person("Ines Maat"), "TF-2", "reviewer");
  const lusia = await withRole(await person("Lusia Brand"), "TF-2", "program_manager");
  const maud = await withRole(await person("Maud Quill"), "TF-2", "auditor");
  await establish(lusia, "TF-2", "2026-03-01T09:00:00.000Z", first);
  await approve("TF-2", "2026-03-10T09:00:00.000Z", {
    proposer: tansy,
    signers: [
      [ines, "reviewer"],
      [lusia, "program_manager"],
    ],
    edits: Object.entries(items(tansy.userId)).map(([number, body]) => addItem(number, body)),
  });
  return { tansy, ines, lusia, maud, otto: await person("Otto Veer") };
}
