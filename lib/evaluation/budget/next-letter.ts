/** The first issue of a line, before any revision. */
export const FIRST_LETTER = "–";

/** ASME Y14.35 leaves out I, O, Q, S, X and Z, which can be taken for digits or for other letters. */
const LETTERS = "ABCDEFGHJKLMNPRTUVWY";

/**
 * The letter after this one: –, A, B … Y, AA, AB …
 *
 * @throws RangeError for what is no letter of that sequence
 */
export function nextLetter(letter: string): string {
  if (letter === FIRST_LETTER) return LETTERS.charAt(0);

  const last = LETTERS.indexOf(letter.slice(-1));
  if (letter === "" || last < 0) throw new RangeError(`no revision letter: ${letter}`);
  const ahead = letter.slice(0, -1);
  if (last < LETTERS.length - 1) return `${ahead}${LETTERS.charAt(last + 1)}`;
  return `${ahead === "" ? LETTERS.charAt(0) : nextLetter(ahead)}${LETTERS.charAt(0)}`;
}
