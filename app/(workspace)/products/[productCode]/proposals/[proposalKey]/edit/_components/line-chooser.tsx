"use client";

import { useState } from "react";

import { Button } from "@/app/_components/button";
import { ChoiceField } from "@/app/_components/choice-field";
import { nextNumber } from "@/app/_components/line-fields/editor-names";
import { addEdit, copyEdit, type NewLineKind, reviseEdit } from "@/app/_components/line-fields/new-edit";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import type { DraftEdit } from "@/lib/proposals/schema";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

interface LineChooserProps {
  state: BudgetState;
  edits: readonly DraftEdit[];
  me: { userId: number; isProgramManager: boolean };
  onAdd: (edit: DraftEdit) => void;
}

/** Chooses a line to revise, retire or reinstate, or a kind of line to add; offers only what the role may edit. */
export function LineChooser({ state, edits, me, onAdd }: LineChooserProps) {
  const lines = editableLines(state, edits, me);
  const [chosen, setChosen] = useState("");
  const line = lines.find((candidate) => keyOf(candidate) === chosen) ?? lines[0];

  return (
    <div className="mt-4 flex flex-wrap items-end gap-x-3 gap-y-2 border-t border-rule pt-4">
      {line ? (
        <>
          <div className="min-w-56 grow sm:max-w-md">
            <ChoiceField
              label="Line"
              value={keyOf(line)}
              onChange={(event) => setChosen(event.target.value)}
              choices={lines.map((candidate) => ({ value: keyOf(candidate), label: labelOf(candidate) }))}
            />
          </div>
          {line.retired ? (
            <Button onClick={() => onAdd(reviseEdit(line, "reinstate"))}>Reinstate it</Button>
          ) : (
            <>
              <Button onClick={() => onAdd(reviseEdit(line, "revise"))}>Revise it</Button>
              {line.kind === "terms" || line.kind === "allocations" ? null : (
                <>
                  <Button onClick={() => onAdd(reviseEdit(line, "retire"))}>Retire it</Button>
                  <Button onClick={() => onAdd(copied(line, line.kind, { state, edits, me }))}>Copy it</Button>
                </>
              )}
            </>
          )}
        </>
      ) : null}
      <AddButtons state={state} edits={edits} me={me} onAdd={onAdd} />
    </div>
  );
}

function AddButtons({ state, edits, me, onAdd }: LineChooserProps) {
  const kinds: NewLineKind[] = me.isProgramManager ? ["item", "group", "operating_point", "finish"] : ["item"];

  return (
    <div className="flex flex-wrap gap-2">
      {kinds.map((kind) => (
        <Button key={kind} onClick={() => onAdd(addEdit(kind, freeNumber(kind, state, edits), state, me.userId))}>
          Add {kind === "item" || kind === "operating_point" ? "an" : "a"} {LINE_KIND_NAMES[kind].toLowerCase()}
        </Button>
      ))}
    </div>
  );
}

type Editing = Omit<LineChooserProps, "onAdd">;

function copied(line: LineState, kind: NewLineKind, { state, edits, me }: Editing): DraftEdit {
  return copyEdit(line, kind, freeNumber(kind, state, edits), me.userId);
}

function freeNumber(kind: NewLineKind, state: BudgetState, edits: readonly DraftEdit[]): string {
  return nextNumber(
    kind,
    [...state.lines, ...edits].filter((line) => line.kind === kind).map(({ number }) => number),
  );
}

function editableLines(state: BudgetState, edits: readonly DraftEdit[], me: LineChooserProps["me"]): LineState[] {
  return state.lines
    .filter(({ kind }) => kind !== "allocations")
    .filter((line) => me.isProgramManager || (line.kind === "item" && line.body.ownerId === me.userId))
    .filter(({ kind, number }) => !edits.some((edit) => edit.kind === kind && edit.number === number));
}

function keyOf({ kind, number }: LineState): string {
  return `${kind} ${number}`;
}

function labelOf(line: LineState): string {
  const retired = line.retired ? " (retired)" : "";
  if (line.kind === "item") return `${line.number} ${lineName(line)}${retired}`;

  return `${LINE_KIND_NAMES[line.kind]} ${line.number} ${lineName(line)}${retired}`;
}
