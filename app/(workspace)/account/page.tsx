import type { Metadata } from "next";

import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { actorById } from "@/lib/users/queries";
import { systemClock } from "@/lib/vocabulary/clock";

import { ChangePasswordForm } from "./_components/change-password-form";
import { EndSessionsButton } from "./_components/end-sessions-button";
import { UnitsForm } from "./_components/units-form";

export const metadata: Metadata = { title: "Account" };

export default async function AccountPage() {
  const { userId, printedName, isAdministrator } = await requireActor();
  const { units } = await currentPreferences();
  const account = await actorById(userId, systemClock().toISOString());

  return (
    <div className="mx-auto max-w-4xl">
      <PageHeading title={printedName} subtitle={account?.email} />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Account" },
              { label: "Name", value: printedName },
              { label: "Administrator", value: isAdministrator ? "yes" : "no" },
            ]}
          />
        }
      >
        <SectionHeading>Units</SectionHeading>
        <p className="mb-3 max-w-[62ch] text-ink-2">
          In which units you read. Fields take either, always; what you type is kept beside its SI value, and SI is what
          is kept, signed and exported.
        </p>
        <UnitsForm units={units} />
        <SectionHeading>Change the password</SectionHeading>
        <p className="mb-3 max-w-[62ch] text-ink-2">
          You type it when you sign in and when you sign a proposal. Changing it ends every session of yours, this one
          too.
        </p>
        <ChangePasswordForm />
        <SectionHeading>Sign out everywhere</SectionHeading>
        <p className="mb-3 max-w-[62ch] text-ink-2">Ends every session of yours, on whatever machine it was begun.</p>
        <EndSessionsButton />
      </Sheet>
    </div>
  );
}
