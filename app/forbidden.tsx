import type { Metadata } from "next";
import Link from "next/link";

import { MessageSheet } from "./_components/message-sheet";

export const metadata: Metadata = { title: "Not yours to see" };

export default function Forbidden() {
  return (
    <main className="mx-auto max-w-3xl px-3 py-8 sm:px-7">
      <MessageSheet title="Your roles do not reach here" reference="no right">
        <p>Whoever gives roles in this product, the administrator of the installation, can change that.</p>
        <p>
          <Link className="link" href="/" prefetch={false}>
            To the day sheet
          </Link>
        </p>
      </MessageSheet>
    </main>
  );
}
