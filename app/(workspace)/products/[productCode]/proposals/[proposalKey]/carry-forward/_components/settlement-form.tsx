"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { type FormEvent, useState, useTransition } from "react";

import { Button } from "@/app/_components/button";
import { ChoiceField } from "@/app/_components/choice-field";
import { Notice } from "@/app/_components/notice";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { TextField } from "@/app/_components/text-field";
import type { SettlementRow, SettlementView } from "@/lib/proposals/workspace-views";
import { formatNewtonsChange } from "@/lib/units/format-newtons";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

import { carryForwardAction } from "../actions";

interface SettlementFormProps {
  view: SettlementView;
  productCode: string;
  proposalKey: string;
}

type Choice = "base" | "theirs" | "yours";

/** Fields that both sides changed, each to be settled with its why; the rest carries by itself. */
export function SettlementForm({ view, productCode, proposalKey }: SettlementFormProps) {
  const { submit, busy, refusal } = useSettlement(view, `/products/${productCode}/proposals/${proposalKey}`);

  return (
    <form onSubmit={submit}>
      {view.obstacles.map((sentence) => (
        <div key={sentence} className="mb-3">
          <Notice kind="caution">{sentence}</Notice>
        </div>
      ))}
      <p className="mb-3 max-w-[70ch]">
        {view.conflicts.length === 0
          ? "Nothing conflicts: every field that you changed stands as you wrote it, every other as it stands today."
          : "Both sides changed these fields since you drafted. Say for each which value holds, and why."}{" "}
        Carrying forward makes a new round; signatures of earlier rounds stay visible and no longer count.
      </p>
      {view.conflicts.length > 0 ? <ConflictTable view={view} faults={refusal?.faults ?? []} /> : null}
      <CarriedTable view={view} />
      <NewEffects view={view} />
      {refusal ? (
        <div className="mt-4">
          <Notice kind="refusal">{refusal.sentence}</Notice>
        </div>
      ) : null}
      <div className="mt-5">
        <Button type="submit" kind="primary" busy={busy} disabled={view.obstacles.length > 0}>
          Carry forward to issue {view.ontoIssue}
        </Button>
      </div>
    </form>
  );
}

type Answer = Awaited<ReturnType<typeof carryForwardAction>>;

function useSettlement(view: SettlementView, proposalPath: string) {
  const router = useRouter();
  const [key] = useState(() => crypto.randomUUID());
  const [busy, start] = useTransition();
  const [refusal, setRefusal] = useState<Extract<Answer, { ok: false }> | null>(null);

  const submit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    start(async () => {
      const answer = await carryForwardAction({
        proposalId: view.proposalId,
        lockVersion: view.lockVersion,
        ontoIssue: view.ontoIssue,
        key,
        settled: view.conflicts.map(({ kind, number, field }, at) => ({
          kind,
          number,
          field,
          choice: choiceOf(form.get(`choice-${at}`)),
          why: String(form.get(`why-${at}`) ?? ""),
        })),
      });
      if (answer.ok) return router.push(proposalPath as Route);
      setRefusal(answer);
      if (answer.code === "moved" || answer.code === "overtaken") router.refresh();
    });
  };

  return { submit, busy, refusal };
}

function choiceOf(value: FormDataEntryValue | null): Choice {
  return value === "base" || value === "theirs" ? value : "yours";
}

interface ConflictTableProps {
  view: SettlementView;
  faults: readonly { path: string; sentence: string }[];
}

function ConflictTable({ view, faults }: ConflictTableProps) {
  const faultAt = (path: string) => faults.find((fault) => fault.path === path)?.sentence;

  return (
    <Table caption="Fields to settle" narrow="stack">
      <TableHead>
        <Head>Field</Head>
        <Head>Issue {view.baseIssue}</Head>
        <Head>Issue {view.ontoIssue}</Head>
        <Head>Yours</Head>
        <Head>Settled</Head>
        <Head>Why</Head>
      </TableHead>
      <tbody>
        {view.conflicts.map((row, at) => (
          <Row key={rowKey(row)}>
            <RowHead label="Field" className="change-bar">
              {row.number} {row.label}
            </RowHead>
            <Cell label={`Issue ${view.baseIssue}`}>{row.base ?? "–"}</Cell>
            <Cell label={`Issue ${view.ontoIssue}`}>{row.theirs ?? "–"}</Cell>
            <Cell label="Yours">{row.yours ?? "–"}</Cell>
            <Cell label="Settled">
              <ChoiceField
                name={`choice-${at}`}
                label={<span className="sr-only">Which value of {row.label} holds</span>}
                defaultValue="yours"
                choices={[
                  { value: "yours", label: "yours" },
                  { value: "theirs", label: `issue ${view.ontoIssue}` },
                  { value: "base", label: `issue ${view.baseIssue}` },
                ]}
                error={faultAt(`settled.${at}.choice`)}
              />
            </Cell>
            <Cell label="Why">
              <TextField
                name={`why-${at}`}
                label={<span className="sr-only">Why, {row.label}</span>}
                maxLength={500}
                required
                error={faultAt(`settled.${at}.why`)}
              />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function CarriedTable({ view }: { view: SettlementView }) {
  if (view.carried.length === 0) return null;

  return (
    <>
      <SectionHeading>Carries by itself</SectionHeading>
      <Table caption="Fields that carry by themselves" narrow="stack">
        <TableHead>
          <Head>Field</Head>
          <Head>Issue {view.baseIssue}</Head>
          <Head>Holds</Head>
          <Head>From</Head>
        </TableHead>
        <tbody>
          {view.carried.map((row) => (
            <Row key={rowKey(row)}>
              <RowHead label="Field">
                {row.number} {row.label}
              </RowHead>
              <Cell label={`Issue ${view.baseIssue}`}>{row.base ?? "–"}</Cell>
              <Cell label="Holds">{(row.side === "yours" ? row.yours : row.theirs) ?? "–"}</Cell>
              <Cell label="From">{row.side === "yours" ? "yours" : `issue ${view.ontoIssue}`}</Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </>
  );
}

function NewEffects({ view }: { view: SettlementView }) {
  return (
    <>
      <SectionHeading>Effect on issue {view.ontoIssue}</SectionHeading>
      <ul className="border-t border-ink">
        {view.predictedDelta.map(({ operatingPoint, delta, standingNow }) => (
          <li key={operatingPoint} className="border-b border-rule py-1.5">
            {operatingPoint}: predicted {formatNewtonsChange(delta)}, {STANDING_NAMES[standingNow]}
          </li>
        ))}
      </ul>
    </>
  );
}

function rowKey({ kind, number, field }: SettlementRow): string {
  return `${kind} ${number} ${field}`;
}
