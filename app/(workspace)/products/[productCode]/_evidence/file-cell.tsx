import { FileLink, fileKind } from "@/app/_components/file-link";
import { dayText } from "@/app/_components/utc-text";
import type { FileView } from "@/lib/proposals/views";

import { VoidFileDialog } from "./void-file-dialog";

interface FileCellProps {
  productCode: string;
  file: FileView | null;
  /** What a citation names, where the file itself is not there for the reader. */
  citedName?: string | null;
}

/** A file in a table of evidence: its name to download it, its kind, the beginning of its hash, whether it is void. */
export function FileCell({ productCode, file, citedName = null }: FileCellProps) {
  if (!file) return <>{citedName ?? "–"}</>;

  return (
    <div className="min-w-0 space-y-1">
      <p className="min-w-0">
        <FileLink productCode={productCode} file={file} />
        <span className="block text-xs text-ink-2">
          {fileKind(file)}, <span title={`SHA-256 ${file.sha256}`}>SHA-256 {file.sha256.slice(0, 12)}…</span>
        </span>
      </p>
      {file.voided ? (
        <p className="text-sm">
          <strong className="font-semibold">▲ Voided</strong> by {file.voided.by},{" "}
          {dayText(file.voided.at.slice(0, 10))}: {file.voided.reason}
        </p>
      ) : null}
      {file.mayVoid ? <VoidFileDialog fileId={file.fileId} name={file.name} /> : null}
    </div>
  );
}
