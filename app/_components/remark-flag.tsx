import type { ReactNode } from "react";

/** Small square flag of a numbered remark: "R1". */
export function RemarkFlag({ children }: { children: ReactNode }) {
  return (
    <span className="inline-grid h-[18px] min-w-[18px] place-items-center border-[1.3px] border-ink px-[3px] text-2xs font-semibold">
      {children}
    </span>
  );
}
