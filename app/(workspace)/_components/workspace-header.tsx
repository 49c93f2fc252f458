import Link from "next/link";

import { LeeboardMark } from "@/app/_components/leeboard-mark";

import { HeaderLink } from "./header-link";
import { SignOutButton } from "./sign-out-button";
import { WaitingCount } from "./waiting-count";

interface WorkspaceHeaderProps {
  name: string;
  showAccounts: boolean;
  showHouseHistory: boolean;
}

/** Head of every page behind the sign-in. */
export function WorkspaceHeader({ name, showAccounts, showHouseHistory }: WorkspaceHeaderProps) {
  return (
    <header className="flex flex-wrap items-baseline gap-x-5 gap-y-1 border-b border-rule-strong px-3 py-3 sm:px-7 print:hidden">
      <Link href="/" prefetch={false} className="mr-1 py-1" aria-label="Leeboard, to the day sheet">
        <LeeboardMark />
      </Link>
      <nav aria-label="Places" className="flex flex-wrap gap-x-5">
        <HeaderLink href="/" exact>
          Day sheet
        </HeaderLink>
        <HeaderLink href="/products">Products</HeaderLink>
        <HeaderLink href="/trial">Trial</HeaderLink>
        {showAccounts ? <HeaderLink href="/administration">Administration</HeaderLink> : null}
        {showHouseHistory && !showAccounts ? (
          <HeaderLink href="/administration/history">House history</HeaderLink>
        ) : null}
      </nav>
      <div className="flex flex-wrap items-baseline gap-x-5 text-ink-2 sm:ml-auto">
        <WaitingCount />
        <HeaderLink href="/account">{name}</HeaderLink>
        <SignOutButton />
      </div>
    </header>
  );
}
