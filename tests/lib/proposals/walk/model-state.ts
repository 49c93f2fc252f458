import type { ModelBudget, ModelContent } from "./model-budget";

/** The review as its rules are told in words, for one product; it shares nothing with the code that it is compared to. */
export interface Model {
  day: number;
  /** Issue 1 first. */
  issues: ModelBudget[];
  proposals: ModelProposal[];
  moves: { item: string; issue: number; day: number; by: number; managerSigned: boolean }[];
}

export type ModelState = "draft" | "proposed" | "returned" | "approved" | "disapproved" | "withdrawn";
export type ModelCapacity = "reviewer" | "program_manager";

export interface ModelProposal {
  state: ModelState;
  proposer: string;
  coEditors: string[];
  /** All who ever edited it. */
  editors: string[];
  /** All who ever signed a round of it. */
  signers: string[];
  /** Issue that the working copy stands on. */
  base: number;
  copy: ModelContent;
  /** Numbers of all items that it ever added, however short. */
  everTyped: string[];
  rounds: number;
  round: ModelRound | null;
  requests: { author: string; settled: boolean }[];
}

export interface ModelRound {
  content: ModelContent;
  base: number;
  submitter: string;
  /** Once asked for, asked for until the next round. */
  asksManager: boolean;
  signedBySubmitting: boolean;
  approvals: { who: string; capacity: ModelCapacity }[];
}

export const ROLES: Record<string, ("owner" | "reviewer" | "manager" | "auditor")[]> = {
  tansy: ["owner"],
  odo: ["owner"],
  roel: ["owner", "reviewer"],
  ines: ["reviewer"],
  petra: ["reviewer", "manager"],
  lusia: ["manager"],
  fenno: ["manager"],
  maud: ["auditor"],
};
export const PEOPLE = Object.keys(ROLES);

export function newest(model: Model): ModelBudget {
  return issueOf(model, model.issues.length);
}

export function issueOf({ issues }: Model, number: number): ModelBudget {
  const budget = issues[number - 1];
  if (!budget) throw new Error(`the model has no issue ${number}`);
  return budget;
}
