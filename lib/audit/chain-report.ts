import type { ChainHeadValue } from "./write-entry";

export const CHAIN_FAULTS = {
  gap: "A sequence number is missing or stands twice.",
  link: "The entry does not follow the hash of the entry before it.",
  hash: "The stored text does not give the stored hash.",
  column: "A column says something else than the stored text.",
  head: "The chain does not end where its head is kept.",
  known_head: "The chain does not contain the head that was noted earlier.",
  cut: "Entries that were once written are gone.",
  issue_head: "The chain does not contain the entry that an issue names as the head before it.",
  unbound: "A row stands in no entry of the history.",
  altered: "A row is not what it was when its entry was written.",
  removed: "A row that an entry names is gone.",
  closing: "A row was closed without the act that closes it.",
  text: "A stored text does not give its hash.",
  content: "An issue's lines, results or totals do not give its content hash.",
} as const;
export type ChainFaultCode = keyof typeof CHAIN_FAULTS;

export interface ChainFault {
  code: ChainFaultCode;
  /** "entry 17", "signature 4", "issue 3" */
  where: string;
  sentence: string;
}

export interface ChainReport {
  chain: string;
  entries: number;
  /** Rows that entries bind: issues, rounds, signatures, remarks, roles … */
  records: number;
  head: ChainHeadValue;
  faults: ChainFault[];
}

export function chainFault(code: ChainFaultCode, where: string, detail?: string): ChainFault {
  const sentence = CHAIN_FAULTS[code];
  return { code, where, sentence: detail === undefined ? sentence : `${sentence} ${detail}` };
}
