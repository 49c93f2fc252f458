const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** "1.46072e-5" as it is printed on a sheet: "1.46072 × 10⁻⁵". */
export function powersOfTen(text: string): string {
  return text.replace(/(\d)e([+-]?)(\d+)\b/g, (_, digit: string, sign: string, exponent: string) => {
    const raised = exponent.replace(/\d/g, (each) => SUPERSCRIPTS.charAt(Number(each)));
    return `${digit} × 10${sign === "-" ? "⁻" : ""}${raised}`;
  });
}
