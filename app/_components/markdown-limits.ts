const LONGEST = 20_000;
const DEEPEST = 50;

/**
 * True for text whose tree would be too long or too deep to draw: a few thousand nested quotes exhaust the stack
 * and one stored text would break its page for everybody.
 */
export function isTooMuchMarkdown(text: string): boolean {
  if (text.length > LONGEST) return true;

  return text.split("\n").some((line) => {
    const lead = /^[\s>*+\-\d.)]*/.exec(line)?.[0] ?? "";
    const marks = lead.match(/>|[*+-](?=\s)|\d[.)](?=\s)/g)?.length ?? 0;
    const indent = /^\s*/.exec(line)?.[0].length ?? 0;
    const brackets = line.match(/\[/g)?.length ?? 0;

    return marks > DEEPEST || indent / 2 > DEEPEST * 2 || brackets > DEEPEST * 20;
  });
}
