"use client";

import { useState } from "react";

import { Button } from "@/app/_components/button";
import { ChoiceField } from "@/app/_components/choice-field";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import type { MethodName } from "@/lib/evaluation/methods/method-name";
import { METHOD_VERSIONS, METHODS_WITH_VERSIONS, type MethodVersion } from "@/lib/evaluation/methods/method-versions";
import { type AdoptedVersion, adoptVersion } from "@/lib/proposals/drafting/adopt-version";
import { type DraftEdit, MAX_EDITS } from "@/lib/proposals/schema";

interface AdoptVersionFormProps {
  state: BudgetState;
  edits: readonly DraftEdit[];
  me: { userId: number; isProgramManager: boolean };
  onAdopt: (edits: DraftEdit[]) => void;
}

/** Takes all items of a method over to another of its published versions; nothing is offered that nobody has. */
export function AdoptVersionForm({ state, edits, me, onAdopt }: AdoptVersionFormProps) {
  const offers = offersOf(state, edits, me);
  const [chosen, setChosen] = useState("");
  const offer = offers.find(({ key }) => key === chosen) ?? offers[0];
  if (!offer) return null;
  const { method, published, adopted } = offer;

  return (
    <section aria-labelledby="adopt-version" className="mt-4 border-t border-rule pt-3">
      <h3 id="adopt-version" className="text-base font-semibold">
        Adopt a version of a method
      </h3>
      <div className="mt-2 flex flex-wrap items-end gap-x-3 gap-y-2">
        <div className="min-w-56 grow sm:max-w-md">
          <ChoiceField
            label="Method and version"
            value={offer.key}
            onChange={(event) => setChosen(event.target.value)}
            choices={offers.map(({ key, method: of, published: { version } }) => ({
              value: key,
              label: `${ITEM_METHODS[of].label}, version ${version}`,
            }))}
          />
        </div>
        <Button onClick={() => onAdopt(adopted.edits)}>
          Adopt it for {adopted.items.length === 1 ? "1 item" : `${adopted.items.length} items`}
        </Button>
      </div>
      <p className="mt-2 text-sm">
        {published.what} <span className="text-ink-2">{published.source}</span>
      </p>
      <p className="mt-1 text-sm text-ink-2">
        {ITEM_METHODS[method].label}: {adopted.items.join(", ")}.
        {adopted.left.length > 0
          ? ` One proposal holds ${MAX_EDITS} lines: ${adopted.left.join(", ")} stay for the next one.`
          : ""}
        {me.isProgramManager ? "" : " Items of other owners stay as they are: a program manager can take all over."}
      </p>
    </section>
  );
}

interface Offer {
  key: string;
  method: MethodName;
  published: MethodVersion;
  adopted: AdoptedVersion;
}

/** The newest first, so that what is offered at once is what was published last. */
function offersOf(state: BudgetState, edits: readonly DraftEdit[], me: AdoptVersionFormProps["me"]): Offer[] {
  const mayEdit = ({ body }: { body: { ownerId: number } }) => me.isProgramManager || body.ownerId === me.userId;
  return METHODS_WITH_VERSIONS.flatMap((method) =>
    METHOD_VERSIONS[method].toReversed().flatMap((published) => {
      const { version } = published;
      const adopted = adoptVersion(state, edits, { method, version, mayEdit });
      // What every item stands at already is nothing to adopt, whatever this draft does to it.
      const isNew = adoptVersion(state, [], { method, version, mayEdit }).items.length > 0;
      return adopted.items.length === 0 || !isNew ? [] : [{ key: `${method} ${version}`, method, published, adopted }];
    }),
  );
}
