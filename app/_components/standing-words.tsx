import type { ReactNode } from "react";

import type { Standing } from "@/lib/vocabulary/standing";

const OPENINGS: Record<Standing, string> = {
  inside: "Inside by",
  into_the_reserve: "Into the reserve by",
  over: "Over the limit by",
};

interface StandingWordsProps {
  standing: Standing;
  /** The printed distance with its unit: clear of the reserve, into it, or beyond the limit. Never negative. */
  amount: string;
  /** The rest in small: to the limit, per cent of what, reserve. */
  children?: ReactNode;
}

/** The standing of a sheet in one sentence. Only "over" has a colour, and says so in words too. */
export function StandingWords({ standing, amount, children }: StandingWordsProps) {
  return (
    <p className="mb-1 flex flex-wrap items-baseline gap-x-3 gap-y-0.5">
      <strong className={`text-xl font-semibold ${standing === "over" ? "text-signal" : ""}`}>
        {OPENINGS[standing]} {amount}
      </strong>
      {children ? <span className="text-sm text-ink-2">{children}</span> : null}
    </p>
  );
}
