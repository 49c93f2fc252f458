import { frictionBetween } from "@/lib/aero/friction/friction-between";
import { isBelow } from "@/lib/aero/friction/transition";
import { numberOf, type UncertainNumber } from "../document/number-input";
import type { InputOf, MethodInput } from "../document/schema";
import { ADMITTED_REYNOLDS } from "../methods/friction-result";
import { ductCase, frictionSetup, plateCase, type FrictionSetup } from "../methods/friction-setup";
import { localStream, streamStateOf, type StreamState } from "../methods/stream-state";

/** The basic estimate of one item as a function of its input as that stands at the moment, without notes or workings. */
export interface ItemForce {
  /** N; NaN where the method refuses. */
  newtons(stream: StreamState): number;
  /** Within one name the newtons are a smooth function of every input. */
  regime(stream: StreamState): string;
}

/**
 * @param flowArea in a duct product the area on which its pressure losses count, else null
 * @throws RangeError for a version of a method that has no such function
 */
export function itemForce(version: number, input: MethodInput, flowArea: UncertainNumber | null): ItemForce {
  if (version !== 1) throw new RangeError(`no force of ${input.method} of version ${version}`);
  switch (input.method) {
    case "flat-plate-friction":
      return plateForce(input);
    case "duct-entry":
      return ductForce(input, flowArea);
    case "loss-coefficient":
      return smooth((stream) => {
        const area = flowArea ?? input.flowArea;
        return numberOf(input.lossCoefficient) * pressureAt(stream, numberOf(input.localSpeedRatio)) * numberOf(area);
      });
    case "bluff-body":
      return smooth((stream) => {
        const dragArea =
          numberOf(input.dragCoefficient) * numberOf(input.referenceArea) * numberOf(input.shelterFactor);
        return pressureAt(stream, numberOf(input.localSpeedRatio)) * dragArea;
      });
    case "drag-area":
      return smooth((stream) => pressureAt(stream, numberOf(input.localSpeedRatio)) * numberOf(input.dragArea));
    case "measured":
      return smooth(
        (stream) => (numberOf(input.force) * stream.dynamicPressure) / streamStateOf(input.testPoint).dynamicPressure,
      );
    case "fixed":
      return smooth(() => numberOf(input.force));
    case "share":
      throw new RangeError("a share has no force of its own: it is a part of others'");
  }
}

function smooth(newtons: (stream: StreamState) => number): ItemForce {
  return { newtons, regime: () => "smooth" };
}

function pressureAt({ dynamicPressure }: StreamState, ratio: number): number {
  return dynamicPressure * ratio ** 2;
}

function plateForce(input: InputOf<"flat-plate-friction">): ItemForce {
  const setup = (stream: StreamState): FrictionSetup =>
    frictionSetup(plateCase(input), localStream(stream, numberOf(input.localSpeedRatio)));
  return {
    newtons: (stream) => {
      const width = numberOf(input.faces) * numberOf(input.breadth) * numberOf(input.formFactor);
      return pressureAt(stream, numberOf(input.localSpeedRatio)) * width * stretchOf(setup(stream));
    },
    regime: (stream) => regimeOf(setup(stream)),
  };
}

function ductForce(input: InputOf<"duct-entry">, flowArea: UncertainNumber | null): ItemForce {
  const setup = (stream: StreamState): FrictionSetup => frictionSetup(ductCase(input), stream);
  return {
    newtons: (stream) => {
      const width = numberOf(input.width);
      const height = numberOf(input.height);
      const drag = stream.dynamicPressure * 2 * (width + height) * stretchOf(setup(stream));
      return flowArea === null ? drag : (drag / (width * height)) * flowArea.value;
    },
    regime: (stream) => regimeOf(setup(stream)),
  };
}

/** F(x₀ + L) − F(x₀), m. */
function stretchOf({ layer, viscousLength, startReynolds, spanReynolds, endReynolds }: FrictionSetup): number {
  const { min, max } = ADMITTED_REYNOLDS;
  if (isBelow(endReynolds, min) || isBelow(max, endReynolds)) return Number.NaN;
  return viscousLength * frictionBetween(layer, startReynolds, spanReynolds);
}

function regimeOf({ layer, transition, startReynolds, endReynolds }: FrictionSetup): string {
  return `${transition.kind}|${layer.pieceAt(startReynolds)}|${layer.pieceAt(endReynolds)}`;
}
