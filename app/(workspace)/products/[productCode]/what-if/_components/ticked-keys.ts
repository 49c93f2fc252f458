const KEY = /^(?:[1-9]\d{0,8}|draft-[1-9]\d{0,8})$/;
const MOST = 100;

/** What "?with=5,draft-17" names; anything that is no key of a proposal is passed over. */
export function tickedKeys(asked: string | string[] | undefined): string[] {
  const words = [asked ?? []].flat().flatMap((part) => part.split(","));
  return [...new Set(words.filter((word) => KEY.test(word)))].slice(0, MOST);
}
