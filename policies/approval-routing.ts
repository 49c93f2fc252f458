import { ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import { programManagerReasons, type RoutingReason } from "@/policies/program-manager-reasons";
import type { RoutingFacts } from "@/policies/routing-facts";
import { signingRights, type SigningFacts, type SigningRight } from "@/policies/signing-rights";

export interface RequiredCapacity {
  capacity: Capacity;
  /** How many different persons have to approve in it. */
  count: number;
  reasons: RoutingReason[];
  /** The program manager who submits what only transfers or regroups signs this capacity by submitting. */
  signedBySubmitting: boolean;
}

export interface RoutedCapacity extends RequiredCapacity {
  maySign: SigningRight[];
  /** Names the role that is missing when the capacity can't be filled; null when it can. */
  missing: string | null;
}

/** What must sign and why: the reviewer always, a program manager where a rule asks for one. */
export function requiredCapacities(facts: RoutingFacts, isSubmittedByManager: boolean): RequiredCapacity[] {
  const count = Math.max(1, facts.rules.reviewers);
  const sentence = count === 1 ? "One independent reviewer always." : `${count} independent reviewers always.`;
  const reviewer: RequiredCapacity = {
    capacity: "reviewer",
    count,
    reasons: [{ rule: "reviewer", sentence }],
    signedBySubmitting: false,
  };
  const reasons = programManagerReasons(facts);
  if (reasons.length === 0) return [reviewer];
  const signedBySubmitting =
    isSubmittedByManager && onlyTransfersOrRegroups(facts) && reasons.every(({ rule }) => rule === "allocations");
  return [reviewer, { capacity: "program_manager", count: 1, reasons, signedBySubmitting }];
}

/** Within a round routing only grows: what an earlier signature saw asked for stays asked for. */
export function grownRouting(
  earlier: readonly RequiredCapacity[],
  now: readonly RequiredCapacity[],
): RequiredCapacity[] {
  const capacities = [...new Set([...earlier, ...now].map(({ capacity }) => capacity))];
  return capacities.flatMap((capacity) => {
    const [first, ...rest] = [...earlier, ...now].filter((required) => required.capacity === capacity);
    return first ? [rest.reduce(unitedRequirement, first)] : [];
  });
}

/** Adds who may sign each capacity, and names the role that is missing where nobody can. */
export function routeCapacities(required: readonly RequiredCapacity[], facts: SigningFacts): RoutedCapacity[] {
  const withRights = required.map((capacity) => ({ ...capacity, maySign: signingRights(capacity.capacity, facts) }));
  return withRights.map((capacity) => ({ ...capacity, missing: missingSentence(capacity, withRights) }));
}

function onlyTransfersOrRegroups({ edits }: RoutingFacts): boolean {
  return edits.every(
    ({ kind, operation, changedFields }) =>
      kind === "group" ||
      (kind === "item" &&
        operation === "revise" &&
        changedFields.every((field) => field === "group" || field === "order")),
  );
}

function unitedRequirement(one: RequiredCapacity, other: RequiredCapacity): RequiredCapacity {
  const fresh = other.reasons.filter(({ sentence }) => one.reasons.every((reason) => reason.sentence !== sentence));
  return {
    capacity: one.capacity,
    count: Math.max(one.count, other.count),
    reasons: [...one.reasons, ...fresh],
    signedBySubmitting: one.signedBySubmitting && other.signedBySubmitting,
  };
}

type WithRights = RequiredCapacity & { maySign: SigningRight[] };

/** One person signs in one capacity, so the capacities together need as many persons as they have places. */
function missingSentence(capacity: WithRights, all: readonly WithRights[]): string | null {
  if (capacity.signedBySubmitting) return null;
  const role = ROLE_NAMES[capacity.capacity].toLowerCase();
  const lacking = capacity.count - personsOf(capacity).size;
  if (lacking === 1) return `A ${role} is missing who took no part in this change.`;
  if (lacking > 1) return `${lacking} ${role}s are missing who took no part in this change.`;
  const open = all.filter(({ signedBySubmitting }) => !signedBySubmitting);
  if (open.some((each) => personsOf(each).size < each.count)) return null;
  const together = new Set(open.flatMap((each) => [...personsOf(each)])).size;
  const places = open.reduce((sum, { count }) => sum + count, 0);
  if (together >= places) return null;
  return `One person signs in one capacity: another ${role} is missing who took no part in this change.`;
}

function personsOf({ maySign }: WithRights): Set<number> {
  return new Set(maySign.map(({ userId }) => userId));
}
