import Link from "next/link";

import { MessageSheet } from "@/app/_components/message-sheet";

export default function Forbidden() {
  return (
    <MessageSheet title="Your roles do not reach here" reference="no right">
      <p>The administrator of the installation gives roles; a program manager can tell you which one this needs.</p>
      <p>
        <Link className="link" href="/products">
          To the products
        </Link>
      </p>
    </MessageSheet>
  );
}
