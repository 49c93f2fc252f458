import { dayText } from "@/app/_components/utc-text";

import { evidenceAge } from "@/app/(workspace)/products/[productCode]/_sheet/evidence-age";

interface AgeTextProps {
  /** Date of the source. */
  date: string;
  /** Days after which evidence counts as old, by the terms. */
  ageDays: number;
  now: Date;
}

/** The date of a document and its age on the day it is read. */
export function AgeText({ date, ageDays, now }: AgeTextProps) {
  const age = evidenceAge(date, now);

  return (
    <>
      {dayText(date)}
      <span className="block text-xs text-ink-2">
        {age} {age === 1 ? "day" : "days"} old today
      </span>
      {age > ageDays ? <span className="block text-xs text-ink-2">▲ counts as old after {ageDays} days</span> : null}
    </>
  );
}
