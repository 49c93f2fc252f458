import type { ProductKind } from "@/lib/vocabulary/lines";
import type { AllocationsBody } from "./allocations-body";
import type { FinishBody } from "./finish-body";
import type { GroupBody } from "./group-body";
import type { ItemBody } from "./item-body";
import type { OperatingPointBody } from "./operating-point-body";
import type { TermsBody } from "./terms-body";

/** A kind and the body that belongs to it. */
export type LineContent =
  | { kind: "item"; body: ItemBody }
  | { kind: "group"; body: GroupBody }
  | { kind: "operating_point"; body: OperatingPointBody }
  | { kind: "finish"; body: FinishBody }
  | { kind: "allocations"; body: AllocationsBody }
  | { kind: "terms"; body: TermsBody };

export interface LineRevision {
  number: string;
  letter: string;
  /** The issue that brought this revision. */
  issue: number;
  retired: boolean;
}

/** A line as it stands at an issue. */
export type LineState = LineRevision & LineContent;
export type LineOf<K extends LineState["kind"]> = Extract<LineState, { kind: K }>;

export interface BudgetState {
  product: { code: string; name: string; kind: ProductKind };
  lines: readonly LineState[];
}
