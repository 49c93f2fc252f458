import type { ReactNode } from "react";

interface PageHeadingProps {
  title: string;
  /** What is looked at, in one line: product, issue, operating point. */
  subtitle?: ReactNode;
  /** Buttons and links at the right. */
  actions?: ReactNode;
}

export function PageHeading({ title, subtitle, actions }: PageHeadingProps) {
  return (
    <header className="mb-5 flex flex-wrap items-end gap-x-6 gap-y-3">
      <div className="min-w-0">
        <h1 className="text-xl tracking-[-0.018em] break-words sm:text-2xl">{title}</h1>
        {subtitle ? <p className="mt-1 text-ink-2">{subtitle}</p> : null}
      </div>
      {actions ? <div className="ml-auto flex flex-wrap gap-2 print:hidden">{actions}</div> : null}
    </header>
  );
}
