const KEY = /^(?:[1-9]\d{0,8}|draft-[1-9]\d{0,8})$/;
const MOST = 100;

/** What "?with=5,draft-17" names; anything that is no key of a proposal is passed over. */
export function tickedKeys(asked: string | string[] | undefined): string[] {
  const words = [asked ?? []].flat().flatMap((part) => part.split(","));
  return [...new Set(words.filter((word) => KEY.test(word)))].slice(0, MOST);
}

/** The ticks after one of them is set or taken away, in the order in which the candidates stand. */
export function tickedAfter(
  candidates: readonly string[],
  ticked: readonly string[],
  key: string,
  isTicked: boolean,
): string[] {
  return candidates.filter((each) => (each === key ? isTicked : ticked.includes(each)));
}

/** Where a set of ticks is shown, in a measure; what is as it would be anyway is left out. */
export function whatIfAddress(path: string, ticked: readonly string[], measure: string | undefined): string {
  const parts = [
    ...(ticked.length === 0 ? [] : [`with=${ticked.join(",")}`]),
    ...(measure === undefined ? [] : [`measure=${encodeURIComponent(measure)}`]),
  ];
  return parts.length === 0 ? path : `${path}?${parts.join("&")}`;
}
