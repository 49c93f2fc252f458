"use client";

import Link from "next/link";
import useSWR from "swr";
import { z } from "zod";

import { WAITING_ADDRESS } from "@/app/_components/waiting-address";

const Waiting = z.object({ count: z.int().min(0) });

async function readWaiting(address: string): Promise<number | null> {
  const answer = await fetch(address);

  return answer.ok ? Waiting.parse(await answer.json()).count : null;
}

/** How much waits for the reader; read anew while the page stands, after what they do, and when they come back to it. */
export function WaitingCount() {
  const { data } = useSWR(WAITING_ADDRESS, readWaiting, { refreshInterval: 10_000 });
  if (!data) return null;

  return (
    <Link href="/" prefetch={false} className="py-1 hover:text-ink hover:underline">
      {data === 1 ? "1 waits for you" : `${data} wait for you`}
    </Link>
  );
}
