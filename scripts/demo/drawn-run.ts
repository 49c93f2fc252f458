import { drawAndKeep } from "@/lib/budget/monte-carlo/draw-and-keep";
import type { DemoHouse } from "./demo-house";
import type { DemoPerson } from "./people";

/** Few enough to keep the filling quick, many enough for an interval to three digits. */
const DRAWS = 10_000;
const SEED = 2026;

/** A run that somebody draws of the newest issue at its first operating point, kept beside the first order. */
export async function drawRun(house: DemoHouse, person: DemoPerson, productCode: string): Promise<void> {
  const input = { productCode, issue: "newest", operatingPoint: "OP-1", draws: DRAWS, seed: SEED } as const;
  await drawAndKeep(await house.actor(person), input, house.clock, { onThisThread: true });
}
