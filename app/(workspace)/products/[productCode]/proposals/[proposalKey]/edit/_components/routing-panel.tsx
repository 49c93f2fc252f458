"use client";

import type { ProposalPreview } from "@/lib/proposals/review/preview-proposal";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";

/** Who will have to sign, and why, as the draft stands. */
export function RoutingPanel({ preview }: { preview: ProposalPreview }) {
  return (
    <section aria-labelledby="routing" className="mt-6">
      <h2 id="routing" className="text-lg">
        Who must sign
      </h2>
      <dl className="mt-1 border-t border-ink">
        {preview.routing.map(({ capacity, reasons, signedBySubmitting }) => (
          <div key={capacity} className="border-b border-rule py-1.5">
            <dt className="font-medium">{ROLE_NAMES[capacity]}</dt>
            {reasons.map(({ sentence }) => (
              <dd key={sentence} className="text-sm text-ink-2">
                {sentence}
              </dd>
            ))}
            {signedBySubmitting ? <dd className="text-sm">You sign it by submitting, with your password.</dd> : null}
          </div>
        ))}
      </dl>
    </section>
  );
}
