import type { EditOperation, LineKind } from "@/lib/vocabulary/lines";

/** What a person may be asked to be allowed to do, with the plain facts that decide it. */
export type Question =
  | { on: "Installation"; action: InstallationAction }
  | { on: "Account"; action: "keep_preferences"; userId: number }
  | { on: "Product"; action: ProductAction; productId: number }
  | {
      on: "Line";
      action: EditOperation;
      productId: number;
      kind: LineKind;
      ownerBefore: number | null;
      ownerAfter: number | null;
    }
  | { on: "Transfer"; action: "ask"; productId: number; giverOwner: number | null; receiverOwner: number | null }
  | { on: "Draft"; action: DraftAction; productId: number; proposerId: number; isEditor: boolean }
  | { on: "Proposal"; action: ProposalAction; productId: number; proposerId: number; isEditor: boolean }
  | { on: "Round"; action: RoundAction; productId: number; asDeputy: boolean }
  | { on: "Signature"; action: "take_back"; productId: number; signerId: number }
  | { on: "Deputyship"; action: "end"; productId: number; holderId: number }
  | { on: "File"; action: "void"; productId: number; addedById: number }
  | { on: "Remark"; action: "settle"; productId: number; authorId: number; hasPart: boolean };

export const INSTALLATION_ACTIONS = [
  "create_product",
  "give_role",
  "end_role",
  "create_account",
  "deactivate_account",
  "read_accounts",
  "read_house_history",
] as const;
export type InstallationAction = (typeof INSTALLATION_ACTIONS)[number];

export const PRODUCT_ACTIONS = [
  "see",
  "read_budget",
  "read_history",
  "read_lookings",
  "export",
  "establish",
  "make_baseline",
  "run_monte_carlo",
  "start_draft",
  "remark",
  "object",
  "add_file",
  "assign_reviewer",
  "name_deputy",
] as const;
export type ProductAction = (typeof PRODUCT_ACTIONS)[number];

export const DRAFT_ACTIONS = ["read", "edit", "share", "withdraw", "propose"] as const;
export type DraftAction = (typeof DRAFT_ACTIONS)[number];

export const PROPOSAL_ACTIONS = ["read", "edit", "propose", "withdraw", "carry_forward"] as const;
export type ProposalAction = (typeof PROPOSAL_ACTIONS)[number];

/** A return is a signature too, in the same capacity. As a deputy means: named for this day by one who holds the role. */
export const ROUND_ACTIONS = ["sign_as_reviewer", "sign_as_program_manager", "disapprove"] as const;
export type RoundAction = (typeof ROUND_ACTIONS)[number];

/** The sentence of a refusal: who may, never who may not. */
export function refusalSentence(question: Question): string {
  return question.on === "Line"
    ? lineSentence(question.action)
    : (SENTENCES[question.on][question.action] ?? NOT_YOURS);
}

const NOT_YOURS = "Your role does not allow this.";
const PROGRAM_MANAGER = "Only a program manager of this product";
const ADMINISTRATOR = "Only an administrator of the installation";
const DRAFT_EDITORS = "Only the proposer and the named co-editors";

const SENTENCES: Record<Exclude<Question["on"], "Line">, Record<string, string>> = {
  Installation: {
    create_product: `${ADMINISTRATOR} may create a product.`,
    give_role: `${ADMINISTRATOR} may give a role.`,
    end_role: `${ADMINISTRATOR} may end a role.`,
    create_account: `${ADMINISTRATOR} may create an account.`,
    deactivate_account: `${ADMINISTRATOR} may close an account.`,
    read_accounts: `${ADMINISTRATOR} may see the accounts.`,
    read_house_history: "Only an administrator or an auditor may read the history of the installation.",
  },
  Account: { keep_preferences: "Only each person themselves may choose how they read." },
  Product: {
    see: "You hold no role in this product.",
    read_budget: "Only those who hold a role in this product may read its budget.",
    read_history: "Only those who hold a role in this product may read its history.",
    read_lookings: "Only a program manager or an auditor of this product may see who looked at a history.",
    export: "Only those who hold a role in this product may take an export of it.",
    establish: `${PROGRAM_MANAGER} may establish it.`,
    make_baseline: `${PROGRAM_MANAGER} may sign a baseline.`,
    run_monte_carlo: "Only a component owner, a reviewer or a program manager of this product may run Monte Carlo.",
    start_draft: "Only a component owner or a program manager of this product may start a proposal.",
    remark: "Only a component owner, a reviewer or a program manager of this product may make a remark.",
    object: "Only a component owner, a reviewer or a program manager of this product may object.",
    add_file: "Only a component owner, a reviewer or a program manager of this product may add a file.",
    assign_reviewer: `${PROGRAM_MANAGER} may name the reviewer of a proposal.`,
    name_deputy: "Only a reviewer or a program manager of this product may name a deputy.",
  },
  Round: {
    sign_as_reviewer: "Only a reviewer of this product may sign in this capacity.",
    sign_as_program_manager: `${PROGRAM_MANAGER} may sign in this capacity.`,
    disapprove: `${PROGRAM_MANAGER} may disapprove a proposal.`,
  },
  Transfer: {
    ask: "A component owner may ask for transfers to or from their own items; any other needs a program manager.",
  },
  Draft: {
    read: `${DRAFT_EDITORS} may see this draft.`,
    edit: `${DRAFT_EDITORS} may change this draft, while they are component owner or program manager here.`,
    share: "Only the proposer may name co-editors.",
    withdraw: "Only the proposer may withdraw this draft.",
    propose: `${DRAFT_EDITORS} may propose this draft, while they are component owner or program manager here.`,
  },
  Proposal: {
    read: "Only those who hold a role in this product may read its proposals.",
    edit: `${DRAFT_EDITORS} may revise this proposal.`,
    propose: `${DRAFT_EDITORS} may submit this proposal again.`,
    withdraw: "Only the proposer or a program manager of this product may withdraw this proposal.",
    carry_forward: `${DRAFT_EDITORS} may carry this proposal forward.`,
  },
  Signature: { take_back: "Only who gave an approval may take it back." },
  Deputyship: { end: "Only who named a deputy may end it." },
  File: { void: "Only who added a file, or a program manager of this product, may void it." },
  Remark: {
    settle: "Only who raised a request for action may settle it, or a program manager who has no part in the proposal.",
  },
};

function lineSentence(operation: EditOperation): string {
  if (operation === "add") {
    return "A component owner may add items that they will own; any other line is added by a program manager.";
  }
  return `A component owner may ${operation} items that they own; any other line needs a program manager.`;
}
