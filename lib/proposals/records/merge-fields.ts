import { sameValue } from "./same-value";

type Body = Readonly<Record<string, unknown>>;

/** One field of a line that somebody changed since the base issue; inside a record "growthTable.layout". */
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
  const [was, newest, drafted] = [leavesOf(base), leavesOf(theirs), leavesOf(yours)];
  const fields = [...new Set([...was.keys(), ...newest.keys(), ...drafted.keys()])];
  return fields.flatMap((field): FieldMerge[] => {
    const merge = { field, base: was.get(field), theirs: newest.get(field), yours: drafted.get(field) };
    const side = sideOf(merge);
    return side === null ? [] : [{ ...merge, side }];
  });
}

/** The body after the merge; a conflict without a choice keeps the newest issue's value. */
export function mergedBody(
  theirs: Body,
  merges: readonly FieldMerge[],
  choices: ReadonlyMap<string, SettlementSide>,
): Record<string, unknown> {
  return merges.reduce<Record<string, unknown>>(
    (body, merge) => {
      const side = merge.side === "conflict" ? (choices.get(merge.field) ?? "theirs") : merge.side;
      const value = side === "yours" ? merge.yours : side === "base" ? merge.base : merge.theirs;
      return withLeaf(body, merge.field.split("."), value);
    },
    { ...theirs },
  );
}

function sideOf({ base, theirs, yours }: Omit<FieldMerge, "side" | "field">): FieldMerge["side"] | null {
  const theyMoved = !sameValue(base, theirs);
  const youMoved = !sameValue(base, yours);
  if (theyMoved && youMoved) return sameValue(theirs, yours) ? "both_alike" : "conflict";
  if (theyMoved) return "theirs";
  return youMoved ? "yours" : null;
}

/** Fields with their values; records are taken apart, quantities and lists are values. */
function leavesOf(body: Body, prefix = ""): Map<string, unknown> {
  const leaves = new Map<string, unknown>();
  for (const [key, value] of Object.entries(body)) {
    if (!isRecord(value)) leaves.set(`${prefix}${key}`, value);
    else for (const [path, leaf] of leavesOf(value, `${prefix}${key}.`)) leaves.set(path, leaf);
  }
  return leaves;
}

function withLeaf(body: Body, [key = "", ...rest]: readonly string[], value: unknown): Record<string, unknown> {
  const { [key]: current, ...others } = body;
  if (rest.length > 0) return { ...body, [key]: withLeaf(isRecord(current) ? current : {}, rest, value) };
  return value === undefined ? others : { ...body, [key]: value };
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value) && !("value" in value);
}
