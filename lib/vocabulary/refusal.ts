export type RefusalCode =
  | "forbidden"
  | "not_found"
  | "invalid"
  | "wrong_state"
  | "overtaken"
  | "moved"
  | "unsettled_request"
  | "not_independent"
  | "capacity_taken"
  | "wrong_password"
  | "conservation"
  | "evaluation_refused"
  | "justification_missing"
  | "evidence_missing"
  | "duplicate"
  | "too_large"
  | "too_many_attempts";

/** Refusals that say something about right, state or independence stand in the history; faults of typing do not. */
export const RECORDED_REFUSALS: readonly RefusalCode[] = [
  "forbidden",
  "wrong_state",
  "overtaken",
  "moved",
  "unsettled_request",
  "not_independent",
  "capacity_taken",
  "wrong_password",
  "conservation",
];

/** Faults at fields: path as in the input ("edits.0.body.length"), and a sentence. */
export interface FieldFault {
  path: string;
  sentence: string;
}

/** A "no" that its reader can act on. Anything else that is thrown is a bug. */
export class Refusal extends Error {
  readonly code: RefusalCode;
  readonly faults: readonly FieldFault[];

  constructor(code: RefusalCode, sentence: string, faults: readonly FieldFault[] = []) {
    super(sentence);
    this.name = "Refusal";
    this.code = code;
    this.faults = faults;
  }
}
