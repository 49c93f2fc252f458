/** Kinds of file that evidence may come in, decided by what is in the file. */
export const FILE_TYPES = {
  "application/pdf": { name: "PDF", extensions: ["pdf"] },
  "image/png": { name: "PNG picture", extensions: ["png"] },
  "image/jpeg": { name: "JPEG picture", extensions: ["jpg", "jpeg"] },
  "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet": { name: "XLSX workbook", extensions: ["xlsx"] },
  "text/csv": { name: "CSV table", extensions: ["csv", "tsv", "txt"] },
  "text/plain": { name: "text", extensions: ["txt"] },
} as const satisfies Record<string, { name: string; extensions: readonly string[] }>;

export type FileType = keyof typeof FILE_TYPES;

export const ACCEPTED_FILES = "PDF, PNG, JPEG, CSV, XLSX or plain text, at most 25 MB";

/** 25 MB as disks and mail programs count them. */
export const LONGEST_FILE = 25_000_000;

export function fileTypeName(mediaType: string): string {
  return Object.entries(FILE_TYPES).find(([type]) => type === mediaType)?.[1].name ?? mediaType;
}

/** "412 kB", "3.4 MB". */
export function fileSizeText(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`;
  if (bytes < 999_500) return `${Math.round(bytes / 1000)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}
