import Link from "next/link";
import type { Route } from "next";

import { SectionHeading } from "@/app/_components/section-heading";
import type { DraftView } from "@/lib/proposals/workspace-views";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

interface TouchedElsewhereProps {
  lines: DraftView["touchedElsewhere"];
  productCode: string;
}

/** Warns that drafts and open proposals of others touch the same lines: whoever is approved first overtakes the other. */
export function TouchedElsewhere({ lines, productCode }: TouchedElsewhereProps) {
  if (lines.length === 0) return null;

  return (
    <section className="mt-4" aria-label="Touched elsewhere">
      <SectionHeading>Touched elsewhere</SectionHeading>
      <ul className="border-t border-ink text-sm">
        {lines.map(({ line, by, number }, at) => (
          <li key={at} className="border-b border-rule py-1.5">
            {LINE_KIND_NAMES[line.kind]} {line.number} {line.name}:{" "}
            {number === null || by === null ? (
              "a draft of somebody touches it too"
            ) : (
              <>
                proposal{" "}
                <Link className="link" href={`/products/${productCode}/proposals/${number}` as Route}>
                  {number}
                </Link>{" "}
                of {by.name} touches it too
              </>
            )}
          </li>
        ))}
      </ul>
      <p className="mt-1 text-sm text-ink-2">Whichever is approved first, the other has to be carried forward.</p>
    </section>
  );
}
