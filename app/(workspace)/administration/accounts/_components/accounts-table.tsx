"use client";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { TextField } from "@/app/_components/text-field";
import { dayText } from "@/app/_components/utc-text";
import type { AccountRow } from "@/lib/users/queries";

import { deactivateAccountAction, reactivateAccountAction } from "../actions";

interface AccountsTableProps {
  accounts: readonly AccountRow[];
  /** The reader's own account, which they don't close themselves. */
  ownId: number;
}

export function AccountsTable({ accounts, ownId }: AccountsTableProps) {
  return (
    <Table caption="Accounts" narrow="stack">
      <TableHead>
        <Head>Name</Head>
        <Head>E-mail</Head>
        <Head>Administrator</Head>
        <Head>Made</Head>
        <Head>State</Head>
        <Head>
          <span className="sr-only">Close or open</span>
        </Head>
      </TableHead>
      <tbody>
        {accounts.map((account) => (
          <Row key={account.id} className={account.active ? undefined : "text-ink-2"}>
            <RowHead label="Name">{account.name}</RowHead>
            <Cell label="E-mail" className="break-all">
              {account.email}
            </Cell>
            <Cell label="Administrator">{account.isAdministrator ? "yes" : "no"}</Cell>
            <Cell label="Made">{dayText(account.createdAt)}</Cell>
            <Cell label="State">{account.active ? "open" : "closed"}</Cell>
            <Cell numeric className="max-sm:flex!">
              {account.id === ownId ? null : account.active ? (
                <CloseAccount account={account} />
              ) : (
                <OpenAccount account={account} />
              )}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function CloseAccount({ account: { id, name } }: { account: AccountRow }) {
  return (
    <ConfirmDialog
      trigger="Close…"
      title={`Close the account of ${name}`}
      confirm="Close the account"
      confirmKind="refuse"
      onConfirm={(form) => deactivateAccountAction({ userId: id, reason: String(form.get("reason") ?? "") })}
    >
      {(faultOf) => (
        <>
          <p>{name} is signed out at once and can sign nothing any more. Their name stays on what they signed.</p>
          <TextField label="Why" name="reason" error={faultOf("reason")} />
        </>
      )}
    </ConfirmDialog>
  );
}

function OpenAccount({ account: { id, name } }: { account: AccountRow }) {
  return (
    <ConfirmDialog
      trigger="Open again…"
      title={`Open the account of ${name} again`}
      confirm="Open the account"
      onConfirm={(form) => reactivateAccountAction({ userId: id, reason: String(form.get("reason") ?? "") })}
    >
      {(faultOf) => (
        <>
          <p>{name} can sign in again with the same password and the roles they hold.</p>
          <TextField label="Why" name="reason" error={faultOf("reason")} />
        </>
      )}
    </ConfirmDialog>
  );
}
