import { fileSizeText, fileTypeName } from "@/lib/vocabulary/files";

interface FileLinkProps {
  productCode: string;
  file: { fileId: number; name: string };
}

/** Downloads a file: never shown in place, and noted as opened. A plain link, since nothing is to be loaded ahead. */
export function FileLink({ productCode, file }: FileLinkProps) {
  return (
    <a className="link break-words" href={`/api/products/${productCode}/files/${file.fileId}`} download>
      {file.name}
    </a>
  );
}

/** "PDF, 412 kB". */
export function fileKind({ mediaType, size }: { mediaType: string; size: number }): string {
  return `${fileTypeName(mediaType)}, ${fileSizeText(size)}`;
}
