import { crc32, deflateSync } from "node:zlib";
import { writtenCsv, writtenPdf } from "@/scripts/demo/written-files";

/** Small files of each kind, made here byte by byte. */
export const samplePdf = (text = "Test record 12") => writtenPdf([text]);

export const sampleCsv = () =>
  writtenCsv([
    ["run", "speed m/s", "force N"],
    [1, 24.9, 12.3],
    [2, 25.1, 12.6],
  ]);

export const sampleText = () => Buffer.from("Spoken with the tool shop: radius 18 mm, k_s ≈ 12 µm.\n", "utf8");

/** One grey pixel (PNG 1.2, chapter 3): signature, header, data, end. */
export function samplePng(): Buffer {
  const header = Buffer.from([0, 0, 0, 1, 0, 0, 0, 1, 8, 0, 0, 0, 0]);
  const chunks = [
    chunk("IHDR", header),
    chunk("IDAT", deflateSync(Buffer.from([0, 128]))),
    chunk("IEND", Buffer.alloc(0)),
  ];
  return Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), ...chunks]);
}

function chunk(type: string, data: Buffer): Buffer {
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const body = Buffer.concat([Buffer.from(type, "latin1"), data]);
  const check = Buffer.alloc(4);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}

/** The frame of a JPEG: start, one application segment, end (ITU-T T.81, annex B). */
export function sampleJpeg(): Buffer {
  const segment = Buffer.from("JFIF\u0000\u0001\u0001\u0000\u0000\u0001\u0000\u0001\u0000\u0000", "latin1");
  return Buffer.concat([Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16]), segment, Buffer.from([0xff, 0xd9])]);
}

/** An archive of uncompressed parts (APPNOTE 4.3.6): local headers, directory, end mark. */
export function sampleZip(names: readonly string[]): Buffer {
  const parts: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const name of names) {
    const [file, content] = [Buffer.from(name, "utf8"), Buffer.from("<xml/>", "utf8")];
    const local = Buffer.alloc(30);
    local.writeUInt32LE(0x04034b50);
    local.writeUInt32LE(crc32(content), 14);
    local.writeUInt32LE(content.length, 18);
    local.writeUInt32LE(content.length, 22);
    local.writeUInt16LE(file.length, 26);
    const entry = Buffer.alloc(46);
    entry.writeUInt32LE(0x02014b50);
    entry.writeUInt32LE(crc32(content), 16);
    entry.writeUInt32LE(content.length, 20);
    entry.writeUInt32LE(content.length, 24);
    entry.writeUInt16LE(file.length, 28);
    entry.writeUInt32LE(offset, 42);
    parts.push(local, file, content);
    directory.push(entry, file);
    offset += local.length + file.length + content.length;
  }
  const listed = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.writeUInt32LE(0x06054b50);
  end.writeUInt16LE(names.length, 8);
  end.writeUInt16LE(names.length, 10);
  end.writeUInt32LE(listed.length, 12);
  end.writeUInt32LE(offset, 16);
  return Buffer.concat([...parts, listed, end]);
}

export const sampleXlsx = () => sampleZip(["[Content_Types].xml", "xl/workbook.xml", "xl/worksheets/sheet1.xml"]);

/** Bytes in pieces, as a network brings them. */
export async function* inPieces(bytes: Uint8Array, length = 7): AsyncGenerator<Uint8Array> {
  for (let from = 0; from < bytes.length; from += length) yield bytes.subarray(from, from + length);
}
