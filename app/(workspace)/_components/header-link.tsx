"use client";

import type { Route } from "next";
import Link from "next/link";
import { usePathname } from "next/navigation";
import type { ReactNode } from "react";

import { PendingMark } from "@/app/_components/pending-mark";

interface HeaderLinkProps {
  href: Route;
  /** Only this very page counts as being there, not the pages below it. */
  exact?: boolean;
  children: ReactNode;
}

export function HeaderLink({ href, exact = false, children }: HeaderLinkProps) {
  const pathname = usePathname();
  const here = exact ? pathname === href : pathname === href || pathname.startsWith(`${href}/`);

  return (
    <Link
      href={href}
      // Opening the day sheet is noted as a visit: fetching it ahead would be one too.
      prefetch={false}
      aria-current={here ? "page" : undefined}
      className="py-1 text-ink-2 hover:text-ink hover:underline aria-[current=page]:text-ink aria-[current=page]:underline aria-[current=page]:decoration-2 aria-[current=page]:underline-offset-6"
    >
      {children}
      <PendingMark />
    </Link>
  );
}
