"use client";

import { type ChangeEvent, useEffect, useRef } from "react";

import { Button } from "@/app/_components/button";
import { CONTROL, Field, type FieldTexts } from "@/app/_components/field";
import { FileLink } from "@/app/_components/file-link";
import { SendingBar } from "@/app/_components/sending-bar";
import { useSending } from "@/app/_components/use-sending";
import { ACCEPTED_FILES } from "@/lib/vocabulary/files";

import { asRecord, type Body } from "./body";
import type { FileShelf, ShelvedFile } from "./editor-names";

interface FileInputProps extends FieldTexts {
  id: string;
  fieldKey: string;
  entry: { row: Body; onChange: (row: Body) => void };
  shelf: FileShelf;
}

/** The file of a citation: one that the product holds, or a new one, sent at once. */
export function FileInput({ fieldKey, entry, shelf, ...texts }: FileInputProps) {
  const cited = asRecord(entry.row[fieldKey]);
  const name = typeof cited.name === "string" ? cited.name : null;
  // A file takes its time: what was typed meanwhile stays.
  const newest = useRef(entry);
  useEffect(() => void (newest.current = entry), [entry]);
  const cite = (file: ShelvedFile) => newest.current.onChange(withFile(newest.current.row, fieldKey, file));

  return name === null ? (
    <FileChoice {...texts} row={entry.row} shelf={shelf} onChosen={cite} />
  ) : (
    <CitedName
      {...texts}
      name={name}
      shelf={shelf}
      held={shelf.held.find(({ sha256 }) => sha256 === cited.sha256)}
      onTakeOff={() => entry.onChange(without(entry.row, fieldKey))}
    />
  );
}

/** The citation with the file; what it lacked is taken from it. */
function withFile(row: Body, key: string, { name, sha256, sourceDate }: ShelvedFile): Body {
  const document = typeof row.document === "string" && row.document.trim() !== "" ? row.document : nameOf(name);

  return { ...row, document, date: row.date || sourceDate, [key]: { name, sha256 } };
}

function nameOf(fileName: string): string {
  return fileName.replace(/\.[a-z0-9]{1,5}$/i, "").slice(0, 120);
}

function without(row: Body, key: string): Body {
  return Object.fromEntries(Object.entries(row).filter(([each]) => each !== key));
}

interface CitedNameProps extends FieldTexts {
  id: string;
  name: string;
  shelf: FileShelf;
  held: ShelvedFile | undefined;
  onTakeOff: () => void;
}

function CitedName({ id, name, shelf, held, error, onTakeOff }: CitedNameProps) {
  return (
    <div id={id} tabIndex={-1} className="flex flex-wrap items-baseline gap-x-3 gap-y-1 text-sm">
      <span>
        <span className="font-medium">File</span>{" "}
        {held ? <FileLink productCode={shelf.productCode} file={held} /> : <span className="break-words">{name}</span>}
      </span>
      <button type="button" className="link min-h-6" onClick={onTakeOff}>
        Take the file off
      </button>
      {held?.voided ? (
        <span className="basis-full">
          ▲ Voided by {held.voided.by}: {held.voided.reason}
        </span>
      ) : null}
      {error ? (
        <span className="basis-full font-medium text-signal">
          <span aria-hidden>✕ </span>
          {error}
        </span>
      ) : null}
    </div>
  );
}

interface FileChoiceProps extends FieldTexts {
  id: string;
  row: Body;
  shelf: FileShelf;
  onChosen: (file: ShelvedFile) => void;
}

function FileChoice({ id, row, shelf, onChosen, label, optional, error }: FileChoiceProps) {
  const picker = useRef<HTMLInputElement>(null);
  const { share, refusal, send, refuse } = useSending();
  const held = shelf.held.filter(({ voided }) => voided === null);

  async function pick({ target }: ChangeEvent<HTMLInputElement>) {
    const file = target.files?.[0];
    target.value = "";
    if (!file) return;
    if (typeof row.date !== "string" || row.date === "") return refuse("Give the date of the document first.");
    const { productCode, proposalId } = shelf;
    const sent = await send({ productCode, proposalId, place: "working_copy", sourceDate: row.date, file });
    if (!sent.ok) return;
    const added = { ...sent.file, voided: null };
    shelf.onAdded(added);
    onChosen(added);
  }

  return (
    <Field
      id={id}
      label={label}
      optional={optional}
      hint={`One that the product holds, or a new one: ${ACCEPTED_FILES}.`}
      error={refusal ?? error}
    >
      {(aria) => (
        <span className="flex flex-wrap items-center gap-2">
          <input ref={picker} type="file" hidden aria-hidden tabIndex={-1} onChange={(event) => void pick(event)} />
          <select
            {...aria}
            className={`${CONTROL} max-w-md`}
            value=""
            onChange={({ target }) => {
              const file = held.find(({ sha256 }) => sha256 === target.value);
              if (file) onChosen(file);
            }}
          >
            <option value="">none</option>
            {held.map(({ sha256, name, sourceDate }) => (
              <option key={sha256} value={sha256}>
                {name}, {sourceDate}
              </option>
            ))}
          </select>
          <Button busy={share !== null} onClick={() => picker.current?.click()}>
            Add a file…
          </Button>
          {share === null ? null : <SendingBar share={share} name="the file" />}
        </span>
      )}
    </Field>
  );
}
