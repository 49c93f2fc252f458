"use client";

import { useState } from "react";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { TextField } from "@/app/_components/text-field";
import { UtcTime } from "@/app/_components/utc-time";
import type { Body } from "@/app/_components/line-fields/body";
import type { EditorNames } from "@/app/_components/line-fields/editor-names";
import { FieldInput } from "@/app/_components/line-fields/field-input";
import { withMethod } from "@/app/_components/line-fields/new-edit";
import { isShown, valuesOf, withoutHidden } from "@/lib/evaluation/lines/field-rows";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { sameBody } from "@/lib/evaluation/lines/same-body";
import { fieldsOfBody } from "@/lib/evaluation/lines/field-catalogue";
import { type FieldSpec, setByChoice } from "@/lib/evaluation/lines/field-spec";
import { fieldWords } from "@/lib/evaluation/lines/named-fault";
import type { DraftEdit } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

import { isAdopted, VersionLine } from "./version-line";

interface LineFormProps {
  edit: DraftEdit;
  index: number;
  onChange: (edit: DraftEdit) => void;
  onRemove: () => void;
  names: EditorNames;
  /** The budget on which the proposal stands. */
  state: BudgetState;
  faults: readonly FieldFault[];
  /** Before the first try to propose, empty fields are no faults yet. */
  strict: boolean;
  /** The body before the edit: what differs from it carries a change bar. */
  before: Body | null;
  /** What co-editors changed in this line. */
  touched: DraftView["touched"];
}

const OPERATION_WORDS = { add: "new", revise: "revised", retire: "to be retired", reinstate: "to be reinstated" };

/** One line of the proposal as a form, drawn from the field catalogue of its kind. */
export function LineForm(props: LineFormProps) {
  const { edit, index, onChange, onRemove, names, state, faults, strict, before, touched } = props;
  const [left, setLeft] = useState<Body>({});
  const [opened, setOpened] = useState(false);
  const own = faults
    .filter(({ path }) => path.startsWith(`edits.${index}.`))
    .map(({ path, sentence }) => ({ path: path.replace(/^edits\.\d+\.(body\.)?/, ""), sentence }));
  // A version adopted for many items needs no form for each of them.
  const isFolded = !opened && own.length === 0 && changesVersionAlone(before, edit.body);

  return (
    <section className="mt-5 border-t border-ink pt-3" aria-label={`${edit.number} ${nameOf(edit, before)}`}>
      <div className="mb-2 flex flex-wrap items-baseline gap-x-2.5 gap-y-1">
        <h3 className="text-base font-semibold">
          {edit.kind === "item" ? "" : `${LINE_KIND_NAMES[edit.kind]} `}
          {edit.number} {nameOf(edit, before)}
        </h3>
        {edit.baseLetter ? <RevisionLetter letter={edit.baseLetter} /> : null}
        <span className="text-sm text-ink-2">{OPERATION_WORDS[edit.operation]}</span>
        <span className="ml-auto flex gap-x-4">
          {isFolded ? (
            <button type="button" className="link min-h-6 text-sm" onClick={() => setOpened(true)}>
              Show its fields
            </button>
          ) : null}
          <button type="button" className="link min-h-6 text-sm" onClick={onRemove}>
            Take out of the proposal
          </button>
        </span>
      </div>
      <LineFaults faults={own} strict={strict} kind={edit.kind} body={edit.body} />
      {edit.operation === "add" ? (
        <div className="mb-3 max-w-44">
          <TextField
            label="Number"
            hint="Unique here, never used again."
            value={edit.number}
            maxLength={12}
            onChange={(event) => onChange({ ...edit, number: event.target.value.toUpperCase().trim() })}
            error={own.find(({ path }) => path === "number")?.sentence}
          />
        </div>
      ) : null}
      {edit.body ? <VersionLine before={before} body={edit.body} /> : null}
      {edit.body && !isFolded ? (
        <Fields
          edit={edit}
          body={edit.body}
          onChange={(body) => onChange({ ...edit, body })}
          names={names}
          state={state}
          faults={own}
          strict={strict}
          before={before}
          touched={touched}
          left={left}
          onLeave={setLeft}
          index={index}
        />
      ) : null}
    </section>
  );
}

function changesVersionAlone(before: Body | null, body: Body | null): boolean {
  if (!before || !body || !isAdopted(before, body)) return false;

  return sameBody({ ...body, methodVersion: before.methodVersion }, before);
}

