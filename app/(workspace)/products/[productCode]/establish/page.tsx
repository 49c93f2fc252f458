import type { Metadata } from "next";
import Link from "next/link";
import type { Route } from "next";
import { forbidden } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { MessageSheet } from "@/app/_components/message-sheet";
import { Notice } from "@/app/_components/notice";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { establishWarnings } from "@/lib/products/queries";
import { PRODUCT_KIND_NAMES } from "@/lib/vocabulary/lines";
import { abilityFor, covers } from "@/policies/ability";

import { ServiceWindCaution } from "../_components/service-wind-caution";
import { pageProduct, readForPage } from "../_server/read-page";
import { EstablishForm } from "./_components/establish-form";

type Props = PageProps<"/products/[productCode]/establish">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Establish ${(await params).productCode}` };
}

export default async function EstablishPage({ params }: Props) {
  const { productCode } = await params;
  const [actor, product] = await Promise.all([requireActor(), pageProduct(productCode)]);
  if (!covers(abilityFor(actor), { on: "Product", action: "establish", productId: product.id })) forbidden();
  if (product.newestIssue !== null) {
    return (
      <MessageSheet title={`${product.code} is established`} reference={`issue ${product.newestIssue}`}>
        <p>Everything else comes by proposals: the limit, the terms and the operating points too.</p>
        <p>
          <Link className="link" href={`/products/${product.code}/budget` as Route}>
            To the budget
          </Link>
        </p>
      </MessageSheet>
    );
  }

  const warnings = await readForPage(() => establishWarnings(actor, productCode, new Date().toISOString()));
  return (
    <>
      <PageHeading
        title={`Establish ${product.name}`}
        subtitle={`${product.code} · ${PRODUCT_KIND_NAMES[product.kind]}`}
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${product.code} ${product.name}` },
              { label: "Issue", value: "1, not signed" },
              { label: "Time zone", value: product.timeZone },
            ]}
          />
        }
      >
        <ServiceWindCaution kind={product.kind} />
        {warnings.map((warning) => (
          <div key={warning} className="mb-3">
            <Notice kind="caution">{warning}</Notice>
          </div>
        ))}
        <EstablishForm product={{ code: product.code, kind: product.kind, timeZone: product.timeZone }} />
      </Sheet>
    </>
  );
}
