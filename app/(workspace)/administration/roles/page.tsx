import type { Metadata } from "next";

import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { requireAdministrator } from "@/app/_server/administration-access";
import { membershipsOf, registerFor } from "@/lib/products/queries";
import { listAccounts } from "@/lib/users/queries";

import { GiveRoleForm } from "./_components/give-role-form";
import { ProductChoice } from "./_components/product-choice";
import { RolesTable } from "./_components/roles-table";

export const metadata: Metadata = { title: "Roles" };

export default async function RolesPage({ searchParams }: PageProps<"/administration/roles">) {
  const actor = await requireAdministrator();
  const products = (await registerFor(actor)).map(({ product }) => product);
  const { product: wanted } = await searchParams;
  const product = products.find(({ code }) => code === wanted) ?? products[0];
  const memberships = product ? await membershipsOf(actor, product.code) : [];
  const people = (await listAccounts()).filter(({ active }) => active).map(({ id, name }) => ({ id, name }));

  return (
    <>
      <PageHeading title="Roles" subtitle={product ? `${product.code} ${product.name}` : undefined} />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Administration, roles" },
              { label: "Product", value: product?.code ?? "–" },
              { label: "Held now", value: memberships.filter(({ until }) => until === null).length },
            ]}
          />
        }
      >
        {product ? (
          <>
            <ProductChoice products={products} chosen={product.code} />
            <RolesTable memberships={memberships} />
            <SectionHeading>Give a role</SectionHeading>
            <GiveRoleForm key={product.code} productCode={product.code} people={people} />
          </>
        ) : (
          <EmptyNote title="No product yet.">Make a product first; roles are held in products.</EmptyNote>
        )}
      </Sheet>
    </>
  );
}
