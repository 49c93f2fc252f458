import { redirect } from "next/navigation";

/** A product opens at its budget. */
export default async function ProductPage({ params }: PageProps<"/products/[productCode]">) {
  const { productCode } = await params;
  redirect(`/products/${encodeURIComponent(productCode)}/budget`);
}
