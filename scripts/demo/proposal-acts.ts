import type { DemoHouse } from "./demo-house";
import { deskOf } from "./desk";
import { draftingActs } from "./drafting-acts";
import { reviewingActs } from "./reviewing-acts";

export type ProposalActs = ReturnType<typeof proposalActs>;

/** What people do with proposals, through the same commands and the same schemas as the pages. */
export function proposalActs(house: DemoHouse, productCode: string) {
  const desk = deskOf(house, productCode);
  return { ...draftingActs(desk), ...reviewingActs(desk) };
}
