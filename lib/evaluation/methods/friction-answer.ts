import type { MethodAnswer } from "./method-answer";

/** A method's answer with the quantities that every layer has. */
export type FrictionAnswer = MethodAnswer &
  Required<
    Pick<
      MethodAnswer,
      "reynolds" | "localCoefficient" | "thickness" | "displacementThickness" | "frictionLineUsed" | "roughnessReynolds"
    >
  >;
