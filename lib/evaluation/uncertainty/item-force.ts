import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { numberOf, type UncertainNumber } from "../document/number-input";
import type { InputOf, MethodInput } from "../document/schema";
import { frictionLinesOf } from "../methods/friction-versions";
import { newestVersionOf } from "../methods/method-versions";
import { streamStateOf, type StreamState } from "../methods/stream-state";
import { frictionStretch } from "./friction-stretch";

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
  if (version > newestVersionOf(input.method))
    throw new RangeError(`no force of ${input.method} of version ${version}`);
  switch (input.method) {
    case "flat-plate-friction":
      return plateForce(input, frictionLinesOf(version));
    case "duct-entry":
      return ductForce(input, frictionLinesOf(version), flowArea);
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
  return dynamicPressure * ratio * ratio;
}

function plateForce(input: InputOf<"flat-plate-friction">, lines: FrictionLines): ItemForce {
  const surface = frictionStretch(input, lines);
  return {
    newtons: ({ speed, kinematicViscosity, dynamicPressure }) => {
      const ratio = numberOf(input.localSpeedRatio);
      const width = numberOf(input.faces) * numberOf(input.breadth) * numberOf(input.formFactor);
      const length = numberOf(input.length);
      const runUp = numberOf(input.runUp);
      return dynamicPressure * ratio * ratio * width * surface.metres(speed * ratio, kinematicViscosity, length, runUp);
    },
    regime: ({ speed, kinematicViscosity }) =>
      surface.regime(
        speed * numberOf(input.localSpeedRatio),
        kinematicViscosity,
        numberOf(input.length),
        numberOf(input.runUp),
      ),
  };
}

function ductForce(input: InputOf<"duct-entry">, lines: FrictionLines, flowArea: UncertainNumber | null): ItemForce {
  const surface = frictionStretch(input, lines);
  return {
    newtons: ({ speed, kinematicViscosity, dynamicPressure }) => {
      const width = numberOf(input.width);
      const height = numberOf(input.height);
      const stretch = surface.metres(speed, kinematicViscosity, numberOf(input.length), 0);
      const drag = dynamicPressure * 2 * (width + height) * stretch;
      return flowArea === null ? drag : (drag / (width * height)) * flowArea.value;
    },
    regime: ({ speed, kinematicViscosity }) => surface.regime(speed, kinematicViscosity, numberOf(input.length), 0),
  };
}
