/** Every act that stands in the history, in the words in which it is printed. */
export const ACT_NAMES = {
  sign_in: "Sign in",
  sign_out: "Sign out",
  change_password: "Change password",
  end_sessions: "Sign out everywhere",
  create_account: "Create account",
  deactivate_account: "Close account",
  reactivate_account: "Open account again",
  create_product: "Create product",
  give_role: "Give role",
  end_role: "End role",
  name_deputy: "Name deputy",
  end_deputy: "End deputy",
  establish_product: "Establish product",
  start_draft: "Start draft",
  share_draft: "Share draft",
  unshare_draft: "End sharing of draft",
  save_draft: "Edit draft",
  propose: "Propose",
  propose_next_round: "Propose next round",
  carry_forward: "Carry forward",
  withdraw_proposal: "Withdraw proposal",
  name_reviewer: "Name reviewer",
  add_remark: "Remark",
  answer_remark: "Answer remark",
  settle_remark: "Settle remark",
  raise_objection: "Object",
  approve_proposal: "Sign: approve",
  return_proposal: "Sign: return",
  disapprove_proposal: "Sign: disapprove",
  take_back_approval: "Take back approval",
  make_baseline: "Make baseline",
  run_monte_carlo: "Run Monte Carlo",
  add_attachment: "Add file",
  void_attachment: "Void file",
  export_records: "Export records",
  check_history: "Check history",
  remind_signers: "Remind signers",
  leave_planned_band: "Leave planned profile",
} as const;

export type Act = keyof typeof ACT_NAMES;

export const OUTCOMES = ["done", "refused"] as const;
export type Outcome = (typeof OUTCOMES)[number];

export const SIGNATURE_SUBJECTS = ["round", "establishment", "baseline"] as const;
export type SignatureSubject = (typeof SIGNATURE_SUBJECTS)[number];

/** The chain of accounts and sign-ins; every other chain is a product's, named by its code. */
export const HOUSE_CHAIN = "house";

/** What an act is about. Ids are text: a row's id, a line's number, an issue's number. */
export interface ActSubject {
  type: string;
  id: string;
  /** As printed: "TF2-CP-04", "Item 050 Side mirrors". */
  label: string;
}

export type ActValue = string | number | boolean | null | readonly ActValue[] | { readonly [field: string]: ActValue };

/** What a command says of an act that it did. */
export interface ActRecord {
  act: Act;
  subject: ActSubject;
  capacity?: string;
  was?: ActValue;
  now?: ActValue;
  reason?: string;
}

/** Hands an act to the history; it is written with the transaction's other rows or not at all. */
export type RecordAct = (record: ActRecord) => void;
