import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import type { NameBook } from "@/lib/evaluation/lines/name-book";
import type { ComparedField } from "./views";

/** A side of a comparison: a line as it stood, with the names that its budget had for what it refers to. */
export interface LineSide {
  line: LineState;
  names: NameBook;
}

/** The printed fields that differ between two states of a line; all fields where it stands on one side only. */
export function comparedFields(was: LineSide | null, now: LineSide | null): ComparedField[] {
  const before = rowsOf(was);
  const after = rowsOf(now);
  const keys = [...new Set([...after.keys(), ...before.keys()])];
  return keys.flatMap((field) => {
    const [old, fresh] = [before.get(field), after.get(field)];
    if (old?.text === fresh?.text && old?.unit === fresh?.unit) return [];
    return [
      {
        field,
        label: fresh?.label ?? old?.label ?? field,
        was: old?.text ?? null,
        now: fresh?.text ?? null,
        unit: fresh?.unit ?? old?.unit ?? null,
      },
    ];
  });
}

function rowsOf(side: LineSide | null) {
  return new Map((side ? fieldRows(side.line, side.names) : []).map((row) => [row.field, row]));
}
