"use client";

import { useEffect, useRef, useState } from "react";

import { BROKEN_OFF, type Refused, sendAndWatch } from "./streamed-lines";

/** Draws on the server while the page watches: how many draws are done, what was refused, and a way to stop. */
export function useDrawing() {
  const [done, setDone] = useState<number | null>(null);
  const [refused, setRefused] = useState<Refused | null>(null);
  const stopper = useRef<AbortController | null>(null);
  useEffect(() => () => stopper.current?.abort(), []);

  /** The value of a run that came to its end; undefined where it was refused or stopped. */
  async function draw(address: string, body: object): Promise<unknown> {
    const own = new AbortController();
    stopper.current = own;
    setRefused(null);
    setDone(0);
    try {
      const answer = await sendAndWatch(address, body, own.signal, setDone);
      if (answer.ok) return answer.value;
      setRefused(answer.refused);
    } catch {
      // A line that broke, here or on the server; who stopped it knows.
      if (!own.signal.aborted) setRefused(BROKEN_OFF);
    } finally {
      setDone(null);
    }
    return undefined;
  }

  return { done, refused, draw, stop: () => stopper.current?.abort() };
}
