"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";

import { answerOf } from "@/app/_components/answer-of";
import { Button } from "@/app/_components/button";
import { EmptyNote } from "@/app/_components/empty-note";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import type { SheetToSign } from "@/lib/proposals/reading/sheets-to-sign";
import type { SignedSheets } from "@/lib/proposals/signing/sign-sheets";

import { signSheetsAction } from "../actions";
import { SheetsTable } from "./sheets-table";
import { SignedResult } from "./signed-result";

interface Signed {
  answer: SignedSheets;
  /** Labels by proposal, as they stood in the list that was signed. */
  labels: ReadonlyMap<number, string>;
}

/** Several sheets, one password: what was not opened as it stands now can't be chosen. */
export function SignSheetsForm({ sheets }: { sheets: readonly SheetToSign[] }) {
  const { sign, busy, refused, signed } = useSigning(sheets);
  const isReady = sheets.some(({ opened }) => opened);

  return (
    <>
      {signed ? <SignedResult answer={signed.answer} labels={signed.labels} /> : null}
      {sheets.length === 0 ? (
        <EmptyNote title="No sheet waits for your approval." />
      ) : (
        <form onSubmit={sign} className="space-y-4">
          <SheetsTable sheets={sheets} />
          {isReady ? (
            <div className="max-w-sm">
              <TextField
                name="password"
                type="password"
                label="Your password"
                autoComplete="current-password"
                error={refused?.faults.find(({ path }) => path === "password")?.sentence}
                required
              />
            </div>
          ) : null}
          {refused ? <Notice kind="refusal">{refused.sentence}</Notice> : null}
          {isReady ? (
            <Button type="submit" kind="primary" busy={busy}>
              {busy ? "One moment…" : "Sign the chosen sheets"}
            </Button>
          ) : (
            <p className="text-ink-2">Open a sheet and read it; then it can be chosen here.</p>
          )}
        </form>
      )}
    </>
  );
}

type Answer = Awaited<ReturnType<typeof signSheetsAction>>;

function useSigning(sheets: readonly SheetToSign[]) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Extract<Answer, { ok: false }> | null>(null);
  const [signed, setSigned] = useState<Signed | null>(null);

  async function sign(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy) return;
    const element = event.currentTarget;
    const form = new FormData(element);
    setBusy(true);
    try {
      const chosen = sheets.filter(({ proposalId }) => form.get(`sheet ${proposalId}`) === "on");
      const input = {
        sheets: chosen.map((sheet) => sheetInput(sheet, form)),
        password: String(form.get("password") ?? ""),
      };
      const answer = await answerOf(signSheetsAction(input));
      if (!answer.ok) return setRefused(answer);
      setRefused(null);
      element.reset();
      setSigned({ answer: answer.value, labels: new Map(chosen.map(({ proposalId, label }) => [proposalId, label])) });
      router.refresh();
    } finally {
      setBusy(false);
    }
  }

  return { sign, busy, refused, signed };
}

function sheetInput({ proposalId, roundHash, textHash, capacity, deputyFor }: SheetToSign, form: FormData) {
  const meaning = String(form.get(`meaning ${proposalId}`) ?? "");
  const shown = { proposalId, roundHash, textHash, capacity, meaning };

  return { ...shown, decision: "approve" as const, deputyForId: deputyFor?.id ?? null };
}
