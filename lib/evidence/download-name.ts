import { FILE_TYPES } from "@/lib/vocabulary/files";

interface NamedFile {
  name: string;
  mediaType: string;
  voidedAt: string | null;
}

/**
 * The name under which a file is saved, plain for old programs and encoded (RFC 8187). It ends as its content asks,
 * whatever it was called, and a voided file says so in its name.
 */
export function downloadName({ name, mediaType, voidedAt }: NamedFile): { plain: string; encoded: string } {
  const full = `${voidedAt === null ? "" : "VOIDED "}${name}${endingFor(name, mediaType)}`;
  return { plain: full.replace(/[^\w .()+-]/g, "_"), encoded: encoded(full) };
}

function endingFor(name: string, mediaType: string): string {
  const extensions: readonly string[] =
    Object.entries(FILE_TYPES).find(([type]) => type === mediaType)?.[1].extensions ?? [];
  const [first] = extensions;
  const has = extensions.some((extension) => name.toLowerCase().endsWith(`.${extension}`));
  return has || first === undefined ? "" : `.${first}`;
}

/** encodeURIComponent leaves four characters as they are that stand for something in a header. */
function encoded(text: string): string {
  return encodeURIComponent(text).replace(/['()*]/g, (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase()}`);
}
