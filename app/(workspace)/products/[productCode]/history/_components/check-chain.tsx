"use client";

import { useState } from "react";

import type { ActionResult } from "@/app/_server/action-result";
import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import type { ChainReport } from "@/lib/audit/chain-report";

import { checkHistoryAction } from "../actions";

/** Checks the chain from what is stored and says what was found, in a sentence. */
export function CheckChain({ productCode }: { productCode: string }) {
  const [busy, setBusy] = useState(false);
  const [answer, setAnswer] = useState<ActionResult<ChainReport> | null>(null);
  const faultOf = (path: string) =>
    answer && !answer.ok ? answer.faults.find((fault) => fault.path === path)?.sentence : undefined;

  async function check(form: FormData) {
    setBusy(true);
    try {
      setAnswer(await checkHistoryAction({ productCode, ...notedHead(form) }));
    } finally {
      setBusy(false);
    }
  }

  return (
    <div className="mb-5 print:hidden">
      <form
        onSubmit={(event) => {
          event.preventDefault();
          void check(new FormData(event.currentTarget));
        }}
      >
        <div className="flex flex-wrap items-baseline gap-x-4 gap-y-2">
          <Button type="submit" busy={busy}>
            {busy ? "Checking…" : "Check the chain"}
          </Button>
          <details className="text-sm">
            <summary className="link w-fit">against a head that you noted earlier</summary>
            <div className="mt-2 grid gap-3 sm:grid-cols-[8rem_32rem]">
              <TextField label="Entry number" name="sequence" inputMode="numeric" error={faultOf("sequence")} />
              <TextField
                label="Its hash"
                name="hash"
                className="font-code text-sm"
                maxLength={64}
                error={faultOf("hash")}
              />
            </div>
          </details>
        </div>
      </form>
      <div className="mt-3" aria-live="polite">
        {answer ? <Outcome answer={answer} /> : null}
      </div>
    </div>
  );
}

function notedHead(form: FormData): { sequence: number | null; hash: string | null } {
  const sequence = String(form.get("sequence") ?? "").trim();
  const hash = String(form.get("hash") ?? "").trim();
  return { sequence: sequence === "" ? null : Number(sequence), hash: hash === "" ? null : hash.toLowerCase() };
}

function Outcome({ answer }: { answer: ActionResult<ChainReport> }) {
  if (!answer.ok) return <Notice kind="refusal">{answer.sentence}</Notice>;
  const { entries, records, head, faults } = answer.value;
  const counted = `${entries} ${entries === 1 ? "entry" : "entries"} and ${records} bound ${records === 1 ? "row" : "rows"} checked`;

  if (faults.length === 0) {
    return (
      <Notice kind="done">
        Unbroken: {counted}. The chain ends at entry {head.sequence},{" "}
        <span className="font-code text-sm break-all">{head.hash}</span>. Note it elsewhere: a chain cannot see its own
        end being cut.
      </Notice>
    );
  }
  return (
    <Notice kind="refusal">
      Broken: {counted}, {faults.length} {faults.length === 1 ? "fault" : "faults"} found.
      <ul className="mt-2 list-disc pl-5">
        {faults.map(({ where, sentence }, at) => (
          <li key={at}>
            {where}: {sentence}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
