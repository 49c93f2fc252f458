"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextField } from "@/app/_components/text-field";
import type { PersonName } from "@/lib/budget/views";

import { nameDeputyAction } from "../actions";

interface NameDeputyProps {
  productCode: string;
  /** Who takes part here, other than the reader. */
  candidates: readonly PersonName[];
  today: string;
}

/** Names who signs for the reader on a range of days. */
export function NameDeputy({ productCode, candidates, today }: NameDeputyProps) {
  return (
    <ConfirmDialog
      trigger="Name a deputy…"
      title="Name a deputy"
      confirm="Name"
      onConfirm={(form) =>
        nameDeputyAction({
          productCode,
          deputyId: Number(form.get("deputyId") ?? 0),
          fromDay: String(form.get("fromDay") ?? ""),
          untilDay: String(form.get("untilDay") ?? ""),
        })
      }
    >
      {(faultOf) => (
        <>
          <p>
            On these days your deputy signs for you in this product, and both names stand on the signature. They can’t
            sign for you where you are barred, or where they are, and can’t pass it on.
          </p>
          <ChoiceField
            name="deputyId"
            label="Deputy"
            choices={candidates.map(({ id, name }) => ({ value: String(id), label: name }))}
            error={faultOf("deputyId")}
          />
          <div className="grid gap-4 sm:grid-cols-2">
            <TextField
              name="fromDay"
              type="date"
              label="First day"
              defaultValue={today}
              error={faultOf("fromDay")}
              required
            />
            <TextField name="untilDay" type="date" label="Last day" min={today} error={faultOf("untilDay")} required />
          </div>
        </>
      )}
    </ConfirmDialog>
  );
}
