"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import useSWR from "swr";

import { startDraftAction } from "@/app/(workspace)/_drafts/actions";
import { putDraft } from "@/app/(workspace)/_drafts/put-draft";
import type { ActionResult } from "@/app/_server/action-result";
import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { nextNumber } from "@/app/_components/line-fields/editor-names";
import { TextField } from "@/app/_components/text-field";
import type { DraftEdit } from "@/lib/proposals/schema";
import type { FieldFault } from "@/lib/vocabulary/refusal";

import { newItemEdit, revisedItemEdit, TrialTargets } from "../_trial/proposal-edit";
import type { TrialSetting } from "../_trial/setting";

interface TurnIntoProposalProps {
  setting: TrialSetting;
  /** A setting that gives nothing yet is no proposal. */
  isComputed: boolean;
  products: readonly { code: string; name: string }[];
}

const NEW_ITEM = "";

/** Makes a draft of setting B, as a new item or a revision of one, and goes on to its editor. */
export function TurnIntoProposal({ setting, isComputed, products }: TurnIntoProposalProps) {
  const router = useRouter();
  const draftId = useRef<number | null>(null);
  const [key] = useState(() => crypto.randomUUID());
  const [productCode, setProductCode] = useState(products[0]?.code ?? "");
  const [target, setTarget] = useState(NEW_ITEM);
  const { data: targets, error } = useSWR(productCode === "" ? null : targetsAddress(productCode), readTargets);
  if (products.length === 0) {
    return (
      <p className="self-center text-sm text-ink-2">
        To turn a trial into a proposal, be a component owner or a program manager of a product.
      </p>
    );
  }

  return (
    <ConfirmDialog
      trigger="Turn B into a proposal…"
      triggerKind="primary"
      disabled={!isComputed}
      title="Turn B into a proposal"
      confirm="Start the draft"
      confirmDisabled={!targets}
      onConfirm={async (form) => {
        if (!targets) return refused("The items of this product are still being read. Try again.");
        const edit = editOf(form, setting, targets, target);
        const answer = await makeDraft(productCode, String(form.get("title") ?? ""), edit, `${key}-${productCode}`);
        if (answer.ok) draftId.current = answer.value;
        return answer;
      }}
      onDone={() => router.push(`/products/${productCode}/proposals/draft-${draftId.current}/edit` as Route)}
    >
      {(faultOf) => (
        <>
          <ChoiceField
            label="Product"
            value={productCode}
            choices={products.map(({ code, name }) => ({ value: code, label: `${code} ${name}` }))}
            onChange={(event) => {
              setProductCode(event.target.value);
              setTarget(NEW_ITEM);
            }}
          />
          <ChoiceField
            label="Becomes"
            value={target}
            choices={targetChoices(targets)}
            onChange={(event) => setTarget(event.target.value)}
            error={error instanceof Error ? error.message : undefined}
          />
          {targets && target === NEW_ITEM ? <NewItemFields targets={targets} faultOf={faultOf} /> : null}
          <TextField name="title" label="Title" maxLength={120} required autoComplete="off" error={faultOf("title")} />
          <p className="text-sm text-ink-2">
            The draft is yours; evidence, grade and reason are added there. Whoever edits a proposal can’t sign it.
          </p>
        </>
      )}
    </ConfirmDialog>
  );
}

interface NewItemFieldsProps {
  targets: TrialTargets;
  faultOf: (path: string) => string | undefined;
}

function NewItemFields({ targets, faultOf }: NewItemFieldsProps) {
  const number = nextNumber("item", targets.taken);

  return (
    <>
      <TextField
        key={number}
        name="number"
        label="Number"
        hint="Unique in the product, never used again."
        defaultValue={number}
        maxLength={12}
        required
        error={faultOf("edits.0.number") ?? faultOf("content.edits.0.number")}
      />
      <TextField name="name" label="Name of the item" maxLength={120} required autoComplete="off" />
    </>
  );
}

function targetChoices(targets: TrialTargets | undefined) {
  const items = targets?.items ?? [];
  return [
    { value: NEW_ITEM, label: "a new item" },
    ...items.map(({ number, name }) => ({ value: number, label: `a revision of ${number} ${name}` })),
  ];
}

function editOf(form: FormData, setting: TrialSetting, targets: TrialTargets, target: string): DraftEdit {
  const item = targets.items.find(({ number }) => number === target);
  if (item) return revisedItemEdit(setting, item, targets);

  const number = String(form.get("number") ?? "").trim();
  return newItemEdit(setting, { number: number.toUpperCase(), name: String(form.get("name") ?? "").trim() }, targets);
}

/** Two acts on one key: tried again after a refusal, the second goes on with the draft of the first. */
async function makeDraft(
  productCode: string,
  title: string,
  edit: DraftEdit,
  key: string,
): Promise<ActionResult<number>> {
  const started = await startDraftAction({ productCode, title, key });
  if (!started.ok) return started;

  const { proposalId } = started.value;
  const content = { title, reason: "", neededBy: null, edits: [edit], transfers: [] };
  const saved = await putDraft({ productCode, proposalId, lockVersion: 0, content });
  if (saved.state === "failed") return refused(saved.sentence, saved.faults);
  // Tried again on one key after its answer was lost: the draft is there, and its editor shows what it holds.
  return { ok: true, value: proposalId };
}

function refused(sentence: string, faults: readonly FieldFault[] = []): ActionResult<never> {
  return { ok: false, code: "wrong_state", sentence, faults };
}

function targetsAddress(productCode: string): string {
  return `/api/products/${productCode}/trial-targets`;
}

async function readTargets(address: string): Promise<TrialTargets> {
  const answer = await fetch(address);
  if (!answer.ok) throw new Error("The items of this product could not be read. Try again.");
  return TrialTargets.parse(await answer.json());
}
