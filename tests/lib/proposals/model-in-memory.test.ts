import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { firstModel } from "./walk/first-issues";
import { pureDesk } from "./walk/pure-desk";
import { walkCommands } from "./walk/walk-commands";

/** More of them, and others, are run by hand: LEEBOARD_PURE_WALKS=20000 LEEBOARD_WALK_SEED=1. */
const WALKS = Number(process.env.LEEBOARD_PURE_WALKS ?? 2000);
const SEED = Number(process.env.LEEBOARD_WALK_SEED ?? 20_261_201);
const ACTS = 24;
const ACTS_TOLD = [
  ...["start", "save", "propose", "propose again", "approve as reviewer", "approve as program_manager", "return"],
  ...["disapprove", "take back", "withdraw", "share", "ask", "settle", "object", "carry forward"],
];

describe(`${WALKS} walks of random acts by random people, in memory`, () => {
  it("go as the rules in words say, act by act, and reach every kind of act", async () => {
    const told = new Set<string>();
    const tell = (outcome: string) => void told.add(outcome);
    const walks = fc.commands(walkCommands(tell), { maxCommands: ACTS, size: "max" });
    await fc.assert(
      fc.asyncProperty(walks, (commands) =>
        fc.asyncModelRun(() => ({ model: firstModel(), real: pureDesk() }), commands),
      ),
      { numRuns: WALKS, seed: SEED },
    );
    // The walks are worth something only if they went everywhere, allowed and not.
    for (const act of ACTS_TOLD) {
      for (const outcome of ["done", "refused"])
        expect([...told], `${act}: ${outcome}`).toContain(`${act}: ${outcome}`);
    }
  }, 3_600_000);
});
