"use client";

import { useEffect, useRef, useState } from "react";

import { type FileToSend, sendFile, type SentFile } from "./send-file";

export interface Sending {
  /** How much of it is out, from 0 to 1; null while nothing is sent. */
  share: number | null;
  /** Why the last one was not kept. */
  refusal: string | null;
  send: (what: FileToSend) => Promise<SentFile>;
  refuse: (sentence: string | null) => void;
}

/** One file on its way; leaving the page breaks it off. */
export function useSending(): Sending {
  const [share, setShare] = useState<number | null>(null);
  const [refusal, refuse] = useState<string | null>(null);
  const controller = useRef<AbortController | null>(null);
  useEffect(() => () => controller.current?.abort(), []);

  async function send(what: FileToSend): Promise<SentFile> {
    controller.current = new AbortController();
    refuse(null);
    setShare(0);
    const sent = await sendFile(what, setShare, controller.current.signal);
    setShare(null);
    if (!sent.ok) refuse(sent.sentence);

    return sent;
  }

  return { share, refusal, send, refuse };
}