function nameOf(edit: DraftEdit, before: Body | null): string {
  const name = edit.body?.name ?? before?.name;

  return typeof name === "string" && name !== "" ? name : edit.operation === "add" ? "(no name yet)" : "";
}

interface FieldsProps extends Pick<
  LineFormProps,
  "edit" | "index" | "names" | "state" | "faults" | "strict" | "before" | "touched"
> {
  body: Body;
  onChange: (body: Body) => void;
  /** Values of fields that only methods chosen before have: they come back with their method. */
  left: Body;
  onLeave: (left: Body) => void;
}

function Fields(props: FieldsProps) {
  const { edit, index, body, onChange, names, state, faults, strict, before, touched, left, onLeave } = props;
  const specs = fieldsOfBody(edit.kind, body).filter((spec) => !spec.fixed && spec.key !== "justifications");
  const shown = specs.filter((spec) => isShown(spec, valuesOf(body)));
  const faultAt = (path: string) => {
    const top = path.split(".")[0] ?? path;
    const isEmpty = body[top] === null || body[top] === "" || body[top] === undefined;
    if (isEmpty && !strict) return undefined;

    return faults.find((fault) => fault.path === path || isPartOf(fault.path, path))?.sentence;
  };
  const change = (spec: FieldSpec, value: Body[string]) => {
    if (spec.key !== "method" || typeof value !== "string") {
      return onChange(withoutHidden(edit.kind, { ...body, [spec.key]: value, ...setByChoice(spec, value) }));
    }
    const known = { ...left, ...body };
    onLeave(known);
    onChange(withMethod(known, value, state));
  };

  return (
    <div className="grid gap-x-5 gap-y-3.5 sm:grid-cols-2 xl:grid-cols-3">
      {shown.map((spec) => {
        const isWide = spec.type.type === "list" || spec.type.type === "record" || spec.type.type === "references";
        const isChanged = before !== null && !sameBody(body[spec.key], before[spec.key]);

        return (
          <div
            key={`${spec.key} ${spec.type.type}`}
            className={`${isWide ? "sm:col-span-full" : ""} ${isChanged ? "change-bar" : ""}`}
          >
            <FieldInput
              spec={spec}
              value={body[spec.key]}
              onChange={(value) => change(spec, value)}
              names={names}
              faultAt={faultAt}
              path={spec.key}
              id={`edit-${index}-${spec.key}`}
            />
            <TouchedBy marks={touched.filter(({ field }) => field.split(".")[0] === spec.key)} />
          </div>
        );
      })}
    </div>
  );
}

/** Who else changed a field, and when: the newest mark where it has several parts. */
function TouchedBy({ marks }: { marks: DraftView["touched"] }) {
  const newest = marks.toSorted((one, other) => one.at.localeCompare(other.at)).at(-1);
  if (!newest) return null;

  return (
    <p className="mt-0.5 text-xs text-ink-2">
      changed by {newest.by.name}, <UtcTime at={newest.at} />
    </p>
  );
}

/** A fault of a quantity's inner value stands at the quantity. */
function isPartOf(faultPath: string, path: string): boolean {
  return (
    faultPath === `${path}.value` || faultPath === `${path}.entered` || faultPath === `${path}.standardUncertainty`
  );
}

interface LineFaultsProps {
  faults: readonly FieldFault[];
  strict: boolean;
  kind: DraftEdit["kind"];
  body: Body | null;
}

/** What is wrong with the line as a whole, or with a field that its form does not show. */
function LineFaults({ faults, strict, kind, body }: LineFaultsProps) {
  const ofLine = faults.filter(({ path }) => path === "" || path === "body" || path === "operation" || !body);
  const ofHidden = faults.filter(({ path }) => body && isHiddenField(kind, body, path));
  const whole = [
    ...ofLine,
    ...ofHidden.map(({ path, sentence }) => {
      return { path, sentence: `${fieldWords({ kind, body }, path).join(", ")}: ${sentence}` };
    }),
  ];
  if (whole.length === 0 || (!strict && body)) return null;

  return (
    <ul className="mb-2">
      {whole.map(({ path, sentence }) => (
        <li key={`${path} ${sentence}`} className="text-sm font-medium text-signal">
          <span aria-hidden>✕ </span>
          {sentence}
        </li>
      ))}
    </ul>
  );
}

function isHiddenField(kind: DraftEdit["kind"], body: Body, path: string): boolean {
  const spec = fieldsOfBody(kind, body).find(({ key }) => key === path.split(".")[0]);

  return spec !== undefined && !isShown(spec, valuesOf(body));
}
