import { admissibleRoughness } from "@/lib/aero/admissible-roughness";
import {
  ROUGHNESS_COEFFICIENT,
  shapeFactorAt,
  stateAtReynoldsTheta,
  thicknessRatioAt,
} from "@/lib/aero/friction/wall-and-wake";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import { largeBudget } from "@/tests/support/large-budget";
import { bestTimes } from "./processor-time";

const ROUNDS = 25;
const CALLS = 5;
const GROWTH = 0.2;
const CRITICAL = 5e5;

interface BarePlate {
  length: number;
  runUp: number;
  breadth: number;
  roughness: number;
}

interface BareShare {
  fraction: number;
  /** Places of its members. */
  of: number[];
}

interface BareStream {
  speed: number;
  kinematicViscosity: number;
  dynamicPressure: number;
}

/** Everything that the formulas need, in plain numbers. */
type BareItem =
  | { kind: "plate"; plate: BarePlate }
  | { kind: "area"; dragArea: number }
  | { kind: "fixed"; force: number }
  | { kind: "share"; share: BareShare };

/** Milliseconds of the whole budget, notes, order and totals included, and of a bare loop that gives the same sum. */
export function wholeBudgetTimes() {
  const state = largeBudget();
  const { points } = evaluateBudget(state);
  const streams = points.map(({ stream }) => stream);
  const items = bareItems(
    new Map(state.lines.flatMap((line) => (line.kind === "item" ? [[line.number, line.body]] : []))),
  );
  const expected = points.reduce((sum, { totals }) => sum + totals.predicted, 0);
  if (!(Math.abs(bareSum(items, streams) / expected - 1) < 1e-9)) throw new Error("the bare loop gives another sum");

  const times = bestTimes(
    {
      // A state that nobody has gone through yet.
      whole: () => repeat(() => sumOf(evaluateBudget({ ...state, lines: [...state.lines] }))),
      bare: () => repeat(() => bareSum(items, streams)),
    },
    ROUNDS,
  );
  return { whole: times.whole / CALLS, bare: times.bare / CALLS };
}

function repeat(subject: () => number): number {
  let sum = 0;
  for (let call = 0; call < CALLS; call += 1) sum += subject();
  return sum;
}

function sumOf({ points }: ReturnType<typeof evaluateBudget>): number {
  return points.reduce((sum, { totals }) => sum + totals.predicted, 0);
}

function bareItems(bodies: ReadonlyMap<string, ItemBody>): BareItem[] {
  const numbers = [...bodies.keys()];
  return [...bodies.values()].map((body): BareItem => {
    switch (body.method) {
      case "flat-plate-friction": {
        const ahead = body.liesBehind === null ? undefined : bodies.get(body.liesBehind);
        const runUp = ahead?.method === "flat-plate-friction" ? ahead.length.value : 0;
        const roughness = body.finish === "B2" ? 1.5e-4 : 6e-6;
        return { kind: "plate", plate: { length: body.length.value, runUp, breadth: body.breadth.value, roughness } };
      }
      case "bluff-body":
        return { kind: "area", dragArea: body.dragCoefficient * body.referenceArea.value };
      case "drag-area":
        return { kind: "area", dragArea: body.dragArea.value };
      case "fixed":
        return { kind: "fixed", force: body.force.value };
      case "share": {
        const members = numbers.filter((number) => bodies.get(number)?.group === body.ofGroup);
        return {
          kind: "share",
          share: { fraction: body.fraction, of: members.map((member) => numbers.indexOf(member)) },
        };
      }
      default:
        throw new Error(`the large budget has no ${body.method}`);
    }
  });
}

/** Basic, growth and predicted of all items at all points, and what a layer has at its end. */
function bareSum(items: readonly BareItem[], streams: readonly BareStream[]): number {
  let predicted = 0;
  const basic = new Float64Array(items.length);
  for (const stream of streams) {
    for (const [place, item] of items.entries()) {
      basic[place] = basicOf(item, stream, basic);
      predicted += (basic[place] ?? 0) * (1 + GROWTH);
    }
  }
  return predicted;
}

function basicOf(item: BareItem, stream: BareStream, basic: Float64Array): number {
  switch (item.kind) {
    case "plate":
      return plateDrag(item.plate, stream);
    case "area":
      return stream.dynamicPressure * item.dragArea;
    case "fixed":
      return item.force;
    case "share":
      return item.share.fraction * item.share.of.reduce((sum, member) => sum + (basic[member] ?? 0), 0);
  }
}

function plateDrag({ length, runUp, breadth, roughness }: BarePlate, stream: BareStream): number {
  const { speed, kinematicViscosity, dynamicPressure } = stream;
  const viscousLength = kinematicViscosity / speed;
  const roughnessReynolds = roughness / viscousLength;
  const isSmooth = roughness <= admissibleRoughness(speed, kinematicViscosity);
  const transition = isSmooth ? CRITICAL : 0;
  const [start, end] = [runUp / viscousLength, (runUp + length) / viscousLength];
  const ending = greaterIntegral(end, roughnessReynolds, transition);
  const integral = ending.integral - (start === 0 ? 0 : greaterIntegral(start, roughnessReynolds, transition).integral);

  const state = stateAtReynoldsTheta(ending.integral / 2, ROUGHNESS_COEFFICIENT * roughnessReynolds);
  const thickness = thicknessRatioAt(state) + shapeFactorAt(state);
  const plus = roughnessReynolds * Math.sqrt(ending.local / 2);
  const layer = thickness + plus + dynamicPressure * ending.local;
  if (!Number.isFinite(layer)) throw new Error("a layer has no end");
  return dynamicPressure * breadth * integral * viscousLength;
}

/** The smooth and the fully rough line as printed, each with its own laminar stretch taken off. */
function greaterIntegral(reynolds: number, roughnessReynolds: number, transition: number) {
  if (reynolds <= transition) return { integral: laminar(reynolds), local: 0.664 / Math.sqrt(reynolds) };
  const smooth =
    reynolds * smoothMean(reynolds) -
    (transition === 0 ? 0 : transition * smoothMean(transition) - laminar(transition));
  const ratio = reynolds / roughnessReynolds;
  const atTransition = transition / roughnessReynolds;
  const rough =
    reynolds * roughMean(ratio) - (transition === 0 ? 0 : transition * roughMean(atTransition) - laminar(transition));
  if (rough > smooth) {
    return {
      integral: rough,
      local: roughMean(ratio) * (1 - (2.5 * 1.62) / Math.LN10 / (1.89 + 1.62 * Math.log10(ratio))),
    };
  }
  return { integral: smooth, local: smoothMean(reynolds) * (1 - 2.58 / Math.log(reynolds)) };
}

function laminar(reynolds: number): number {
  return 1.328 * Math.sqrt(reynolds);
}

function smoothMean(reynolds: number): number {
  return 0.455 / Math.log10(reynolds) ** 2.58;
}

function roughMean(ratio: number): number {
  return (1.89 + 1.62 * Math.log10(ratio)) ** -2.5;
}
