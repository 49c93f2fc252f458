import Link from "next/link";
import type { Route } from "next";

import { UtcTime } from "@/app/_components/utc-time";
import type { MovedView } from "@/lib/proposals/sheet-views";

import { ComparedLines } from "./compared-text";

interface MovedNoticeProps {
  moved: MovedView;
  /** Whether only what moved is shown now. */
  only: boolean;
  /** Address of the sheet, without a query. */
  sheet: string;
}

/** What moved on the sheet since its reader last looked, and the way to see only that. */
export function MovedNotice({ moved, only, sheet }: MovedNoticeProps) {
  const { since, fields, sentences, reason, signingText } = moved;
  if (fields.length + sentences.length === 0 && !reason && !signingText) {
    return (
      <p className="mb-3 text-sm text-ink-2 print:hidden">
        Nothing moved since you last looked, <UtcTime at={since} />.
      </p>
    );
  }

  return (
    <section aria-label="Moved since my last look" className="mb-4 border-l-4 border-ink px-3 py-2 print:hidden">
      <p>
        <strong className="font-semibold">Moved since you last looked</strong>, <UtcTime at={since} />:{" "}
        {fields.length === 0 ? "no field" : fields.length === 1 ? "one field" : `${fields.length} fields`}.{" "}
        {fields.length === 0 && !only ? null : (
          <Link className="link" scroll={false} href={(only ? sheet : `${sheet}?only=moved`) as Route}>
            {only ? "Show every field" : "Show only what moved"}
          </Link>
        )}
      </p>
      {sentences.map((sentence) => (
        <p key={sentence} className="text-sm text-ink-2">
          {sentence}
        </p>
      ))}
      {reason ? <ComparedLines compared={reason} title="The reason, line by line" /> : null}
      {signingText ? <ComparedLines compared={signingText} title="The text to be signed, line by line" /> : null}
    </section>
  );
}

/** The mark of a field that moved, in words, with what it said then. */
export function MovedMark({ saw }: { saw: string | null }) {
  return (
    <span className="mt-0.5 block text-xs font-normal text-ink-2">
      <span aria-hidden>◆ </span>
      moved since you last looked; it {saw ? `was ${saw}` : "was empty"}
    </span>
  );
}
