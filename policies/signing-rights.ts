import type { Capacity, Role } from "@/lib/vocabulary/roles";
import { isBarred, type BarredPerson } from "@/policies/independence";

export interface Member {
  userId: number;
  printedName: string;
  /** Roles in this product that are in force today. */
  roles: readonly Role[];
}

/** A deputy in force today. */
export interface Deputyship {
  deputyId: number;
  forUserId: number;
}

export interface SigningFacts {
  members: readonly Member[];
  deputies: readonly Deputyship[];
  barred: readonly BarredPerson[];
  /** The reviewer whom a program manager named: then only they fill the capacity. */
  namedReviewerId: number | null;
}

/** One way in which a person may sign: in their own right, or for another who holds the role. */
export interface SigningRight {
  userId: number;
  printedName: string;
  capacity: Capacity;
  deputyFor: { userId: number; printedName: string } | null;
}

/**
 * All ways in which a capacity can be filled on this proposal. A deputy holds a role here, passes it not on, and signs
 * for nobody who is barred; who is barred signs for nobody at all.
 */
export function signingRights(capacity: Capacity, facts: SigningFacts): SigningRight[] {
  const named = capacity === "reviewer" ? facts.namedReviewerId : null;
  const holders = facts.members.filter(
    ({ userId, roles }) =>
      roles.includes(capacity) && !isBarred(userId, facts.barred) && (named === null || named === userId),
  );
  const own = holders.map(({ userId, printedName }) => ({ userId, printedName, capacity, deputyFor: null }));
  const deputed = holders.flatMap(({ userId, printedName }) =>
    deputiesOf(userId, facts).map((deputy) => ({
      userId: deputy.userId,
      printedName: deputy.printedName,
      capacity,
      deputyFor: { userId, printedName },
    })),
  );
  return [...own, ...deputed];
}

function deputiesOf(holderId: number, { members, deputies, barred }: SigningFacts): Member[] {
  const named = deputies.filter(({ forUserId }) => forUserId === holderId).map(({ deputyId }) => deputyId);
  return members.filter(
    ({ userId, roles }) =>
      named.includes(userId) && userId !== holderId && roles.some(takesPart) && !isBarred(userId, barred),
  );
}

/** An auditor changes nothing and takes no part in routing, not even for another. */
function takesPart(role: Role): boolean {
  return role !== "auditor";
}
