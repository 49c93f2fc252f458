import type { Metadata, Viewport } from "next";
import { headers } from "next/headers";
import type { ReactNode } from "react";

import { fontVariables } from "./_fonts/fonts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Leeboard", template: "%s · Leeboard" },
  description: "Drag budgets that are computed, reviewed line by line and signed.",
};

export const viewport: Viewport = { width: "device-width", initialScale: 1 };

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Reading the request makes every page dynamic: a page made ahead of time has no nonce and would never come alive.
  await headers();

  return (
    <html lang="en" className={fontVariables}>
      <body className="min-h-dvh">{children}</body>
    </html>
  );
}
