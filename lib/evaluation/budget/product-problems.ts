import type { IndexedState } from "./indexed-state";
import { ROLL_UP_VERSIONS } from "./roll-up";
import type { Problem } from "./problem";
import { TERMS_NUMBER } from "../lines/terms-body";

/** Versions of the fluids' formulas that an operating point may name. */
const FLUID_VERSIONS: readonly number[] = [1];
/** Versions of the combination of uncertainties that the terms may name. */
const UNCERTAINTY_VERSIONS: readonly number[] = [1];

/** What terms, operating points and groups need of one another. */
export function productProblems(state: IndexedState): Problem[] {
  return [
    ...referencePointProblems(state),
    ...termsProblems(state),
    ...[...state.operatingPoints].flatMap(([number, point]) =>
      FLUID_VERSIONS.includes(point.fluidVersion)
        ? []
        : [problem("operating_point", number, "body.fluidVersion", "No formulas of this version are known.")],
    ),
    ...[...state.groups].flatMap(([number, { parent }]) => parentProblems(number, parent, state)),
  ];
}

function referencePointProblems({ terms, operatingPoints }: IndexedState): Problem[] {
  const number = terms.referenceOperatingPoint;
  const point = operatingPoints.get(number);
  if (point && point.limitHundredths !== null) return [];

  const onTerms = {
    kind: "terms" as const,
    number: TERMS_NUMBER,
    path: "body.referenceOperatingPoint",
    sentence: point ? `${number} has no limit of its own.` : `Operating point ${number} does not exist or is retired.`,
  };
  const onPoint = point
    ? { path: "body.limitHundredths", sentence: "The reference operating point needs a limit of its own." }
    : { path: "operation", sentence: "The reference operating point can't be retired." };
  return [{ causes: [onTerms, { kind: "operating_point", number, ...onPoint }] }];
}

function termsProblems({ product, terms, operatingPoints }: IndexedState): Problem[] {
  const fault = (field: string, sentence: string) => problem("terms", TERMS_NUMBER, `body.${field}`, sentence);
  const unknown = terms.reserves.find(
    ({ operatingPoint }) => operatingPoint !== terms.referenceOperatingPoint && !operatingPoints.has(operatingPoint),
  );
  return [
    ...(ROLL_UP_VERSIONS.includes(terms.rollUpVersion) ? [] : [fault("rollUpVersion", "This version is not known.")]),
    ...(UNCERTAINTY_VERSIONS.includes(terms.uncertaintyVersion)
      ? []
      : [fault("uncertaintyVersion", "This version is not known.")]),
    ...(unknown ? [reserveProblem(unknown.operatingPoint)] : []),
    ...(product.kind === "duct" && terms.flowArea === null
      ? [fault("flowArea", "A duct needs its flow area: pressure losses are turned into forces on it.")]
      : []),
  ];
}

function reserveProblem(number: string): Problem {
  const sentence = `Operating point ${number} does not exist or is retired.`;
  const retirement = { path: "operation", sentence: "The terms state a reserve for it: take it out of them first." };
  return {
    causes: [
      { kind: "terms", number: TERMS_NUMBER, path: "body.reserves", sentence },
      { kind: "operating_point", number, ...retirement },
    ],
  };
}

function parentProblems(number: string, parent: string | null, { groups }: IndexedState): Problem[] {
  if (parent === null || groups.has(parent)) return [];
  const retirement = { path: "operation", sentence: `Can't be retired: group ${number} belongs to it.` };
  const sentence = `Group ${parent} does not exist or is retired.`;
  return [
    {
      causes: [
        { kind: "group", number, path: "body.parent", sentence },
        { kind: "group", number: parent, ...retirement },
      ],
    },
  ];
}

function problem(kind: "terms" | "operating_point", number: string, path: string, sentence: string): Problem {
  return { causes: [{ kind, number, path, sentence }] };
}
