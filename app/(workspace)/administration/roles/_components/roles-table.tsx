"use client";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { EmptyNote } from "@/app/_components/empty-note";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { TextField } from "@/app/_components/text-field";
import { UtcTime } from "@/app/_components/utc-time";
import type { MembershipView } from "@/lib/products/queries";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";

import { endRoleAction } from "../actions";

/** Who holds which role since when, and who held one before. */
export function RolesTable({ memberships }: { memberships: readonly MembershipView[] }) {
  if (memberships.length === 0) {
    return (
      <EmptyNote title="Nobody holds a role here yet.">
        Begin with a program manager, who establishes the product, and at least one reviewer.
      </EmptyNote>
    );
  }

  return (
    <Table caption="Roles" narrow="stack">
      <TableHead>
        <Head>Person</Head>
        <Head>Role</Head>
        <Head>From</Head>
        <Head>Until</Head>
      </TableHead>
      <tbody>
        {memberships.map((membership) => (
          <Row key={membership.membershipId} className={membership.until ? "text-ink-2" : undefined}>
            <RowHead label="Person">{membership.person.name}</RowHead>
            <Cell label="Role">{ROLE_NAMES[membership.role]}</Cell>
            <Cell label="From">
              <UtcTime at={membership.from} />
            </Cell>
            <Cell label="Until">
              {membership.until ? <UtcTime at={membership.until} /> : <EndRole membership={membership} />}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function EndRole({ membership: { membershipId, person, role } }: { membership: MembershipView }) {
  return (
    <ConfirmDialog
      trigger="End…"
      title={`End a role of ${person.name}`}
      confirm="End the role"
      confirmKind="refuse"
      onConfirm={(form) => endRoleAction({ membershipId, reason: String(form.get("reason") ?? "") })}
    >
      {(faultOf) => (
        <>
          <p>
            {person.name} will no longer be {ROLE_NAMES[role].toLowerCase()} of this product. What they signed stays.
          </p>
          <TextField label="Why" name="reason" error={faultOf("reason")} />
        </>
      )}
    </ConfirmDialog>
  );
}
