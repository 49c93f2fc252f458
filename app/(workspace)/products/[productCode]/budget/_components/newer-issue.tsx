"use client";

import { useRouter } from "next/navigation";
import useSWR from "swr";

import { Notice } from "@/app/_components/notice";

interface NewerIssueProps {
  productCode: string;
  /** The issue that the page shows as the newest. */
  shown: number;
}

/** Says when a newer issue was made while the page lay open; nothing moves under the reader's eyes. */
export function NewerIssue({ productCode, shown }: NewerIssueProps) {
  const router = useRouter();
  const { data } = useSWR(`/api/products/${productCode}/newest-issue`, readNewest, { refreshInterval: 30_000 });
  if (!data || data <= shown) return null;

  return (
    <div className="mb-4">
      <Notice>
        Issue {data} has been made since this page was opened.{" "}
        <button type="button" className="link" onClick={() => router.refresh()}>
          Show it
        </button>
      </Notice>
    </div>
  );
}

async function readNewest(address: string): Promise<number | null> {
  const answer = await fetch(address);
  const body: unknown = answer.ok ? await answer.json() : null;
  return typeof body === "object" && body !== null && "issue" in body && typeof body.issue === "number"
    ? body.issue
    : null;
}
