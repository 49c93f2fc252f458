import Link from "next/link";

interface ProductChoiceProps {
  products: readonly { code: string; name: string }[];
  chosen: string;
}

/** Whose roles are shown: one link for each product. */
export function ProductChoice({ products, chosen }: ProductChoiceProps) {
  return (
    <nav aria-label="Product" className="mb-4 flex flex-wrap gap-x-4 gap-y-1">
      {products.map(({ code, name }) => (
        <Link
          key={code}
          href={`/administration/roles?product=${code}`}
          title={name}
          aria-current={code === chosen ? "page" : undefined}
          className="py-0.5 text-water underline underline-offset-4 aria-[current=page]:font-semibold aria-[current=page]:text-ink aria-[current=page]:decoration-2"
        >
          {code}
        </Link>
      ))}
    </nav>
  );
}
