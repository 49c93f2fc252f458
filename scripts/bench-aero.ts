import { blasiusFrictionIntegral } from "@/lib/aero/friction/blasius";
import { frictionLayer } from "@/lib/aero/friction/friction-layer";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import {
  localCoefficientAt,
  reynoldsAt,
  stateAtReynolds,
  stateAtReynoldsTheta,
} from "@/lib/aero/friction/wall-and-wake";
import { monteCarloTimes } from "./bench-monte-carlo";

/** Times of one evaluation, as ratios to a bare logarithmic line in the same run: machines differ, ratios hardly. */
const ROUNDS = 7;
const CALLS = 20_000;

const REYNOLDS = Array.from({ length: CALLS }, (_, index) => 10 ** (5 + (4 * index) / CALLS));
const roughLine = FRICTION_LINES["momentum-integral"].turbulentLayer(500);
const smoothLine = FRICTION_LINES["momentum-integral"].turbulentLayer(0);

const SUBJECTS: [string, (reynolds: number) => number][] = [
  ["bare 0.455/(log Re)^2.58", (re) => 0.455 / Math.log10(re) ** 2.58],
  ...Object.values(FRICTION_LINES)
    .filter(({ name }) => name !== "momentum-integral")
    .map((line): [string, (re: number) => number] => {
      const layer = frictionLayer(line, 50, { kind: "at", reynolds: 5e4 });
      return [`${line.name}, with its laminar stretch`, (re) => layer.frictionIntegral(re)];
    }),
  ["momentum integral, closed form Re(λ), smooth", (re) => reynoldsAt(Math.log10(re) * 3, 0)],
  ["momentum integral, closed form Re(λ), rough", (re) => reynoldsAt(Math.log10(re) * 3, 120)],
  ["momentum integral, solved for λ, smooth", (re) => smoothLine.frictionIntegral(re)],
  ["momentum integral, solved for λ, rough", (re) => roughLine.frictionIntegral(re)],
  ["profile of a given Re_θ", (re) => stateAtReynoldsTheta(re / 500, 0)],
];

function nanosecondsPerCall(subject: (reynolds: number) => number): number {
  const times = Array.from({ length: ROUNDS }, () => {
    const start = performance.now();
    let sum = 0;
    for (const re of REYNOLDS) sum += subject(re);
    if (!Number.isFinite(sum)) throw new Error("a subject gave no number");
    return ((performance.now() - start) * 1e6) / CALLS;
  });
  return Math.min(...times);
}

/** One plate by marching dθ/dx with N Runge–Kutta steps in ln x, as the closed form's rival to the same nine digits. */
function marchedIntegral(reynolds: number, steps: number): number {
  const start = 3e4;
  let theta = smoothLine.frictionIntegral(start) / 2;
  const slope = (re: number, value: number): number => (localCoefficientAt(stateAtReynoldsTheta(value, 0)) / 2) * re;
  const h = Math.log(reynolds / start) / steps;
  for (let index = 0; index < steps; index += 1) {
    const [re, middle, end] = [index, index + 0.5, index + 1].map((at) => start * Math.exp(at * h));
    if (re === undefined || middle === undefined || end === undefined) throw new Error("no place to march from");
    const k1 = slope(re, theta);
    const k2 = slope(middle, theta + (h * k1) / 2);
    const k3 = slope(middle, theta + (h * k2) / 2);
    const k4 = slope(end, theta + h * k3);
    theta += (h * (k1 + 2 * k2 + 2 * k3 + k4)) / 6;
  }
  return 2 * theta;
}

const baseline = nanosecondsPerCall((re) => 0.455 / Math.log10(re) ** 2.58);
for (const [name, subject] of SUBJECTS) report(name, nanosecondsPerCall(subject));

const marchedFrom = performance.now();
const MARCHES = 200;
let worst = 0;
for (let index = 0; index < MARCHES; index += 1) {
  const re = 10 ** (6 + (3 * index) / MARCHES);
  worst = Math.max(worst, Math.abs(marchedIntegral(re, 64) / smoothLine.frictionIntegral(re) - 1));
}
report(
  `momentum integral marched in 64 steps (error ${worst.toExponential(1)})`,
  ((performance.now() - marchedFrom) * 1e6) / MARCHES,
);
report("Blasius", nanosecondsPerCall(blasiusFrictionIntegral));
report(
  "λ of Re, smooth",
  nanosecondsPerCall((re) => stateAtReynolds(re, 0)),
);

function report(name: string, nanoseconds: number): void {
  const ratio = nanoseconds / baseline;
  process.stdout.write(
    `${name.padEnd(62)} ${nanoseconds.toFixed(0).padStart(9)} ns  ${ratio.toFixed(1).padStart(9)} ×\n`,
  );
}

const { bare, drawn } = monteCarloTimes();
process.stdout.write(
  `Monte Carlo, 10⁴ draws of 200 items: ${drawn.toFixed(2)} s, ${(drawn / bare).toFixed(2)} × the bare loop of the same draws and formulas (at most 2 ×)\n`,
);
