import type { Metadata } from "next";
import Link from "next/link";

import { MessageSheet } from "./_components/message-sheet";

export const metadata: Metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <main className="mx-auto max-w-3xl px-3 py-8 sm:px-7">
      <MessageSheet title="There is no such sheet" reference="not found">
        <p>This address leads to nothing that you may see. A code or a number in it may be mistyped.</p>
        <p>
          <Link className="link" href="/" prefetch={false}>
            To the day sheet
          </Link>
        </p>
      </MessageSheet>
    </main>
  );
}
