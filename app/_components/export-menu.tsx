interface ExportMenuProps {
  entries: readonly { label: string; href: string }[];
}

/** What can be taken along of a sheet, as files. */
export function ExportMenu({ entries }: ExportMenuProps) {
  return (
    <details className="relative print:hidden">
      <summary className="inline-flex min-h-9 items-center rounded-edge border border-ink px-4 py-1.5 text-sm font-semibold">
        Export
      </summary>
      <ul className="absolute right-0 z-30 mt-px w-64 border border-ink bg-sheet">
        {entries.map(({ label, href }) => (
          <li key={href}>
            <a className="block px-3 py-2 hover:bg-band" href={href} download>
              {label}
            </a>
          </li>
        ))}
      </ul>
    </details>
  );
}
