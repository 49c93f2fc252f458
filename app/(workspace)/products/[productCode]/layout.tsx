import type { ReactNode } from "react";

import { IndexLayout } from "@/app/_components/index-layout";
import { SheetIndex } from "@/app/_components/sheet-index";
import { requireActor } from "@/app/_server/session";
import { registerFor } from "@/lib/products/queries";

import { pageProduct } from "./_server/read-page";

interface ProductLayoutProps {
  children: ReactNode;
  params: Promise<{ productCode: string }>;
}

/** The sheets of one product, numbered as in a drawing set. */
export default async function ProductLayout({ children, params }: ProductLayoutProps) {
  const { productCode } = await params;
  const [actor, product] = await Promise.all([requireActor(), pageProduct(productCode)]);
  const register = await registerFor(actor);
  const open = register.find((entry) => entry.product.id === product.id)?.openProposals ?? 0;
  const base = `/products/${product.code}`;

  return (
    <IndexLayout
      index={
        <SheetIndex
          label={`Sheets of ${product.code}`}
          entries={[
            { href: `${base}/budget`, label: "Budget" },
            { href: `${base}/proposals`, label: "Proposals", count: open },
            { href: `${base}/operating-points`, label: "Operating points" },
            { href: `${base}/catalogue`, label: "Catalogue" },
            { href: `${base}/uncertainty`, label: "Uncertainty" },
            { href: `${base}/issues`, label: "Issues" },
            { href: `${base}/pictures`, label: "Pictures" },
            { href: `${base}/history`, label: "History" },
            { href: `${base}/people`, label: "People" },
          ]}
        />
      }
    >
      {children}
    </IndexLayout>
  );
}
