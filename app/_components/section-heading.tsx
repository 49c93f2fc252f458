import type { ReactNode } from "react";

interface SectionHeadingProps {
  children: ReactNode;
  id?: string;
  /** Said in small at the right: what kind of change, how many. */
  aside?: ReactNode;
}

/** Heading of a part of a sheet. */
export function SectionHeading({ children, id, aside }: SectionHeadingProps) {
  return (
    <div className="mt-7 mb-1.5 flex flex-wrap items-baseline gap-x-4 first:mt-0">
      <h2 id={id} className="text-lg">
        {children}
      </h2>
      {aside ? <p className="ml-auto text-sm text-ink-2">{aside}</p> : null}
    </div>
  );
}
