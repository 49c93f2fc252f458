import { sameValue } from "./same-value";

type Body = Readonly<Record<string, unknown>>;

/** One field of a line that somebody changed since the base issue. */
export interface FieldMerge {
  field: string;
  base: unknown;
  theirs: unknown;
  yours: unknown;
  /** Whose change carries by itself; "conflict" where both changed it to different values. */
  side: "theirs" | "yours" | "both_alike" | "conflict";
}

export type SettlementSide = "base" | "theirs" | "yours";

/** Compares field by field what the newest issue (theirs) and the proposal (yours) made of the base. */
export function mergeFields(base: Body, theirs: Body, yours: Body): FieldMerge[] {
  const fields = [...new Set([...Object.keys(base), ...Object.keys(theirs), ...Object.keys(yours)])];
  return fields.flatMap((field): FieldMerge[] => {
    const merge = { field, base: base[field], theirs: theirs[field], yours: yours[field] };
    const side = sideOf(merge);
    return side === null ? [] : [{ ...merge, side }];
  });
}

function sideOf({ base, theirs, yours }: Omit<FieldMerge, "side" | "field">): FieldMerge["side"] | null {
  const theyMoved = !sameValue(base, theirs);
  const youMoved = !sameValue(base, yours);
  if (theyMoved && youMoved) return sameValue(theirs, yours) ? "both_alike" : "conflict";
  if (theyMoved) return "theirs";
  return youMoved ? "yours" : null;
}

/** The body after the merge. Fields without a choice where one is needed are left to the caller to refuse. */
export function mergedBody(
  theirs: Body,
  merges: readonly FieldMerge[],
  choices: ReadonlyMap<string, SettlementSide>,
): Record<string, unknown> {
  const body: Record<string, unknown> = { ...theirs };
  for (const merge of merges) {
    const side = merge.side === "conflict" ? (choices.get(merge.field) ?? "theirs") : merge.side;
    const value = side === "yours" ? merge.yours : side === "base" ? merge.base : merge.theirs;
    if (value === undefined) delete body[merge.field];
    else body[merge.field] = value;
  }
  return body;
}
