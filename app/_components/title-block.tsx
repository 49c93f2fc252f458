import type { ReactNode } from "react";

export interface TitleBlockField {
  label: string;
  value: ReactNode;
}

/** Title block of a sheet: how its reader knows what they hold. Fields are read in rows of three. */
export function TitleBlock({ fields }: { fields: readonly TitleBlockField[] }) {
  const blanks = (3 - (fields.length % 3)) % 3;

  return (
    <dl className="ml-auto grid w-full grid-cols-2 border-t border-ink text-sm sm:w-auto sm:max-w-[36rem] sm:grid-cols-[2fr_1fr_1fr] sm:border-l lg:w-[34rem] print:w-[34rem] print:grid-cols-[2fr_1fr_1fr] print:border">
      {fields.map(({ label, value }) => (
        <div key={label} className="-mr-px -mb-px min-w-0 border-r border-b border-rule-strong px-2.5 pt-1 pb-1.5">
          <dt className="text-2xs text-ink-2">{label}</dt>
          <dd className="break-words">{value}</dd>
        </div>
      ))}
      {Array.from({ length: blanks }, (_, at) => (
        <div key={at} aria-hidden className="-mr-px -mb-px hidden border-r border-b border-rule-strong sm:block" />
      ))}
    </dl>
  );
}
