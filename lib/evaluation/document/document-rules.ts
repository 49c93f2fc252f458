import type { z } from "zod";

/** Rules between the entries of a document: ids are unique in each list, and shares name what is there. */
export function checkDocumentRules(document: unknown, context: z.RefinementCtx): void {
  const fault = (path: PropertyKey[], message: string): void => context.addIssue({ code: "custom", path, message });
  const items = entriesOf(document, "items");
  checkUnique("operatingPoints", entriesOf(document, "operatingPoints"), fault);
  checkUnique("items", items, fault);

  const ids = new Set(items.map((item) => item.get("id")));
  const groups = new Set(items.map((item) => item.get("group")));
  items.forEach((item, index) => {
    if (item.get("method") !== "share") return;
    const of: unknown = item.get("of");
    if (Array.isArray(of)) {
      of.forEach((id: unknown, place) => {
        if (typeof id === "string" && !ids.has(id)) fault(["items", index, "of", place], `names no item: "${id}"`);
      });
    }
    const ofGroup = item.get("ofGroup");
    if (typeof ofGroup === "string" && !groups.has(ofGroup)) {
      fault(["items", index, "ofGroup"], `names no group: "${ofGroup}"`);
    }
  });
}

type Entry = ReadonlyMap<string, unknown>;

function entriesOf(document: unknown, list: string): Entry[] {
  if (typeof document !== "object" || document === null) return [];
  const entries: unknown = new Map<string, unknown>(Object.entries(document)).get(list);
  if (!Array.isArray(entries)) return [];
  return entries.map((entry: unknown) =>
    typeof entry === "object" && entry !== null ? new Map<string, unknown>(Object.entries(entry)) : new Map(),
  );
}

function checkUnique(list: string, entries: Entry[], fault: (path: PropertyKey[], message: string) => void): void {
  const firstAt = new Map<unknown, number>();
  entries.forEach((entry, index) => {
    const id = entry.get("id");
    if (typeof id !== "string") return;
    const first = firstAt.get(id);
    if (first === undefined) firstAt.set(id, index);
    else fault([list, index, "id"], `must be unique: ${list}[${first}] has it too`);
  });
}
