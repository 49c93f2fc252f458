"use client";

import { Button } from "@/app/_components/button";
import { MessageSheet } from "@/app/_components/message-sheet";

interface ErrorPageProps {
  error: Error & { digest?: string };
  retry: () => void;
}

export default function ErrorPage({ error, retry }: ErrorPageProps) {
  return (
    <MessageSheet title="This sheet could not be made" reference={error.digest ?? "none"}>
      <p>The fault is ours and stands in the log of the server under the reference below. Nothing was changed.</p>
      <Button onClick={retry}>Try again</Button>
    </MessageSheet>
  );
}
