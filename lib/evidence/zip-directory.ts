const DIRECTORY_ENTRY = 0x02014b50;
const END_OF_DIRECTORY = Buffer.from("PK\u0005\u0006", "latin1");
const ENTRY_LENGTH = 46;

export const NOT_A_WORKBOOK = "This is an archive, but no XLSX workbook without macros.";

/** Whether the end of an archive lists the parts of a workbook, and none that runs by itself. */
export function isXlsx(tail: Buffer): boolean {
  const names = directoryNames(tail);
  return (
    names.includes("[Content_Types].xml") &&
    names.includes("xl/workbook.xml") &&
    !names.some((name) => name.toLowerCase().endsWith("vbaproject.bin"))
  );
}

/** Names in an archive's directory, which stands right before its end mark (APPNOTE 4.3.12, 4.3.16); none if broken. */
function directoryNames(tail: Buffer): string[] {
  const end = tail.lastIndexOf(END_OF_DIRECTORY);
  if (end < 0 || end + 22 > tail.length) return [];
  const entries = tail.readUInt16LE(end + 10);
  let at = end - tail.readUInt32LE(end + 12);
  const names: string[] = [];
  for (let entry = 0; entry < entries; entry += 1) {
    if (at < 0 || at + ENTRY_LENGTH > end || tail.readUInt32LE(at) !== DIRECTORY_ENTRY) return [];
    const name = tail.readUInt16LE(at + 28);
    names.push(tail.toString("utf8", at + ENTRY_LENGTH, at + ENTRY_LENGTH + name));
    at += ENTRY_LENGTH + name + tail.readUInt16LE(at + 30) + tail.readUInt16LE(at + 32);
  }
  return names;
}
