"use client";

import { useRouter } from "next/navigation";

import { Button } from "@/app/_components/button";
import { ChoiceField } from "@/app/_components/choice-field";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import { useActionForm } from "@/app/_components/use-action-form";
import { GiveRoleInput } from "@/lib/products/schema";
import { ROLE_NAMES, ROLES } from "@/lib/vocabulary/roles";

import { giveRoleAction } from "../actions";

const ROLE_CHOICES = ROLES.map((role) => ({ value: role, label: ROLE_NAMES[role] }));

interface GiveRoleFormProps {
  productCode: string;
  people: readonly { id: number; name: string }[];
}

export function GiveRoleForm({ productCode, people }: GiveRoleFormProps) {
  const router = useRouter();
  const form = useActionForm({
    schema: GiveRoleInput,
    action: giveRoleAction,
    defaults: { productCode, userId: people[0]?.id, role: ROLES[0], reason: "" },
    onDone: () => {
      form.reset();
      router.refresh();
    },
  });

  return (
    <form noValidate onSubmit={form.submit} className="grid max-w-3xl gap-4 sm:grid-cols-2">
      <ChoiceField
        label="Person"
        choices={people.map(({ id, name }) => ({ value: String(id), label: name }))}
        error={form.errorAt("userId")}
        {...form.register("userId", { valueAsNumber: true })}
      />
      <ChoiceField label="Role" choices={ROLE_CHOICES} error={form.errorAt("role")} {...form.register("role")} />
      <div className="sm:col-span-2">
        <TextField label="Reason" optional error={form.errorAt("reason")} {...form.register("reason")} />
      </div>
      <div className="space-y-3 sm:col-span-2">
        {form.refusal ? <Notice kind="refusal">{form.refusal}</Notice> : null}
        <Button type="submit" kind="primary" busy={form.busy}>
          Give the role
        </Button>
      </div>
    </form>
  );
}
