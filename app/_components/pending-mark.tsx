"use client";

import { useLinkStatus } from "next/link";

/** Inside a link: an ellipsis while the page it leads to is being read. */
export function PendingMark() {
  const { pending } = useLinkStatus();

  return pending ? (
    <span role="status" aria-label="reading">
      …
    </span>
  ) : null;
}
