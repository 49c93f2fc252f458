import type { ReactNode } from "react";

interface SheetProps {
  children: ReactNode;
  /** A `TitleBlock`, bottom right; repeated at the foot of every printed page. */
  titleBlock: ReactNode;
  /** Full-width matter between the body and the title block, such as a sign-off table. */
  foot?: ReactNode;
  /** Names the region where a page has several sheets. */
  label?: string;
}

/** The sheet on which a page's matter lies. */
export function Sheet({ children, titleBlock, foot, label }: SheetProps) {
  return (
    <section
      aria-label={label}
      className="sheet-frame border border-t-[3px] border-rule-strong border-t-ink bg-sheet print:border-0 print:border-t-2"
    >
      <div className="sheet-body">
        <div className="px-4 pt-5 pb-7 sm:px-6.5 print:px-0">{children}</div>
        {foot ? <div className="border-t border-ink">{foot}</div> : null}
      </div>
      <div className="sheet-foot">{titleBlock}</div>
    </section>
  );
}
