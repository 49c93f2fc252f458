"use client";

import type { Route } from "next";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { type MouseEvent, useState } from "react";

import { keepPreferencesAction } from "@/app/(workspace)/account/actions";
import { answerOf } from "@/app/_components/answer-of";
import { Notice } from "@/app/_components/notice";
import type { Measure } from "@/lib/vocabulary/measures";

interface MeasureSwitchProps {
  chosen: Measure;
  choices: readonly { measure: Measure; label: string; unit: string; href: string }[];
}

/** Each measure is an address; choosing one here keeps it for the person too. */
export function MeasureSwitch({ chosen, choices }: MeasureSwitchProps) {
  const router = useRouter();
  const [refusal, setRefusal] = useState<string | null>(null);

  async function choose(event: MouseEvent, measure: Measure, href: string) {
    // Another tab or window only reads: it keeps nothing.
    if (event.metaKey || event.ctrlKey || event.shiftKey || event.altKey) return;
    event.preventDefault();
    const kept = await answerOf(keepPreferencesAction({ measure }));
    setRefusal(kept.ok ? null : kept.sentence);
    router.push(href as Route, { scroll: false });
  }

  return (
    <>
      <nav aria-label="Measure" className="flex flex-wrap items-baseline gap-x-4 text-sm print:hidden">
        <span className="text-ink-2">Read in</span>
        {choices.map(({ measure, label, unit, href }) => (
          <Link
            key={measure}
            href={href as Route}
            scroll={false}
            prefetch={false}
            aria-current={measure === chosen ? "true" : undefined}
            className="border-b-2 border-transparent py-1 hover:border-b-rule-strong aria-[current=true]:border-b-ink aria-[current=true]:font-semibold"
            onClick={(event) => void choose(event, measure, href)}
          >
            {label}
            {unit ? <span className="font-normal text-ink-2"> {unit}</span> : null}
          </Link>
        ))}
      </nav>
      {refusal ? <Notice kind="refusal">{refusal}</Notice> : null}
    </>
  );
}
