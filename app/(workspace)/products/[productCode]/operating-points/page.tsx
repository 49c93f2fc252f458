import type { Metadata, Route } from "next";
import Link from "next/link";

import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { reserveHistory } from "@/lib/budget/reserve-history";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import { type FieldRow, fieldRows } from "@/lib/evaluation/lines/field-rows";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { FieldTable } from "../_components/field-table";
import { NotEstablished } from "../_components/not-established";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { pageBudget, pageProduct, readForPage } from "../_server/read-page";
import { sheetAddress } from "../_sheet/sheet-address";
import { SheetQuery } from "../_sheet/sheet-filter";
import { PointsTable } from "./_components/points-table";
import { ReserveSection } from "./_components/reserve-section";
import { StreamSourcesList } from "./_components/stream-sources-list";

type Props = PageProps<"/products/[productCode]/operating-points">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Operating points of ${(await params).productCode}` };
}

export default async function OperatingPointsPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, { units }, product, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageProduct(productCode),
    pageBudget(productCode, query),
  ]);
  if (!budget) {
    const mayEstablish = covers(abilityFor(actor), { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }

  const base = `/products/${product.code}`;
  const histories = await readForPage(() => reserveHistory(actor, product.code, budget.issue.number));
  const names = nameBookOf(budget.state, new Map(budget.people.map(({ id, name }) => [id, name])));
  const terms = budget.state.lines.find(({ kind }) => kind === "terms");
  const { operatingPoints } = indexState(budget.state);
  const pointsInForce = budget.results.points.flatMap(({ operatingPoint: number }) => {
    const body = operatingPoints.get(number);
    return body ? [{ number, body }] : [];
  });
  const termsRows = terms ? fieldRows(terms, names) : [];
  const onTerms = { on: "Line", productId: product.id, kind: "terms", ownerBefore: null, ownerAfter: null } as const;
  const mayDraw = covers(abilityFor(actor), { ...onTerms, action: "revise" });

  return (
    <>
      <PageHeading
        title="Operating points"
        subtitle={`${product.code} · ${product.name} · issue ${budget.issue.number}`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, null)} />}>
        <AsStoodBanner budget={budget} newestHref={`${base}/operating-points`} />
        <ServiceWindCaution kind={product.kind} />
        <PointsTable
          budget={budget}
          units={units}
          budgetHref={(point) => sheetAddress(`${base}/budget`, query, { point })}
        />
        <StreamSourcesList points={pointsInForce} />
        <SectionHeading aside={terms ? `revision ${terms.letter}` : null}>Terms</SectionHeading>
        <FieldTable rows={termsRows.filter((row) => !isReviewRule(row))} caption="Terms" units={units} />
        <p className="mt-2 text-sm print:hidden">
          <Link className="link" href={`${base}/growth` as Route}>
            Estimate-to-test growth, and what growth table it suggests
          </Link>
        </p>
        <ReserveSection
          histories={histories}
          asked={query.point}
          units={units}
          productCode={product.code}
          hrefOf={(point) => sheetAddress(`${base}/operating-points`, query, { point })}
          mayDraw={mayDraw}
        />
        <SectionHeading aside="a program manager signs too on what is said yes to">Review rules</SectionHeading>
        <FieldTable rows={termsRows.filter(isReviewRule).map(shortRule)} caption="Review rules" units={units} />
      </Sheet>
    </>
  );
}

function isReviewRule({ field }: FieldRow): boolean {
  return field.startsWith("reviewRules.");
}

/** Under their own heading the rules need not say again whose they are. */
function shortRule(row: FieldRow): FieldRow {
  return { ...row, label: row.label.split(": ").at(-1) ?? row.label };
}
