"use client";

import { useMemo, useState } from "react";

import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { type DraftConflict, type DraftSide, mergeDrafts } from "@/lib/proposals/drafting/merge-drafts";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { conflictTexts } from "./conflict-texts";

interface MovedNoticeProps {
  /** What both editors had before they parted. */
  base: DraftContent;
  mine: DraftContent;
  stored: DraftView;
  people: readonly { id: number; name: string }[];
  settle: (content: DraftContent, stored: DraftView) => void;
}

/** Two editors changed one field: each value beside the other, with who typed it and when, before either is lost. */
export function MovedNotice({ base, mine, stored, people, settle }: MovedNoticeProps) {
  const [choices, setChoices] = useState<ReadonlyMap<string, DraftSide>>(new Map());
  const merge = useMemo(() => mergeDrafts(base, stored.content, mine, choices), [base, stored, mine, choices]);
  const choose = (key: string, side: DraftSide) => setChoices((old) => new Map(old).set(key, side));

  return (
    <div className="mb-4">
      <Notice kind="caution">
        <p className="mb-2">
          {stored.savedBy.name} saved this draft at {stored.savedAt.slice(11, 16)} UTC and changed what you changed too.
          Nothing of yours is lost or saved yet: choose, row by row. What only one of you changed is kept as it is.
        </p>
        <Table caption="Fields that two editors changed" narrow="stack">
          <TableHead>
            <Head>Field</Head>
            <Head>Yours</Head>
            <Head>Theirs</Head>
          </TableHead>
          <tbody>
            {merge.conflicts.map((conflict) => (
              <ConflictRow
                key={conflict.key}
                conflict={conflict}
                mine={mine}
                stored={stored}
                people={people}
                side={choices.get(conflict.key) ?? "theirs"}
                choose={(side) => choose(conflict.key, side)}
              />
            ))}
          </tbody>
        </Table>
        <div className="mt-3">
          <Button kind="primary" onClick={() => settle(merge.content, stored)}>
            Save what is chosen
          </Button>
        </div>
      </Notice>
    </div>
  );
}

interface ConflictRowProps extends Pick<MovedNoticeProps, "mine" | "stored" | "people"> {
  conflict: DraftConflict;
  side: DraftSide;
  choose: (side: DraftSide) => void;
}

function ConflictRow({ conflict, mine, stored, people, side, choose }: ConflictRowProps) {
  const texts = conflictTexts(conflict, { mine, theirs: stored.content, people });
  const line = conflict.line && `${conflict.line.kind} ${conflict.line.number}`;
  const touch = stored.touched.find((each) => each.line === line && each.field === (conflict.field ?? ""));
  const by = touch?.by ?? stored.savedBy;
  const at = touch?.at ?? stored.savedAt;
  const radio = (value: DraftSide, label: string, text: string) => (
    <label className="flex min-h-7 items-baseline gap-2">
      <input
        type="radio"
        name={conflict.key}
        aria-label={`${label} of ${texts.label}`}
        checked={side === value}
        onChange={() => choose(value)}
        className="size-4 shrink-0 translate-y-0.5 accent-ink"
      />
      <span className="min-w-0 break-words whitespace-pre-line">{text}</span>
    </label>
  );

  return (
    <Row>
      <RowHead label="Field">{texts.label}</RowHead>
      <Cell label="Yours">{radio("mine", "Yours", texts.mine)}</Cell>
      <Cell label="Theirs">
        {radio("theirs", "Theirs", texts.theirs)}
        <span className="block text-xs text-ink-2">
          {by.name}, {at.slice(11, 16)} UTC
        </span>
      </Cell>
    </Row>
  );
}
