import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import type { DraftEdit } from "@/lib/proposals/schema";
import type { FileView, PersonView } from "@/lib/proposals/views";
import type { LineKind } from "@/lib/vocabulary/lines";

export interface NamedLine {
  kind: LineKind;
  number: string;
  name: string;
}

/** What the product holds for citations, and where a new file goes. */
export interface FileShelf {
  productCode: string;
  proposalId: number;
  held: readonly ShelvedFile[];
  onAdded: (file: ShelvedFile) => void;
}

export type ShelvedFile = Pick<FileView, "fileId" | "name" | "sha256" | "sourceDate" | "voided">;

/** What the fields of a form can refer to: lines of the budget and those this proposal adds, people, files. */
export interface EditorNames {
  lines: readonly NamedLine[];
  people: readonly PersonView[];
  owners: readonly PersonView[];
  /** Missing where nothing is kept, as on the Trial sheet. */
  files?: FileShelf;
}

export function linesToName(state: BudgetState, edits: readonly DraftEdit[]): NamedLine[] {
  const standing = state.lines
    .filter(({ retired }) => !retired)
    .map((line: LineState) => ({ kind: line.kind, number: line.number, name: lineName(line) }));
  const added = edits
    .filter(({ operation }) => operation === "add")
    .map(({ kind, number, body }) => ({ kind, number, name: String(body?.name ?? "") }));

  return [...standing, ...added];
}

const FIRST_NUMBERS: Partial<Record<LineKind, { prefix: string; width: number; step: number; first: number }>> = {
  item: { prefix: "", width: 3, step: 10, first: 10 },
  group: { prefix: "G", width: 1, step: 10, first: 10 },
  finish: { prefix: "F", width: 1, step: 10, first: 10 },
  operating_point: { prefix: "OP-", width: 1, step: 1, first: 1 },
};

/** The next number of a kind that nobody used: the next ten by default. */
export function nextNumber(kind: LineKind, taken: readonly string[]): string {
  const series = FIRST_NUMBERS[kind];
  if (!series) return "";
  const used = taken
    .filter((number) => number.startsWith(series.prefix))
    .map((number) => Number(number.slice(series.prefix.length)))
    .filter(Number.isFinite);
  const next = used.length === 0 ? series.first : (Math.floor(Math.max(...used) / series.step) + 1) * series.step;

  return `${series.prefix}${String(next).padStart(series.width, "0")}`;
}
