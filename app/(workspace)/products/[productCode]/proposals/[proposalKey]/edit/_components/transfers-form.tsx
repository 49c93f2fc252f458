"use client";

import { Button } from "@/app/_components/button";
import { ChoiceField } from "@/app/_components/choice-field";
import { Notice } from "@/app/_components/notice";
import type { EditorNames } from "@/app/_components/line-fields/editor-names";
import { NumberInput } from "@/app/_components/line-fields/number-input";
import type { DraftTransfer } from "@/lib/proposals/schema";
import type { FieldFault } from "@/lib/vocabulary/refusal";

interface TransfersFormProps {
  transfers: readonly DraftTransfer[];
  onChange: (transfers: DraftTransfer[]) => void;
  names: EditorNames;
  faults: readonly FieldFault[];
}

/** Moves of allocation, from whom to whom, in the order in which they are applied. */
export function TransfersForm({ transfers, onChange, names, faults }: TransfersFormProps) {
  const holders = [
    { value: "unallocated ", label: "unallocated" },
    ...names.lines
      .filter(({ kind }) => kind === "item" || kind === "group")
      .map(({ kind, number, name }) => ({
        value: `${kind} ${number}`,
        label: kind === "group" ? `group ${number} ${name}` : `${number} ${name}`,
      })),
  ];
  const replace = (at: number, transfer: DraftTransfer) =>
    onChange(transfers.map((old, index) => (index === at ? transfer : old)));
  const faultAt = (path: string) => faults.find((fault) => fault.path === path)?.sentence;
  const whole = faultAt("transfers");

  return (
    <div>
      {transfers.map((transfer, at) => (
        <div key={at} className="mb-3 flex flex-wrap items-end gap-3">
          <div className="min-w-44 grow">
            <ChoiceField
              label="From"
              choices={holders}
              value={textOf(transfer.giver)}
              onChange={(event) => replace(at, { ...transfer, giver: holderOf(event.target.value) })}
              error={faultAt(`transfers.${at}.giver`)}
            />
          </div>
          <div className="min-w-44 grow">
            <ChoiceField
              label="To"
              choices={holders}
              value={textOf(transfer.receiver)}
              onChange={(event) => replace(at, { ...transfer, receiver: holderOf(event.target.value) })}
              error={faultAt(`transfers.${at}.receiver`)}
            />
          </div>
          <NumberInput
            id={`transfer-${at}-hundredths`}
            label="Moves"
            type={{ type: "newtons" }}
            value={transfer.hundredths}
            onChange={(value) => {
              if (typeof value === "number") replace(at, { ...transfer, hundredths: value });
            }}
            error={faultAt(`transfers.${at}.hundredths`) ?? faultAt(`transfers.${at}`)}
          />
          <Button onClick={() => onChange(transfers.filter((_, index) => index !== at))}>Take out</Button>
        </div>
      ))}
      {whole ? (
        <div className="mb-3">
          <Notice kind="refusal">{whole}</Notice>
        </div>
      ) : null}
      <Button onClick={() => onChange([...transfers, firstTransfer(names)])}>Add a transfer</Button>
    </div>
  );
}

function firstTransfer(names: EditorNames): DraftTransfer {
  const item = names.lines.find(({ kind }) => kind === "item");

  return {
    giver: { kind: "unallocated", number: null },
    receiver: item ? { kind: "item", number: item.number } : { kind: "unallocated", number: null },
    hundredths: 100,
  };
}

function textOf({ kind, number }: DraftTransfer["giver"]): string {
  return `${kind} ${number ?? ""}`;
}

function holderOf(text: string): DraftTransfer["giver"] {
  const [kind, number] = text.split(" ");
  if ((kind === "item" || kind === "group") && number) return { kind, number };

  return { kind: "unallocated", number: null };
}
