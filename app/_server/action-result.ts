import type { FieldFault, RefusalCode } from "@/lib/vocabulary/refusal";

/** What an action answers: a value, or a "no" with its sentence and the faults at fields. */
export type ActionResult<Value> =
  { ok: true; value: Value } | { ok: false; code: RefusalCode; sentence: string; faults: readonly FieldFault[] };

/** The sentence for one field of a form, if it has one. */
export function faultAt(faults: readonly FieldFault[], path: string): string | undefined {
  return faults.find((fault) => fault.path === path)?.sentence;
}
