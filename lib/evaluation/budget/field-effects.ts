import { roundStored } from "@/lib/units/rounding";
import type { BudgetState } from "../lines/line-state";
import { applyEdits } from "./apply-edits";
import { changedPaths, withPathFrom } from "./body-paths";
import type { LineEdit } from "./edits";
import { evaluateBudget } from "./evaluate-budget";
import { findLine } from "./indexed-state";
import type { BudgetResults } from "./results";
import { unaffectedResults } from "./unaffected-results";

/** Newtons that one changed field brings; null where it only makes sense together with a later one. */
export interface FieldEffect {
  field: string;
  predictedDelta: number | null;
}

export interface LineEffect {
  /** Applied in this order, so that they sum to the line's. Empty for a line that is added, retired or reinstated. */
  fields: FieldEffect[];
  /** Of an item its own predicted value, of any other line the total; null where it cannot be computed. */
  predictedDelta: number | null;
}

/** What one edit brings at one operating point, field by field. */
export function fieldEffects(
  state: BudgetState,
  results: BudgetResults,
  edit: LineEdit,
  operatingPoint: string,
): LineEffect {
  const figure = (body: unknown) => figureAfter(state, results, { ...edit, body }, operatingPoint);
  const start = figureOf(results, edit, operatingPoint);
  const end = figure(edit.body);
  const total = end === null ? null : roundStored(end - (start ?? 0));
  const base = findLine(state, edit.kind, edit.number);
  if (edit.operation !== "revise" || !base || !isBody(edit.body)) return { fields: [], predictedDelta: total };

  const fields: FieldEffect[] = [];
  let body: object = base.body;
  let last = start ?? 0;
  for (const group of pathGroups(edit, base.body, edit.body)) {
    for (const path of group.paths) body = withPathFrom(body, edit.body, path);
    const now = figure(body);
    fields.push({ field: group.field, predictedDelta: now === null ? null : roundStored(now - last) });
    if (now !== null) last = now;
  }
  return { fields, predictedDelta: total };
}

/** Another method brings fields of its own: they count together, at the method. */
function pathGroups(edit: LineEdit, was: object, now: object): { field: string; paths: string[] }[] {
  const paths = changedPaths(edit.kind, was, now);
  if (!paths.includes("method")) return paths.map((path) => ({ field: path, paths: [path] }));

  const isCommon = (path: string) => path !== "method" && path in was && path in now;
  const common = paths.filter(isCommon).map((path) => ({ field: path, paths: [path] }));
  return [{ field: "method", paths: paths.filter((path) => !isCommon(path)) }, ...common];
}

function figureAfter(
  state: BudgetState,
  results: BudgetResults,
  edit: LineEdit,
  operatingPoint: string,
): number | null {
  const applied = applyEdits(state, [edit], []);
  if (applied.faults.length > 0) return null;
  const after = evaluateBudget(applied.state, { frozen: unaffectedResults(state, applied.state, results) });
  return figureOf(after, edit, operatingPoint) ?? (edit.operation === "retire" ? 0 : null);
}

function figureOf(results: BudgetResults, { kind, number }: LineEdit, operatingPoint: string): number | null {
  const point = results.points.find((each) => each.operatingPoint === operatingPoint);
  if (kind !== "item") return point?.totals.predicted ?? null;
  const result = point?.items.find(({ item }) => item === number);
  return result && result.refused === null ? result.predicted : null;
}

function isBody(body: unknown): body is object {
  return typeof body === "object" && body !== null;
}
