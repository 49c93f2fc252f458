import type { Route } from "next";
import Link from "next/link";

import { CONTROL } from "@/app/_components/field";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { dayText } from "@/app/_components/utc-text";
import type { SheetToSign } from "@/lib/proposals/reading/sheets-to-sign";
import { SIGNATURE_MEANINGS } from "@/lib/vocabulary/proposals";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";

/** What can be approved now: effect, capacity and meaning of each sheet. */
export function SheetsTable({ sheets }: { sheets: readonly SheetToSign[] }) {
  return (
    <Table caption="Sheets to sign" narrow="stack">
      <TableHead>
        <Head>Sign</Head>
        <Head className="w-[26%]">Proposal</Head>
        <Head className="w-[24%]">Effect on today’s issue</Head>
        <Head>As</Head>
        <Head>Your signature means</Head>
        <Head>Needed by</Head>
      </TableHead>
      <tbody>
        {sheets.map((sheet) => (
          // A sheet that moved is another one: nothing chosen before stays chosen.
          <SheetRow key={sheet.textHash} sheet={sheet} />
        ))}
      </tbody>
    </Table>
  );
}

function SheetRow({ sheet }: { sheet: SheetToSign }) {
  const { productCode, proposalId, key, label, title, effect, capacity, deputyFor, neededBy, opened } = sheet;

  return (
    <Row>
      <Cell label="Sign">
        {opened ? (
          <input
            type="checkbox"
            name={`sheet ${proposalId}`}
            aria-label={`Sign ${label}`}
            defaultChecked
            className="size-5 accent-ink"
          />
        ) : (
          <span className="text-sm text-ink-2">not opened as it stands now</span>
        )}
      </Cell>
      <RowHead label="Proposal">
        <Link className="link" prefetch={false} href={`/products/${productCode}/proposals/${key}` as Route}>
          {label}
        </Link>{" "}
        <span className="text-ink-2">{title}</span>
      </RowHead>
      <Cell label="Effect">{effect}</Cell>
      <Cell label="As">
        {ROLE_NAMES[capacity].toLowerCase()}
        {deputyFor ? <span className="block text-sm text-ink-2">as deputy for {deputyFor.name}</span> : null}
      </Cell>
      <Cell label="Means">
        {opened ? (
          <select
            name={`meaning ${proposalId}`}
            aria-label={`Meaning of your signature on ${label}`}
            className={CONTROL}
          >
            {SIGNATURE_MEANINGS[capacity].map((meaning) => (
              <option key={meaning}>{meaning}</option>
            ))}
          </select>
        ) : (
          "–"
        )}
      </Cell>
      <Cell label="Needed by">{neededBy ? dayText(neededBy) : <span className="text-ink-2">no date</span>}</Cell>
    </Row>
  );
}
