"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";

import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import { RadioField } from "@/app/_components/radio-field";
import { useActionForm } from "@/app/_components/use-action-form";
import { KeepPreferencesInput } from "@/lib/accounts/schema";
import { type Preferences, UNIT_SYSTEM_NAMES, UNIT_SYSTEMS } from "@/lib/vocabulary/measures";

import { keepPreferencesAction } from "../actions";

/** SI or US customary units, for the person who reads. */
export function UnitsForm({ units }: Pick<Preferences, "units">) {
  const router = useRouter();
  const [kept, setKept] = useState(false);
  const form = useActionForm({
    schema: KeepPreferencesInput,
    action: keepPreferencesAction,
    defaults: { units },
    onDone: () => {
      setKept(true);
      router.refresh();
    },
  });

  return (
    <form noValidate onSubmit={form.submit} onChange={() => setKept(false)} className="max-w-md space-y-4">
      <RadioField
        label="I read in"
        choices={UNIT_SYSTEMS.map((value) => ({ value, label: UNIT_SYSTEM_NAMES[value] }))}
        error={form.errorAt("units")}
        {...form.register("units")}
      />
      {form.refusal ? <Notice kind="refusal">{form.refusal}</Notice> : null}
      <div className="flex items-baseline gap-3">
        <Button type="submit" busy={form.busy}>
          Keep these units
        </Button>
        <span role="status" className="text-sm text-ink-2">
          {kept ? "Kept." : ""}
        </span>
      </div>
    </form>
  );
}
