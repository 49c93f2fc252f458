import { TERMS_NUMBER } from "../lines/terms-body";
import type { ItemBody } from "../lines/item-body";
import { isFullyRough } from "../lines/items/friction-fields";
import { newestVersionOf } from "../methods/method-versions";
import type { IndexedState } from "./indexed-state";
import type { Cause, Problem, ProblemOptions } from "./problem";

/** What items need of the lines that they name. */
export function itemProblems(state: IndexedState, options: ProblemOptions): Problem[] {
  const problems: Problem[] = [];
  for (const [number, body] of state.items) {
    problems.push(...commonProblems(number, body, state, options), ...methodProblems(number, body, state));
  }
  return problems;
}

function commonProblems(number: string, body: ItemBody, state: IndexedState, { mayOwn }: ProblemOptions): Problem[] {
  const isKnownVersion = body.methodVersion <= newestVersionOf(body.method);
  const isStranger = mayOwn !== undefined && !mayOwn(body.ownerId);
  return [
    ...(isStranger ? [own(number, "ownerId", "Choose a member of this product who may own items.")] : []),
    ...(isKnownVersion ? [] : [own(number, "methodVersion", "No method of this version is known.")]),
    ...(body.group !== null && !state.groups.has(body.group) ? [groupProblem(number, "group", body.group)] : []),
  ];
}

function methodProblems(number: string, body: ItemBody, state: IndexedState): Problem[] {
  switch (body.method) {
    case "flat-plate-friction":
      return [...liesBehindProblems(number, body, state), ...finishProblems(number, body, state)];
    case "duct-entry":
      return finishProblems(number, body, state);
    case "loss-coefficient":
      return body.flowArea === null && state.terms.flowArea === null ? [flowAreaProblem(number)] : [];
    case "share":
      return shareProblems(number, body, state);
    default:
      return [];
  }
}

type Plate = Extract<ItemBody, { method: "flat-plate-friction" }>;
type Share = Extract<ItemBody, { method: "share" }>;

function liesBehindProblems(number: string, { liesBehind, runUpFollows }: Plate, { items }: IndexedState): Problem[] {
  if (liesBehind === null) return [];
  const ahead = items.get(liesBehind);
  if (!ahead) {
    const retirement = retirementOf("item", liesBehind, `item ${number} lies behind it`);
    return [{ causes: [cause(number, "liesBehind", missingItem(liesBehind)), retirement] }];
  }
  if (!runUpFollows || ahead.method === "flat-plate-friction") return [];
  return [
    {
      causes: [
        cause(number, "liesBehind", `Item ${liesBehind} is no flat plate: type the run-up.`),
        cause(
          liesBehind,
          "method",
          `Item ${number} lies behind it and follows its length: it has to stay a flat plate.`,
        ),
      ],
    },
  ];
}

interface Surface {
  finish: string | null;
  frictionLine: Plate["frictionLine"];
}

function finishProblems(number: string, { finish, frictionLine }: Surface, { finishes }: IndexedState): Problem[] {
  if (finish === null) return [];
  const catalogued = finishes.get(finish);
  if (!catalogued) {
    const sentence = `Finish ${finish} does not exist or is retired.`;
    const retirement = retirementOf("finish", finish, `item ${number} has it`);
    return [{ causes: [cause(number, "finish", sentence), retirement] }];
  }
  if (!isFullyRough(frictionLine) || catalogued.roughness.value > 0) return [];
  const sentence = `Item ${number} takes a fully rough line, which needs a roughness greater than 0.`;
  return [
    {
      causes: [
        cause(number, "finish", "A fully rough line needs a finish with a roughness greater than 0."),
        { kind: "finish", number: finish, path: "body.roughness", sentence },
      ],
    },
  ];
}

function flowAreaProblem(number: string): Problem {
  const sentence = `Item ${number} takes its flow area from here.`;
  return {
    causes: [
      cause(number, "flowArea", "Give the flow area: the product has none."),
      { kind: "terms", number: TERMS_NUMBER, path: "body.flowArea", sentence },
    ],
  };
}

function shareProblems(number: string, share: Share, state: IndexedState): Problem[] {
  const { ofGroup } = share;
  if (ofGroup !== null) return state.groups.has(ofGroup) ? [] : [groupProblem(number, "ofGroup", ofGroup)];

  return share.of.flatMap((member): Problem[] => {
    const body = state.items.get(member);
    if (!body) {
      const retirement = retirementOf("item", member, `share ${number} names it`);
      return [{ causes: [cause(number, "of", missingItem(member)), retirement] }];
    }
    if (!body.saving || share.includeSavings) return [];
    const sentence = `Item ${member} is a saving: say that savings count along, or leave it out.`;
    const onMember = `Share ${number} names it and doesn't count savings.`;
    return [{ causes: [cause(number, "of", sentence), cause(member, "saving", onMember)] }];
  });
}

function groupProblem(number: string, field: string, group: string): Problem {
  const what = field === "group" ? `item ${number} belongs to it` : `share ${number} names it`;
  const sentence = `Group ${group} does not exist or is retired.`;
  return { causes: [cause(number, field, sentence), retirementOf("group", group, what)] };
}

function own(number: string, field: string, sentence: string): Problem {
  return { causes: [cause(number, field, sentence)] };
}

function cause(number: string, field: string, sentence: string): Cause {
  return { kind: "item", number, path: `body.${field}`, sentence };
}

function retirementOf(kind: Cause["kind"], number: string, because: string): Cause {
  return { kind, number, path: "operation", sentence: `Can't be retired: ${because}.` };
}

function missingItem(number: string): string {
  return `Item ${number} does not exist or is retired.`;
}
