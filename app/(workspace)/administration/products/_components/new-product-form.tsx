"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";

import { Button } from "@/app/_components/button";
import { ChoiceField } from "@/app/_components/choice-field";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import { useActionForm } from "@/app/_components/use-action-form";
import { CreateProductInput } from "@/lib/products/schema";
import { PRODUCT_KIND_NAMES, PRODUCT_KINDS } from "@/lib/vocabulary/lines";

import { createProductAction } from "../actions";

const KINDS = PRODUCT_KINDS.map((kind) => ({ value: kind, label: PRODUCT_KIND_NAMES[kind] }));

export function NewProductForm({ timeZones }: { timeZones: readonly string[] }) {
  const router = useRouter();
  const [made, setMade] = useState<string | null>(null);
  const form = useActionForm({
    schema: CreateProductInput,
    action: createProductAction,
    defaults: { code: "", name: "", kind: PRODUCT_KINDS[0], timeZone: "UTC" },
    onDone: () => {
      setMade(form.watch("code"));
      form.reset();
      router.refresh();
    },
  });

  return (
    <form noValidate onSubmit={form.submit} className="grid max-w-3xl gap-4 sm:grid-cols-2">
      <TextField
        label="Code"
        hint="2 to 12 capital letters, digits and hyphens, for example TF-2. It stays for good."
        autoComplete="off"
        error={form.errorAt("code")}
        {...form.register("code")}
      />
      <TextField label="Name" autoComplete="off" error={form.errorAt("name")} {...form.register("name")} />
      <ChoiceField label="Kind" choices={KINDS} error={form.errorAt("kind")} {...form.register("kind")} />
      <ChoiceField
        label="Time zone"
        choices={timeZones.map((zone) => ({ value: zone, label: zone.replaceAll("_", " ") }))}
        error={form.errorAt("timeZone")}
        {...form.register("timeZone")}
      />
      <div className="space-y-3 sm:col-span-2">
        {form.refusal ? <Notice kind="refusal">{form.refusal}</Notice> : null}
        {made ? (
          <Notice kind="done">
            {made} is made. Give it a program manager, who establishes it by signing its first issue.
          </Notice>
        ) : null}
        <Button type="submit" kind="primary" busy={form.busy}>
          Make the product
        </Button>
      </div>
    </form>
  );
}
