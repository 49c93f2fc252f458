import { ButtonLink } from "@/app/_components/button";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import type { ProductFacts } from "@/lib/budget/views";

interface NotEstablishedProps {
  product: ProductFacts;
  mayEstablish: boolean;
}

/** What any sheet of a product says before there is an issue. */
export function NotEstablished({ product, mayEstablish }: NotEstablishedProps) {
  return (
    <>
      <PageHeading title={product.name} subtitle={`${product.code} · not established`} />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${product.code} ${product.name}` },
              { label: "Issue", value: "none yet" },
            ]}
          />
        }
      >
        <EmptyNote title="This product has no budget yet.">
          <p>
            A program manager establishes it by a signed act: issue 1 with the reference operating point, its limit and
            reserve, the growth table and an allocations sheet without rows. Items come by proposals after that.
          </p>
          {mayEstablish ? (
            <p className="mt-3">
              <ButtonLink href={`/products/${product.code}/establish`} kind="primary">
                Establish…
              </ButtonLink>
            </p>
          ) : null}
        </EmptyNote>
      </Sheet>
    </>
  );
}
