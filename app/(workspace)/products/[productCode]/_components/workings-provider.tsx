"use client";

import { createContext, type ReactNode, useContext, useRef, useState } from "react";
import useSWRImmutable from "swr/immutable";

import { ModalSheet } from "@/app/_components/modal-sheet";
import { Notice } from "@/app/_components/notice";

import type { Preferences } from "@/lib/vocabulary/measures";

import type { FigureQuestion, Working } from "../_workings/working";
import { WorkingView } from "./working-view";

const AskFigure = createContext<((question: FigureQuestion) => void) | null>(null);

interface WorkingsProviderProps {
  productCode: string;
  /** Issue and operating point of the sheet whose numbers are asked about. */
  issue: number;
  point: string;
  /** In which its forces are read: a working ends with that beside the newtons. */
  read?: Pick<Preferences, "measure" | "units">;
  children: ReactNode;
}

/** Lets every number below it answer a click; the workings of a frozen issue are read when they are asked for. */
export function WorkingsProvider({ productCode, issue, point, read, children }: WorkingsProviderProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [question, setQuestion] = useState<FigureQuestion | null>(null);
  const { data, error } = useSWRImmutable(
    question ? addressOf(productCode, { issue: String(issue), point, ...read }, question) : null,
    readWorking,
  );

  function ask(asked: FigureQuestion) {
    setQuestion(asked);
    dialog.current?.showModal();
  }

  return (
    <AskFigure value={ask}>
      {children}
      <ModalSheet
        dialog={dialog}
        title={question && data ? data.title : "How it came about"}
        onClose={() => setQuestion(null)}
      >
        {data && question ? <WorkingView working={data} base={`/products/${productCode}`} /> : null}
        {error instanceof Error ? <Notice kind="refusal">{error.message}</Notice> : null}
        {question && !data && !error ? (
          <p role="status" className="text-ink-2">
            Reading the working…
          </p>
        ) : null}
      </ModalSheet>
    </AskFigure>
  );
}

interface WorkingNumberProps extends FigureQuestion {
  children: ReactNode;
  /** Says which number this is: "Basic estimate of 010". */
  name: string;
}

/** A number that answers a click with its working. */
export function WorkingNumber({ children, name, figure, of, number }: WorkingNumberProps) {
  const ask = useContext(AskFigure);

  return (
    <button
      type="button"
      aria-haspopup="dialog"
      title={name}
      className="min-h-6 font-[inherit] underline decoration-rule-strong decoration-dotted underline-offset-4 hover:decoration-ink hover:decoration-solid print:no-underline"
      onClick={() => ask?.({ figure, of, number })}
    >
      {children}
      <span className="sr-only">, how it came about</span>
    </button>
  );
}

function addressOf(productCode: string, sheet: Record<string, string>, { figure, of, number }: FigureQuestion): string {
  const query = new URLSearchParams({
    ...sheet,
    figure,
    of,
    ...(number === null ? {} : { number }),
  });
  return `/api/products/${productCode}/workings?${query}`;
}

async function readWorking(address: string): Promise<Working> {
  const answer = await fetch(address);
  const body: unknown = await answer.json();
  if (!answer.ok) throw new Error(sentenceOf(body));
  return body as Working;
}

function sentenceOf(body: unknown): string {
  if (typeof body === "object" && body !== null && "sentence" in body && typeof body.sentence === "string") {
    return body.sentence;
  }
  return "The working could not be read. Try again.";
}
