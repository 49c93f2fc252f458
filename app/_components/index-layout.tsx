import type { ReactNode } from "react";

interface IndexLayoutProps {
  index: ReactNode;
  children: ReactNode;
}

/** A sheet index at the left, the sheets beside it; one above the other on a narrow screen. */
export function IndexLayout({ index, children }: IndexLayoutProps) {
  return (
    <div className="mx-auto grid max-w-[92rem] grid-cols-[minmax(0,1fr)] gap-5 lg:grid-cols-[11.75rem_minmax(0,1fr)] lg:gap-7 print:block">
      <div className="lg:sticky lg:top-6 lg:self-start print:hidden">{index}</div>
      <div className="min-w-0">{children}</div>
    </div>
  );
}
