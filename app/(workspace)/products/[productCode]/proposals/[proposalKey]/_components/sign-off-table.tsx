import type { ReactNode } from "react";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { CapacityView, RoutingView, SignatureView } from "@/lib/proposals/views";
import type { Decision } from "@/lib/vocabulary/proposals";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";

const DECISION_WORDS: Record<Decision, string> = {
  approve: "approved",
  return: "returned for rework",
  disapprove: "disapproved",
  take_back: "approval taken back",
};

interface SignOffTableProps {
  routing: RoutingView | null;
  /** Why the named reviewer took the place of another. */
  namedBecause: string | null;
  signatures: readonly SignatureView[];
  /** Buttons of who reads it, below the table. */
  children: ReactNode;
}

/** Who must sign and why, who signed, when, in which meaning; earlier rounds stay visible. */
export function SignOffTable({ routing, namedBecause, signatures, children }: SignOffTableProps) {
  const open = routing?.capacities.filter(({ required, filledBy }) => required && !filledBy) ?? [];

  return (
    <div className="px-4 pb-4 sm:px-6.5">
      <h2 id="sign-off" className="mt-4 mb-1.5 text-lg">
        Sign-off
      </h2>
      <Table caption="Sign-off" narrow="stack">
        <TableHead>
          <Head>Capacity</Head>
          <Head>Name</Head>
          <Head className="w-[30%]">Because</Head>
          <Head>Meaning</Head>
          <Head>Signed</Head>
          <Head>Decision</Head>
        </TableHead>
        <tbody>
          {signatures.map((signature) => (
            <SignedRow key={signature.id} signature={signature} reasons={reasonsFor(routing, signature)} />
          ))}
          {open.map((capacity) => (
            <OpenRow key={capacity.capacity} capacity={capacity} namedBecause={namedBecause} />
          ))}
          {signatures.length === 0 && open.length === 0 ? (
            <Row>
              <Cell colSpan={6} className="text-ink-2">
                Nobody has signed.
              </Cell>
            </Row>
          ) : null}
        </tbody>
      </Table>
      {children}
    </div>
  );
}

function reasonsFor(routing: RoutingView | null, signature: SignatureView): string[] {
  if (!signature.counts) return [];

  return routing?.capacities.find(({ capacity }) => capacity === signature.capacity)?.reasons ?? [];
}

function SignedRow({ signature, reasons }: { signature: SignatureView; reasons: readonly string[] }) {
  return (
    <Row className={signature.counts ? "" : "text-ink-2"}>
      <RowHead label="Capacity">{ROLE_NAMES[signature.capacity]}</RowHead>
      <Cell label="Name">
        {signature.printedName}
        {signature.deputyFor ? <span className="block text-sm">as deputy for {signature.deputyFor.name}</span> : null}
      </Cell>
      <Cell label="Because">
        <Reasons reasons={reasons} />
      </Cell>
      <Cell label="Meaning">
        {signature.meaning ?? "–"}
        {signature.reason ? <span className="block text-sm text-ink-2">{signature.reason}</span> : null}
      </Cell>
      <Cell label="Signed">
        <UtcTime at={signature.at} />
        <span className="block font-code text-xs text-ink-2" title={signature.hash}>
          {signature.hash.slice(0, 12)}
        </span>
      </Cell>
      <Cell label="Decision">
        {DECISION_WORDS[signature.decision]}, round {signature.round}
        {signature.becauseNot ? <span className="block text-sm">doesn’t count: {signature.becauseNot}</span> : null}
      </Cell>
    </Row>
  );
}

interface OpenRowProps {
  capacity: CapacityView;
  namedBecause: string | null;
}

function OpenRow({ capacity, namedBecause }: OpenRowProps) {
  return (
    <Row>
      <RowHead label="Capacity">{ROLE_NAMES[capacity.capacity]}</RowHead>
      <Cell label="Name">
        {capacity.missing ?? mayText(capacity)}
        {capacity.named && namedBecause ? (
          <span className="block text-sm text-ink-2">named anew: {namedBecause}</span>
        ) : null}
      </Cell>
      <Cell label="Because">
        <Reasons reasons={capacity.reasons} />
      </Cell>
      <Cell label="Meaning">–</Cell>
      <Cell label="Signed">not yet</Cell>
      <Cell label="Decision">–</Cell>
    </Row>
  );
}

function mayText({ named, maySign }: CapacityView): string {
  if (named) return `${named.name}, named`;
  const names = maySign.map(({ name }) => name);

  return names.length > 1 ? `one of ${names.join(", ")}` : (names[0] ?? "");
}

function Reasons({ reasons }: { reasons: readonly string[] }) {
  if (reasons.length === 0) return <>–</>;

  return reasons.map((reason) => (
    <span key={reason} className="block">
      {reason}
    </span>
  ));
}
