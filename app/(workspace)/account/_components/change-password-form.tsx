"use client";

import { Button } from "@/app/_components/button";
import { loadAnew } from "@/app/_components/load-anew";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import { useActionForm } from "@/app/_components/use-action-form";
import { ChangePasswordInput } from "@/lib/accounts/schema";

import { changePasswordAction } from "../actions";

export function ChangePasswordForm() {
  const form = useActionForm({
    schema: ChangePasswordInput,
    action: changePasswordAction,
    defaults: { current: "", next: "", again: "" },
    // The session ended with the old password.
    onDone: () => loadAnew("/sign-in?to=/account"),
  });

  return (
    <form noValidate onSubmit={form.submit} className="max-w-md space-y-4">
      <TextField
        label="Present password"
        type="password"
        autoComplete="current-password"
        error={form.errorAt("current")}
        {...form.register("current")}
      />
      <TextField
        label="New password"
        hint="At least 12 characters."
        type="password"
        autoComplete="new-password"
        error={form.errorAt("next")}
        {...form.register("next")}
      />
      <TextField
        label="New password again"
        type="password"
        autoComplete="new-password"
        error={form.errorAt("again")}
        {...form.register("again")}
      />
      {form.refusal ? <Notice kind="refusal">{form.refusal}</Notice> : null}
      <Button type="submit" kind="primary" busy={form.busy}>
        Change the password
      </Button>
    </form>
  );
}
