"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { Notice } from "@/app/_components/notice";
import { TextArea } from "@/app/_components/text-area";
import { TextField } from "@/app/_components/text-field";

import { makeBaselineAction } from "../actions";

interface MakeBaselineProps {
  productCode: string;
  /** Numbers of all issues, oldest first. */
  numbers: readonly number[];
}

/** Gives an issue a name and a purpose, signed with the password. */
export function MakeBaseline({ productCode, numbers }: MakeBaselineProps) {
  const newestFirst = numbers.toReversed();

  return (
    <ConfirmDialog
      trigger="Sign a baseline…"
      title={`Sign a baseline of ${productCode}`}
      confirm="Sign"
      onConfirm={(form) =>
        makeBaselineAction({
          productCode,
          issue: Number(form.get("issue") ?? 0),
          name: String(form.get("name") ?? ""),
          purpose: String(form.get("purpose") ?? ""),
          password: String(form.get("password") ?? ""),
        })
      }
    >
      {(faultOf) => (
        <>
          <p>A baseline names an issue that is there already. It changes no value and makes no issue of its own.</p>
          <ChoiceField
            name="issue"
            label="Issue"
            choices={newestFirst.map((number) => ({ value: String(number), label: `Issue ${number}` }))}
            error={faultOf("issue")}
          />
          <TextField
            name="name"
            label="Name"
            hint="For example Preliminary design. Each name is given once."
            maxLength={120}
            autoComplete="off"
            error={faultOf("name")}
            required
          />
          <TextArea name="purpose" label="Purpose" rows={3} maxLength={500} error={faultOf("purpose")} required />
          <TextField
            name="password"
            type="password"
            label="Your password"
            autoComplete="current-password"
            error={faultOf("password")}
            required
          />
          <Notice>Your name, the time in UTC and the hash of the issue’s content are kept with the signature.</Notice>
        </>
      )}
    </ConfirmDialog>
  );
}
