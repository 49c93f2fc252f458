import type { EffectView, ProposalView } from "@/lib/proposals/views";

/** The effect on today's issue, or where that is past on the one that it was judged on. */
export function effectShown({ effectToday, effectOnBase }: ProposalView): EffectView | null {
  return effectToday ?? effectOnBase;
}
