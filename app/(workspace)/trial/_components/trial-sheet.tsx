"use client";

import { useDeferredValue, useMemo, useState } from "react";

import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import { SectionHeading } from "@/app/_components/section-heading";
import { useHydrated } from "@/app/_components/use-hydrated";

import { readSetting } from "../_trial/read-setting";
import { exampleTrial, SIDES, type Trial } from "../_trial/setting";
import { BothSettingsPictures } from "./both-settings-pictures";
import { ComparisonTable } from "./comparison-table";
import { keepTrial, readTrial } from "./kept-trial";
import { SettingForm } from "./setting-form";
import { SettingResult } from "./setting-result";
import { TurnIntoProposal } from "./turn-into-proposal";

interface TrialSheetProps {
  userId: number;
  /** Where the person may start a proposal. */
  products: readonly { code: string; name: string }[];
}

/** Two settings, what comes out of each, and what lies between them. */
export function TrialSheet(props: TrialSheetProps) {
  // What this tab keeps can only be read in the browser.
  const hydrated = useHydrated();

  return hydrated ? <TwoSettings {...props} /> : <p className="py-10 text-ink-2">Reading the trial…</p>;
}

function TwoSettings({ userId, products }: TrialSheetProps) {
  const { trial, isKept, take } = useTrial(userId);
  const { a, b } = useDeferredValue(trial);
  const readings = { a: useMemo(() => readSetting(a), [a]), b: useMemo(() => readSetting(b), [b]) };

  return (
    <>
      <div className="mb-4 flex flex-wrap gap-2 print:hidden">
        <Button onClick={() => take({ ...trial, b: trial.a })}>Copy A to B</Button>
        <Button onClick={() => take({ a: trial.b, b: trial.a })}>Exchange A and B</Button>
        <Button onClick={() => take(exampleTrial())}>Back to the example</Button>
        <TurnIntoProposal setting={trial.b} isComputed={readings.b.result !== null} products={products} />
      </div>
      {isKept ? null : (
        <div className="mb-4">
          <Notice kind="caution">This tab may keep nothing: a reload would lose what is typed here.</Notice>
        </div>
      )}
      <div className="grid gap-x-10 gap-y-6 lg:grid-cols-2">
        {SIDES.map((side) => (
          <SettingForm
            key={side}
            side={side}
            setting={trial[side]}
            onChange={(setting) => take({ ...trial, [side]: setting })}
            faults={readings[side].faults}
          />
        ))}
      </div>
      <SectionHeading>What comes out</SectionHeading>
      <ComparisonTable a={readings.a} b={readings.b} />
      <BothSettingsPictures a={readings.a.result} b={readings.b.result} />
      <div className="mt-2 grid gap-x-10 lg:grid-cols-2">
        {SIDES.map((side) => (
          <SettingResult key={side} side={side} result={readings[side].result} />
        ))}
      </div>
    </>
  );
}

function useTrial(userId: number) {
  const [trial, setTrial] = useState<Trial>(() => readTrial(userId) ?? exampleTrial());
  const [isKept, setKept] = useState(true);
  const take = (next: Trial) => {
    setTrial(next);
    setKept(keepTrial(userId, next));
  };

  return { trial, isKept, take };
}
