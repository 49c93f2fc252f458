"use client";

import { useState } from "react";

import type { ActionResult } from "@/app/_server/action-result";
import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import type { ChainReport } from "@/lib/audit/chain-report";

import { checkHouseHistoryAction } from "../actions";

/** Proves the chain of the installation and says what was found. */
export function CheckHouseChain() {
  const [busy, setBusy] = useState(false);
  const [answer, setAnswer] = useState<ActionResult<ChainReport> | null>(null);

  async function check() {
    setBusy(true);
    try {
      setAnswer(await checkHouseHistoryAction({}));
    } finally {
      setBusy(false);
    }
  }

  return (
    <div className="mb-5 space-y-3 print:hidden">
      <Button busy={busy} onClick={check}>
        {busy ? "Checking…" : "Check the chain"}
      </Button>
      {answer ? <Found answer={answer} /> : null}
    </div>
  );
}

function Found({ answer }: { answer: ActionResult<ChainReport> }) {
  if (!answer.ok) return <Notice kind="refusal">{answer.sentence}</Notice>;
  const { entries, head, faults } = answer.value;
  const counted = entries === 1 ? "1 entry checked" : `${entries} entries checked`;

  if (faults.length === 0) {
    return (
      <Notice kind="done">
        Unbroken: {counted}. The chain ends at entry {head.sequence},{" "}
        <span className="font-code text-sm break-all">{head.hash}</span>.
      </Notice>
    );
  }
  return (
    <Notice kind="refusal">
      Broken: {counted}.
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
