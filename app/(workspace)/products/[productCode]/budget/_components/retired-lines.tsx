import { RevisionLetter } from "@/app/_components/revision-letter";
import { SectionHeading } from "@/app/_components/section-heading";
import type { SheetData } from "@/lib/budget/sheet-data";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

/** Lines that are no longer in force: their numbers stay theirs. */
export function RetiredLines({ lines }: { lines: SheetData["retired"] }) {
  if (lines.length === 0) return null;

  return (
    <section aria-labelledby="retired" className="mt-7">
      <SectionHeading id="retired" aside="numbers are never used again">
        Retired
      </SectionHeading>
      <ul className="text-table">
        {lines.map((line) => (
          <li key={`${line.kind} ${line.number}`} className="flex items-baseline gap-x-3 border-b border-rule py-1.5">
            <span className="text-ink-2">
              {LINE_KIND_NAMES[line.kind]} {line.number}
            </span>
            <span>{line.name}</span>
            <span className="ml-auto">
              <RevisionLetter letter={line.letter} />
            </span>
            <span className="text-ink-2">in issue {line.issue}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
