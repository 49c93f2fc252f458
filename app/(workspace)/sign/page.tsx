import type { Metadata } from "next";

import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { dayText } from "@/app/_components/utc-text";
import { requireActor } from "@/app/_server/session";
import { sheetsToSign } from "@/lib/proposals/reading/sheets-to-sign";
import { systemClock } from "@/lib/vocabulary/clock";

import { SignSheetsForm } from "./_components/sign-sheets-form";

export const metadata: Metadata = { title: "Sheets to sign" };

export default async function SignSheetsPage() {
  const actor = await requireActor();
  const sheets = await sheetsToSign(actor);
  const today = systemClock().toISOString().slice(0, 10);

  return (
    <div className="mx-auto max-w-[92rem]">
      <PageHeading
        title="Sheets to sign"
        subtitle="Approve several sheets with one password, each of which you have opened as it stands now"
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: `Sheets to sign by ${actor.printedName}` },
              { label: "Date", value: dayText(today) },
            ]}
          />
        }
      >
        <SignSheetsForm sheets={sheets} />
      </Sheet>
    </div>
  );
}
