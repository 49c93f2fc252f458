import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { ProposalView, SignerLookings } from "@/lib/proposals/views";

import { LineHistoryDialog } from "./line-history-dialog";

/** The histories of the edited lines, and what each signer opened of this round: counts, and when. */
export function WhatSignersOpened({ proposal }: { proposal: ProposalView }) {
  const { signers, histories } = proposal.evidence;
  if (signers.length + histories.length === 0 || !proposal.round) return null;
  const showsFiles = signers.some(({ files }) => files.length > 0);
  const showsHistories = signers.some((signer) => (signer.histories?.length ?? 0) > 0);

  return (
    <div className="mt-5">
      {histories.length > 0 ? (
        <div className="mb-4 flex flex-wrap gap-2 print:hidden">
          {histories.map((line) => (
            <LineHistoryDialog
              key={`${line.kind} ${line.number}`}
              productCode={proposal.product.code}
              proposalId={proposal.proposalId}
              line={line}
            />
          ))}
        </div>
      ) : null}
      {showsFiles || showsHistories ? (
        <Table caption={`What signers opened of round ${proposal.round.round}`} showCaption narrow="stack">
          <TableHead>
            <Head className="w-[24%]">Signer</Head>
            {showsFiles ? <Head>Evidence</Head> : null}
            {showsHistories ? <Head>Change history</Head> : null}
          </TableHead>
          <tbody>
            {signers.map((signer) => (
              <Row key={signer.person.id}>
                <RowHead label="Signer">{signer.person.name}</RowHead>
                {showsFiles ? (
                  <Cell label="Evidence">
                    <Opened of={signer.files.map(({ fileId, name, at }) => ({ key: String(fileId), name, at }))} />
                  </Cell>
                ) : null}
                {showsHistories ? (
                  <Cell label="Change history">
                    <Opened of={historiesOf(signer)} />
                  </Cell>
                ) : null}
              </Row>
            ))}
          </tbody>
        </Table>
      ) : null}
    </div>
  );
}

function historiesOf({ histories }: SignerLookings) {
  return (histories ?? []).map(({ line, at }) => ({
    key: `${line.kind} ${line.number}`,
    name: `${line.number} ${line.name}`,
    at,
  }));
}

function Opened({ of }: { of: readonly { key: string; name: string; at: string | null }[] }) {
  const opened = of.filter(({ at }) => at !== null).length;

  return (
    <div className="min-w-0">
      {of.length > 1 ? (
        <p>
          {opened} of {of.length} opened
        </p>
      ) : null}
      <ul>
        {of.map(({ key, name, at }) => (
          <li key={key} className="break-words">
            {name}:{" "}
            {at === null ? (
              "not opened"
            ) : (
              <>
                opened <UtcTime at={at} />
              </>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
