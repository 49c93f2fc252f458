"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";

import { Button } from "@/app/_components/button";
import { CheckField } from "@/app/_components/check-field";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import { useActionForm } from "@/app/_components/use-action-form";
import { CreateAccountInput } from "@/lib/products/schema";

import { createAccountAction } from "../actions";

export function NewAccountForm() {
  const router = useRouter();
  const [made, setMade] = useState<string | null>(null);
  const form = useActionForm({
    schema: CreateAccountInput,
    action: createAccountAction,
    defaults: { email: "", name: "", password: "", isAdministrator: false },
    onDone: () => {
      setMade(form.watch("name"));
      form.reset();
      router.refresh();
    },
  });

  return (
    <form noValidate onSubmit={form.submit} className="grid max-w-3xl gap-4 sm:grid-cols-2">
      <TextField
        label="E-mail"
        type="email"
        autoComplete="off"
        error={form.errorAt("email")}
        {...form.register("email")}
      />
      <TextField
        label="Name"
        hint="As it is printed on signatures."
        autoComplete="off"
        error={form.errorAt("name")}
        {...form.register("name")}
      />
      <TextField
        label="First password"
        hint="At least 12 characters. Its owner changes it on the account sheet."
        type="password"
        autoComplete="new-password"
        error={form.errorAt("password")}
        {...form.register("password")}
      />
      <div className="sm:pt-6">
        <CheckField
          label="Administrator of the installation"
          hint="Makes accounts and products, gives roles; signs nothing by it."
          {...form.register("isAdministrator")}
        />
      </div>
      <div className="space-y-3 sm:col-span-2">
        {form.refusal ? <Notice kind="refusal">{form.refusal}</Notice> : null}
        {made ? <Notice kind="done">The account of {made} is made. Hand over the password yourself.</Notice> : null}
        <Button type="submit" kind="primary" busy={form.busy}>
          Make the account
        </Button>
      </div>
    </form>
  );
}
