"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";

import type { ActionResult } from "@/app/_server/action-result";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { SectionHeading } from "@/app/_components/section-heading";
import { TextField } from "@/app/_components/text-field";
import type { ProductKind } from "@/lib/vocabulary/lines";

import { establishAction } from "../actions";
import { type EstablishFaults, fieldOfFault, readEstablishment } from "./establish-input";
import { type EstablishField, type EstablishValues, newEstablishValues } from "./establish-values";
import { LimitFields } from "./limit-fields";
import { PointFields } from "./point-fields";
import { TermsFields } from "./terms-fields";

interface EstablishFormProps {
  product: { code: string; kind: ProductKind; timeZone: string };
}

/** The first issue of a budget, signed by a program manager. */
export function EstablishForm({ product }: EstablishFormProps) {
  const router = useRouter();
  const { values, faults, change, submit } = useEstablishment(product);
  const fields = { values, faults, change };

  return (
    <div className="max-w-4xl">
      <SectionHeading>Reference operating point</SectionHeading>
      <PointFields {...fields} />
      <SectionHeading>Limit and reserve</SectionHeading>
      <LimitFields {...fields} />
      <SectionHeading>Terms</SectionHeading>
      <TermsFields {...fields} kind={product.kind} />
      <div className="mt-7">
        <ConfirmDialog
          trigger="Sign and establish…"
          triggerKind="primary"
          title={`Establish ${product.code}`}
          confirm="Sign"
          onConfirm={(form) => submit(String(form.get("password") ?? ""))}
          onDone={() => router.push(`/products/${product.code}/budget`)}
        >
          <p>
            Your signature makes issue 1: this operating point with its limit, these terms, an allocations sheet without
            rows and the finishes of the catalogue. It is the one act without a second person; everything after it comes
            by proposals.
          </p>
          <TextField label="Your password" name="password" type="password" autoComplete="current-password" required />
        </ConfirmDialog>
      </div>
    </div>
  );
}

function useEstablishment(product: EstablishFormProps["product"]) {
  const [values, setValues] = useState(newEstablishValues);
  const [faults, setFaults] = useState<EstablishFaults>({});

  function change(field: EstablishField, text: string) {
    setValues((before) => changed(before, field, text));
    setFaults((before) => ({ ...before, [field]: undefined }));
  }

  async function submit(password: string): Promise<ActionResult<unknown>> {
    const read = readEstablishment(values, product);
    setFaults(read.faults);
    if (Object.keys(read.faults).length > 0) {
      return {
        ok: false,
        code: "invalid",
        sentence: "Some fields need another look: close this and see them.",
        faults: [],
      };
    }
    const answer = await establishAction({ ...read.input, password });
    if (!answer.ok) setFaults(faultsOnForm(answer.faults));
    return answer;
  }

  return { values, faults, change, submit };
}

function changed(values: EstablishValues, field: EstablishField, text: string): EstablishValues {
  if (!field.startsWith("growth.")) return { ...values, [field]: text };
  return { ...values, growth: { ...values.growth, [field.slice("growth.".length)]: text } };
}

function faultsOnForm(faults: readonly { path: string; sentence: string }[]): EstablishFaults {
  return Object.fromEntries(
    faults.flatMap(({ path, sentence }) => {
      const field = fieldOfFault(path);
      return field === null ? [] : [[field, sentence]];
    }),
  );
}
