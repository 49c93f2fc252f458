import type { LineKind } from "@/lib/vocabulary/lines";
import { cited, type DemoFile } from "./demo-files";
import type { DemoHouse } from "./demo-house";
import { itemBody, type ItemDraft } from "./item-draft";
import { standingLine } from "./shown-sheet";

interface Adding {
  groups: readonly { number: string; name: string }[];
  items: readonly ItemDraft[];
}

/** Groups, items and the allocation of each, as one form; the allocations come from the unallocated rest. */
export function firstSheet(house: DemoHouse, { groups, items }: Adding, evidenceDaysAgo: number) {
  const evidenceDate = house.day(evidenceDaysAgo);
  const groupEdits = groups.map(({ number, name }, index) =>
    added("group", number, { name, parent: null, order: (index + 1) * 10 }),
  );
  const itemEdits = items.map((draft) =>
    added("item", draft.number, itemBody(draft, house.idOf(draft.owner), evidenceDate)),
  );
  return {
    edits: [...groupEdits, ...itemEdits],
    transfers: items.map(({ number, allocation }) => toItem(number, allocation)),
  };
}

export function added(kind: LineKind, number: string, body: Record<string, unknown>) {
  return { operation: "add", kind, number, baseLetter: null, body };
}

/** The standing line with some of its fields changed. */
export async function revised(productCode: string, kind: LineKind, number: string, changes: Record<string, unknown>) {
  const { letter, body } = await standingLine(productCode, kind, number);
  return { operation: "revise", kind, number, baseLetter: letter, body: { ...body, ...changes } };
}

/** Newtons from the unallocated rest to an item. */
export function toItem(number: string, newtons: number) {
  return {
    giver: { kind: "unallocated", number: null },
    receiver: { kind: "item", number },
    hundredths: hundredths(newtons),
  };
}

/** Newtons from an item back to the unallocated rest. */
export function fromItem(number: string, newtons: number) {
  return {
    giver: { kind: "item", number },
    receiver: { kind: "unallocated", number: null },
    hundredths: hundredths(newtons),
  };
}

/** A citation as the form holds it. */
export const citation = (document: string, revision: string, date: string, file?: DemoFile) => ({
  document,
  revision,
  date,
  ...(file ? { file: cited(file) } : {}),
});

function hundredths(newtons: number): number {
  return Math.round(newtons * 100);
}
