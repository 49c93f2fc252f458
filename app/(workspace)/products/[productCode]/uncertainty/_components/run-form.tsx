"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";

import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import { formatExact } from "@/lib/units/format-number";

import { DrawingProgress } from "./drawing-progress";
import { useDrawing } from "./use-drawing";

interface RunFormProps {
  productCode: string;
  issue: number;
  operatingPoint: string;
  /** A seed that was not drawn at this place yet. */
  nextSeed: number;
  mayRun: boolean;
}

const DEFAULT_DRAWS = 100_000;

/** Asks for a run, shows how far it is, and says what became of it. */
export function RunForm({ productCode, issue, operatingPoint, nextSeed, mayRun }: RunFormProps) {
  const router = useRouter();
  const { done, refused, draw, stop } = useDrawing();
  const [asked, setAsked] = useState(DEFAULT_DRAWS);
  const [kept, setKept] = useState<string | null>(null);
  const faultAt = (path: string) => refused?.faults.find((fault) => fault.path === path)?.sentence;

  async function run(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    const [draws, seed] = [wholeNumber(form.get("draws")), wholeNumber(form.get("seed"))];
    setKept(null);
    setAsked(draws ?? DEFAULT_DRAWS);
    const address = `/api/products/${encodeURIComponent(productCode)}/monte-carlo`;
    const value = await draw(address, { issue, operatingPoint, draws, seed });
    if (value === undefined) return;
    setKept(`${formatExact(draws ?? 0)} draws with seed ${seed} are kept with issue ${issue}.`);
    router.refresh();
  }

  if (!mayRun) return <p className="mt-3 text-sm text-ink-2">{READERS}</p>;

  return (
    <form onSubmit={run} noValidate className="mt-4 space-y-3 print:hidden">
      <div className="grid max-w-xl gap-3 sm:grid-cols-[10rem_10rem_auto] sm:items-start">
        <TextField
          label="Draws"
          name="draws"
          inputMode="numeric"
          defaultValue={DEFAULT_DRAWS}
          hint="1000 to 1 000 000"
          error={faultAt("draws")}
        />
        <TextField
          key={nextSeed}
          label="Seed"
          name="seed"
          inputMode="numeric"
          defaultValue={nextSeed}
          hint="The same seed gives the same bytes."
          error={faultAt("seed")}
        />
        <Button type="submit" kind="primary" busy={done !== null} className="justify-self-start sm:mt-6">
          Run Monte Carlo
        </Button>
      </div>
      {done === null ? null : <DrawingProgress done={done} draws={asked} onStop={stop} />}
      <p className="text-sm text-ink-2">
        Draws issue {issue} at {operatingPoint} and keeps what comes out, with your name, in the history. Leaving the
        page stops it.
      </p>
      {refused ? <Notice kind="refusal">{refused.sentence}</Notice> : null}
      {kept ? <Notice kind="done">{kept}</Notice> : null}
    </form>
  );
}

const READERS =
  "A component owner, a reviewer or a program manager of this product asks for runs. Any reader may draw a kept one again.";

/** What was typed, spaces between groups of digits and all; null where it is no number. */
function wholeNumber(typed: FormDataEntryValue | null): number | null {
  const text = typeof typed === "string" ? typed.replaceAll(/\s/g, "") : "";
  return /^\d+$/.test(text) ? Number(text) : null;
}
