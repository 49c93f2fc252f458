/** What can be taken along of a change sheet. */
export function ExportLinks({ productCode, proposalKey }: { productCode: string; proposalKey: string }) {
  return (
    <details className="relative">
      <summary className="inline-flex min-h-9 items-center rounded-edge border border-ink px-4 py-1.5 text-sm font-semibold">
        Export
      </summary>
      <ul className="absolute right-0 z-20 mt-px w-64 border border-ink bg-sheet">
        <li>
          <a
            className="block px-3 py-2 hover:bg-band"
            href={`/products/${productCode}/proposals/${proposalKey}/patch`}
            download
          >
            Change as a unified patch
          </a>
        </li>
      </ul>
    </details>
  );
}
