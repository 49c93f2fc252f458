import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";
import { sameValue } from "../records/same-value";
import type { DraftContent, DraftEdit } from "../schema";

type Submitted = Pick<DraftContent, "edits" | "transfers" | "title" | "reason" | "neededBy"> & { baseIssue: number };

/** What differs between two rounds, for those who signed the first: "Item 050 Side mirrors". */
export function whatMoved(earlier: Submitted, later: Submitted): string[] {
  const lines = [...later.edits, ...earlier.edits].filter((edit) => !isIn(earlier, edit) || !isIn(later, edit));
  return [
    ...new Set([
      ...lines.map(({ kind, number, body }) => lineText(kind, number, body)),
      ...(sameValue(earlier.transfers, later.transfers) ? [] : ["The transfers"]),
      ...(earlier.title === later.title && earlier.reason === later.reason ? [] : ["Title or reason"]),
      ...(earlier.neededBy === later.neededBy ? [] : ["The day by which it is needed"]),
      ...(earlier.baseIssue === later.baseIssue
        ? []
        : [`It stands on issue ${later.baseIssue}, no longer on issue ${earlier.baseIssue}`]),
    ]),
  ];
}

function isIn({ edits }: Submitted, edit: DraftEdit): boolean {
  return edits.some((other) => sameValue(other, edit));
}

function lineText(kind: DraftEdit["kind"], number: string, body: DraftEdit["body"]): string {
  const name = typeof body?.name === "string" ? ` ${body.name}` : "";
  return `${LINE_KIND_NAMES[kind]} ${number}${name}`;
}
