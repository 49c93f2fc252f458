/** A PDF of one page with lines of text, written out by hand: objects, cross-reference table, trailer (ISO 32000-1, 7.5). */
export function writtenPdf(lines: readonly string[]): Buffer {
  const text = lines.map((line) => `(${line.replace(/[\\()]/g, "\\$&")}) Tj T*`).join("\n");
  const content = `BT /F1 11 Tf 14 TL 56 780 Td\n${text}\nET`;
  const objects = [
    "<< /Type /Catalog /Pages 2 0 R >>",
    "<< /Type /Pages /Kids [3 0 R] /Count 1 >>",
    "<< /Type /Page /Parent 2 0 R /MediaBox [0 0 595 842] /Contents 4 0 R /Resources << /Font << /F1 5 0 R >> >> >>",
    `<< /Length ${Buffer.byteLength(content, "latin1")} >>\nstream\n${content}\nendstream`,
    "<< /Type /Font /Subtype /Type1 /BaseFont /Helvetica /Encoding /WinAnsiEncoding >>",
  ];
  let body = "%PDF-1.4\n";
  const places = objects.map((object, index) => {
    const place = Buffer.byteLength(body, "latin1");
    body += `${index + 1} 0 obj\n${object}\nendobj\n`;
    return `${String(place).padStart(10, "0")} 00000 n \n`;
  });
  const table = Buffer.byteLength(body, "latin1");
  const size = objects.length + 1;
  body += `xref\n0 ${size}\n0000000000 65535 f \n${places.join("")}trailer\n<< /Size ${size} /Root 1 0 R >>\n`;
  return Buffer.from(`${body}startxref\n${table}\n%%EOF\n`, "latin1");
}

/** Rows as comma-separated values. */
export function writtenCsv(rows: readonly (readonly (string | number)[])[]): Buffer {
  return Buffer.from(rows.map((row) => `${row.join(",")}\n`).join(""), "utf8");
}
