/** A line's revision letter in its small square; "–" is the first issue. */
export function RevisionLetter({ letter }: { letter: string }) {
  return (
    <span className="inline-block min-w-5 border border-ink-2 px-1 text-center font-code text-xs leading-[1.35] font-medium">
      <span className="sr-only">revision </span>
      {letter}
    </span>
  );
}
