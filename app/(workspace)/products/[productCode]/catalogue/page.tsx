import type { Metadata, Route } from "next";
import Link from "next/link";

import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { catalogueHistory } from "@/lib/budget/catalogue-history";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { NotEstablished } from "../_components/not-established";
import { budgetFields } from "../_components/sheet-fields";
import { pageBudget, pageProduct, readForPage } from "../_server/read-page";
import { sheetAddress } from "../_sheet/sheet-address";
import { SheetQuery } from "../_sheet/sheet-filter";
import { CatalogueHistory } from "./_components/catalogue-history";
import { FinishTable } from "./_components/finish-table";
import { MethodsTable } from "./_components/methods-table";

type Props = PageProps<"/products/[productCode]/catalogue">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Catalogue of ${(await params).productCode}` };
}

export default async function CataloguePage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, { units }, product, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageProduct(productCode),
    pageBudget(productCode, query),
  ]);
  const ability = abilityFor(actor);
  if (!budget) {
    const mayEstablish = covers(ability, { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }

  const versions = await readForPage(() => catalogueHistory(actor, product.code, budget.issue.number));
  const base = `/products/${product.code}`;
  const { issue, on } = query;
  const hrefOf = (finish: string) => sheetAddress(`${base}/catalogue/${finish}`, SheetQuery.parse({ issue, on }), {});
  const mayStart = covers(ability, { on: "Product", action: "start_draft", productId: product.id });

  return (
    <>
      <PageHeading
        title="Catalogue of finishes and methods"
        subtitle={`${product.code} · ${product.name} · issue ${budget.issue.number}`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, null)} />}>
        <AsStoodBanner budget={budget} newestHref={`${base}/catalogue`} />
        <SectionHeading aside={versions[0] ? `version ${versions[0].version}` : null}>Finishes</SectionHeading>
        <FinishTable lines={budget.state.lines} units={units} hrefOf={hrefOf} />
        <SectionHeading>Methods and their versions</SectionHeading>
        <MethodsTable state={budget.state} />
        {mayStart ? (
          <p className="mt-2 text-sm print:hidden">
            A finish changes, and another version of a method is adopted, by{" "}
            <Link className="link" href={`${base}/proposals` as Route}>
              a proposal
            </Link>
            : it lists every item that is touched before anybody signs.
          </p>
        ) : null}
        <SectionHeading>Versions of the finish catalogue</SectionHeading>
        <CatalogueHistory versions={versions} productCode={product.code} />
      </Sheet>
    </>
  );
}
