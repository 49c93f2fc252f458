/** Where a predicted total stands against its limit. Decided on values rounded to 0.01 N. */
export type Standing = "inside" | "into_the_reserve" | "over";

export const STANDING_ORDER: readonly Standing[] = ["inside", "into_the_reserve", "over"];

export const STANDING_NAMES: Record<Standing, string> = {
  inside: "inside",
  into_the_reserve: "into the reserve",
  over: "over",
};
