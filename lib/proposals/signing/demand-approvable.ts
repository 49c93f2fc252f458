import type { Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import { Comment } from "@/models/comment";
import { isFilled, type RoundReview } from "../review/round-review";

/** Everything that keeps an approval from being taken although its signer may sign: none of it stops a return. */
export async function demandApprovable(
  actor: Actor,
  review: RoundReview,
  { capacity, deputyForId }: { capacity: Capacity; deputyForId: number | null },
  tx: Transaction,
): Promise<void> {
  const { approvals, required, round, overtaken, obstacles, proposal } = review;
  const persons = [actor.userId, deputyForId];
  const own = approvals.find(
    ({ signerId, deputyForId: of }) => persons.includes(signerId) || (of !== null && persons.includes(of)),
  );
  if (own) {
    const as = ROLE_NAMES[own.capacity].toLowerCase();
    throw new Refusal(
      "capacity_taken",
      `One person signs in one capacity: ${own.printedName} signed this round as ${as}.`,
    );
  }
  const needed = required.find((each) => each.capacity === capacity);
  const role = ROLE_NAMES[capacity].toLowerCase();
  if (!needed) throw new Refusal("capacity_taken", `No signature of a ${role} is asked for here.`);
  if (isFilled(needed, approvals, round)) {
    throw new Refusal("capacity_taken", `The signature of the ${role} has been given already.`);
  }
  const waiting = await unsettledRequests(proposal.id, tx);
  if (waiting.length > 0) {
    const names = waiting.map((number) => `R${number}`).join(", ");
    throw new Refusal("unsettled_request", `Settle what asks for action first: ${names}.`);
  }
  if (overtaken.length > 0) {
    throw new Refusal("overtaken", `It was overtaken and has to be carried forward. ${overtaken.join(" ")}`);
  }
  const [obstacle] = obstacles;
  if (obstacle !== undefined) throw new Refusal("conservation", `Today's issue cannot take it. ${obstacle}`);
}

/** Numbers of the remarks that ask for action and are not settled. */
export async function unsettledRequests(proposalId: number, tx: Transaction): Promise<number[]> {
  const requests = await Comment.findAll({
    where: { proposalId, asksAction: true, settledAt: null },
    order: [["number", "ASC"]],
    transaction: tx,
  });
  return requests.flatMap(({ number }) => number ?? []);
}
