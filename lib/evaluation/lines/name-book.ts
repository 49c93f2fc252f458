import type { LineKind } from "@/lib/vocabulary/lines";
import type { BudgetState } from "./line-state";

/** Names for what a body refers to by id or number. */
export interface NameBook {
  person(id: number): string | null;
  line(kind: LineKind, number: string): string | null;
}

export function nameBookOf(state: BudgetState, people: ReadonlyMap<number, string>): NameBook {
  const names = new Map(state.lines.map((line) => [`${line.kind} ${line.number}`, lineName(line)]));
  return {
    person: (id) => people.get(id) ?? null,
    line: (kind, number) => names.get(`${kind} ${number}`) ?? null,
  };
}

/** What a line is called on a sheet. */
export function lineName(line: Pick<BudgetState["lines"][number], "kind" | "body">): string {
  if ("name" in line.body) return line.body.name;
  return line.kind === "terms" ? "Terms" : "Allocations";
}
