import type { FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import type { RoughnessVerdict } from "@/lib/aero/roughness-verdict";
import type { Note } from "../notes/note";

/** What a method gives at one operating point, SI. A quantity that the method does not have is absent. */
export interface MethodAnswer {
  /** N; at most 0 for a saving. */
  drag: number;
  /** At the end of the layer, x₀ + L. */
  reynolds?: number;
  /** drag / (q · faces · breadth · length · formFactor). */
  meanCoefficient?: number;
  /** dF/dx at the end of the layer. */
  localCoefficient?: number;
  /** The line that gives F at the end: Blasius where that is Blasius's. */
  frictionLineUsed?: FrictionLineName | "blasius";
  /** m from the start of the layer; 0 where it is turbulent from its start. */
  transitionAt?: number;
  /** δ, m. */
  thickness?: number;
  /** δ*, m. */
  displacementThickness?: number;
  /** θ, m. */
  momentumThickness?: number;
  /** Pa. */
  wallShearStress?: number;
  /** 100 ν/U, m. */
  admissibleRoughness?: number;
  /** k_s⁺. */
  roughnessReynolds?: number;
  roughnessVerdict?: RoughnessVerdict;
  /** m/s. */
  coreSpeedAtExit?: number;
  blockedAreaFraction?: number;
  /** Pa. */
  pressureLoss?: number;
  /** W + 2δ*, m. */
  exitWidthForConstantCore?: number;
  /** H + 2δ*, m. */
  exitHeightForConstantCore?: number;
  /** Drag over the dynamic pressure of the operating point, m². */
  dragArea?: number;
  /** N. First order, from the given input uncertainties and the line's or method's own. */
  standardUncertainty?: number;
  notes: Note[];
}

export type MethodOutcome = { outcome: "answer"; answer: MethodAnswer } | { outcome: "refused"; note: Note };
