import type { Metadata } from "next";
import { redirect } from "next/navigation";

import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { ownPath } from "@/app/_server/own-path";
import { currentActor } from "@/app/_server/session";

import { SignInForm } from "./_components/sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: PageProps<"/sign-in">) {
  const { to } = await searchParams;
  const destination = ownPath(to);
  if (await currentActor()) redirect(destination);

  return (
    <>
      <PageHeading title="Sign in" subtitle="Drag budgets, computed, reviewed line by line and signed." />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Sign in" },
              { label: "Accounts", value: "from your administrator" },
            ]}
          />
        }
      >
        <SignInForm destination={destination} />
      </Sheet>
    </>
  );
}
