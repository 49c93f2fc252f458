import { frictionLayer } from "@/lib/aero/friction/friction-layer";
import type { FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import { bestTimes } from "./processor-time";

const CALLS = 20_000;
const ROUNDS = 9;
const REYNOLDS = Array.from({ length: CALLS }, (_, index) => 10 ** (5.8 + (3.2 * index) / CALLS));

/** Milliseconds of 20,000 friction integrals, each of a layer of its own roughness as in a budget at many speeds. */
export function momentumIntegralTimes() {
  return bestTimes(
    {
      closedForm: () => frictionOf("prandtl-schlichting", () => 0),
      smooth: () => frictionOf("momentum-integral", () => 0),
      rough: () => frictionOf("momentum-integral", (re) => re / 1e4),
    },
    ROUNDS,
  );
}

function frictionOf(line: FrictionLineName, roughnessReynolds: (reynolds: number) => number): number {
  let sum = 0;
  for (const re of REYNOLDS) {
    const layer = frictionLayer(FRICTION_LINES[line], roughnessReynolds(re), { kind: "from-start" });
    sum += layer.frictionIntegral(re);
  }
  return sum;
}
