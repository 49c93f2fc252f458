import { Sheet } from "./sheet";

/** Stands where a sheet will be while it is computed. */
export function LoadingSheet({ what = "the sheet" }: { what?: string }) {
  return (
    <Sheet titleBlock={<div className="h-10" />}>
      <p role="status" className="py-10 text-ink-2">
        Reading {what}…
      </p>
    </Sheet>
  );
}
