import Link from "next/link";

import { MessageSheet } from "@/app/_components/message-sheet";

export default function NotFound() {
  return (
    <MessageSheet title="There is no such sheet" reference="not found">
      <p>This address leads to nothing that you may see. A code or a number in it may be mistyped.</p>
      <p>
        <Link className="link" href="/products">
          To the products
        </Link>
      </p>
    </MessageSheet>
  );
}
