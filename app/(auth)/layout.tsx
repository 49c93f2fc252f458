import type { ReactNode } from "react";

import { LeeboardMark } from "@/app/_components/leeboard-mark";

export default function AuthLayout({ children }: { children: ReactNode }) {
  return (
    <>
      <header className="border-b border-rule-strong px-4 py-3.5 sm:px-7">
        <LeeboardMark />
      </header>
      <main className="mx-auto max-w-xl px-4 py-8 sm:py-14">{children}</main>
    </>
  );
}
