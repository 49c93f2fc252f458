import type { BudgetState, LineOf } from "@/lib/evaluation/lines/line-state";
import type { MethodName } from "@/lib/evaluation/methods/method-name";
import { DraftEdit, MAX_EDITS } from "../schema";

/** A draft in which items go over to another version of their method. */
export interface AdoptedVersion {
  edits: DraftEdit[];
  /** Numbers of the items that go over. */
  items: string[];
  /** Numbers of those for which one proposal has no room any more. */
  left: string[];
}

interface Adoption {
  method: MethodName;
  version: number;
  /** Whether the editor may revise an item. */
  mayEdit: (item: LineOf<"item">) => boolean;
}

/**
 * Every item of the method that stands at another version, as an edit of its version alone; an item that the draft edits
 * already keeps what was typed.
 */
export function adoptVersion(
  state: BudgetState,
  edits: readonly DraftEdit[],
  { method, version, mayEdit }: Adoption,
): AdoptedVersion {
  const items = state.lines.filter(
    (line): line is LineOf<"item"> => line.kind === "item" && !line.retired && mayEdit(line),
  );
  const fresh = items
    .filter(({ body }) => body.method === method && body.methodVersion !== version)
    .filter(({ number }) => !edits.some((edit) => edit.kind === "item" && edit.number === number));
  const room = Math.max(0, MAX_EDITS - edits.length);
  const known = edits.map((edit) => (isOfMethod(edit, method) ? withVersion(edit, version) : edit));
  return {
    edits: [...known, ...fresh.slice(0, room).map((item) => editOf(item, version))],
    items: [
      ...edits.filter((edit) => isOfMethod(edit, method) && edit.body?.methodVersion !== version),
      ...fresh.slice(0, room),
    ].map(({ number }) => number),
    left: fresh.slice(room).map(({ number }) => number),
  };
}

function isOfMethod({ kind, operation, body }: DraftEdit, method: MethodName): boolean {
  return kind === "item" && operation !== "retire" && body?.method === method;
}

function withVersion(edit: DraftEdit, methodVersion: number): DraftEdit {
  return edit.body === null ? edit : { ...edit, body: { ...edit.body, methodVersion } };
}

function editOf({ number, letter, body }: LineOf<"item">, methodVersion: number): DraftEdit {
  const edit = { operation: "revise", kind: "item", number, baseLetter: letter, body: { ...body, methodVersion } };
  // As the working copy will keep it: what has no value is no field.
  return DraftEdit.parse(JSON.parse(JSON.stringify(edit)));
}
