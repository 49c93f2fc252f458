import type { Metadata, Route } from "next";
import Link from "next/link";

import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { UtcTime } from "@/app/_components/utc-time";
import { dayText } from "@/app/_components/utc-text";
import { productsToEstablish } from "@/app/_server/products-to-establish";
import { requireActor } from "@/app/_server/session";
import { daySheet } from "@/lib/proposals/day-sheet/day-sheet";
import { noteVisit } from "@/lib/proposals/records/visits";
import { systemClock } from "@/lib/vocabulary/clock";

import { AwaitedTable } from "./_components/day-sheet/awaited-table";
import { ChangesTable } from "./_components/day-sheet/changes-table";
import { OwnItemsTable } from "./_components/day-sheet/own-items-table";
import { WaitingTable } from "./_components/day-sheet/waiting-table";

export const metadata: Metadata = { title: "Day sheet" };

export default async function DaySheetPage({ searchParams }: PageProps<"/">) {
  const order = (await searchParams).by === "margin" ? "margin" : "needed";
  const actor = await requireActor();
  // Before reading: what changed is told since the visit before this one.
  await noteVisit(actor);
  const [sheet, toEstablish] = await Promise.all([daySheet(actor, systemClock, order), productsToEstablish(actor)]);
  const today = systemClock().toISOString().slice(0, 10);

  return (
    <div className="mx-auto max-w-[92rem]">
      <PageHeading title="Day sheet" subtitle={summary(sheet.waitsForMe.length + toEstablish.length)} />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: `Day sheet of ${actor.printedName}` },
              { label: "Date", value: dayText(today) },
              { label: "Last seen", value: sheet.lastSeenAt ? <UtcTime at={sheet.lastSeenAt} /> : "never before" },
            ]}
          />
        }
      >
        <SectionHeading>Waits for you</SectionHeading>
        {toEstablish.map(({ code, name }) => (
          <p key={code} className="border-b border-rule py-2">
            <Link className="link font-medium" href={`/products/${code}/establish` as Route}>
              Establish {code} {name}
            </Link>
            : state its limit and operating point and sign its first issue.
          </p>
        ))}
        {sheet.waitsForMe.filter(({ isSignature }) => isSignature).length > 1 ? (
          <p className="mb-2 print:hidden">
            <Link className="link" href={"/sign" as Route}>
              Sign several sheets with one password…
            </Link>
          </p>
        ) : null}
        {[...sheet.waitsForMe, ...sheet.iWaitFor].some(({ neededBy }) => neededBy !== null) ? (
          <p className="mb-2 print:hidden">
            <a className="link" href="/api/needed-by" download>
              Needed-by dates as a calendar file
            </a>
          </p>
        ) : null}
        {toEstablish.length === 0 || sheet.waitsForMe.length > 0 ? (
          <WaitingTable entries={sheet.waitsForMe} today={today} order={order} />
        ) : null}
        <SectionHeading>You wait for</SectionHeading>
        <AwaitedTable entries={sheet.iWaitFor} today={today} />
        <SectionHeading>Your items</SectionHeading>
        <OwnItemsTable items={sheet.myItems} />
        <SectionHeading>Changed since you last looked</SectionHeading>
        <ChangesTable changes={sheet.changedSince} />
      </Sheet>
    </div>
  );
}

function summary(waiting: number): string {
  if (waiting === 0) return "Nothing waits for you.";

  return waiting === 1 ? "One thing waits for you." : `${waiting} things wait for you.`;
}
