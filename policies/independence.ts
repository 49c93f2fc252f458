import { Refusal } from "@/lib/vocabulary/refusal";

export interface IndependenceFacts {
  proposerId: number;
  /** All who edited any round, however little. */
  editorIds: readonly number[];
  /** Owners of edited items, before and after the change. */
  owners: readonly { item: string; ownerId: number }[];
}

export interface BarredPerson {
  userId: number;
  /** "as its proposer and as owner of item 030" */
  because: string;
}

/** Who may sign this proposal in no capacity and for nobody: nobody ever signs their own change. */
export function barredPersons({ proposerId, editorIds, owners }: IndependenceFacts): BarredPerson[] {
  const ids = [...new Set([proposerId, ...editorIds, ...owners.map(({ ownerId }) => ownerId)])];
  return ids.map((userId) => ({ userId, because: causes(userId, { proposerId, editorIds, owners }).join(" and ") }));
}

export function isBarred(userId: number, barred: readonly BarredPerson[]): boolean {
  return barred.some((person) => person.userId === userId);
}

/** Throws when the signer, or the person a deputy signs for, has a part in the change. */
export function demandIndependence(
  signerId: number,
  deputyFor: { userId: number; printedName: string } | null,
  barred: readonly BarredPerson[],
): void {
  const own = barred.find(({ userId }) => userId === signerId);
  if (own) throw notIndependent(`Nobody signs their own change: you are barred ${own.because}.`);
  const principal = deputyFor && barred.find(({ userId }) => userId === deputyFor.userId);
  if (deputyFor && principal) {
    throw notIndependent(
      `${deputyFor.printedName} is barred ${principal.because}; a deputy cannot sign for a barred person.`,
    );
  }
}

function causes(userId: number, { proposerId, editorIds, owners }: IndependenceFacts): string[] {
  const items = [...new Set(owners.filter((owner) => owner.ownerId === userId).map(({ item }) => item))];
  return [
    ...(userId === proposerId ? ["as its proposer"] : []),
    ...(userId !== proposerId && editorIds.includes(userId) ? ["as one who edited it"] : []),
    ...(items.length > 0 ? [`as owner of item ${items.join(", ")}`] : []),
  ];
}

function notIndependent(sentence: string): Refusal {
  return new Refusal("not_independent", sentence);
}
