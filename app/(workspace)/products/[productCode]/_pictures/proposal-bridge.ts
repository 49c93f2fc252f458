import type { TrendIssue } from "@/lib/budget/views";
import { toHundredths } from "@/lib/units/rounding";

export interface ProposalStep {
  issue: number;
  /** "TF2-CP-04"; the number and title of a proposal. */
  label: string;
  title: string;
  proposalNumber: number | null;
  /** Newtons to 0.01, so that the printed steps add up to the printed difference. */
  delta: number;
}

export interface ProposalBridge {
  was: number;
  now: number;
  steps: ProposalStep[];
}

/**
 * From the predicted total of one issue to that of any other, a step for each proposal between them, taken back on the
 * way to an earlier one; null where one of the two has no such operating point. An issue that has it not moves nothing:
 * what it brings, its return shows.
 */
export function proposalBridge(
  trend: readonly TrendIssue[],
  from: number,
  to: number,
  operatingPoint: string,
): ProposalBridge | null {
  if (from <= to) return bridgeForward(trend, from, to, operatingPoint);
  const bridge = bridgeForward(trend, to, from, operatingPoint);
  return bridge && { was: bridge.now, now: bridge.was, steps: bridge.steps.map(takenBack).reverse() };
}

function takenBack({ delta, ...step }: ProposalStep): ProposalStep {
  return { ...step, delta: delta === 0 ? 0 : -delta };
}

function bridgeForward(
  trend: readonly TrendIssue[],
  from: number,
  to: number,
  operatingPoint: string,
): ProposalBridge | null {
  const totals = trend.map(({ number, points, proposal }) => {
    const point = points.find((each) => each.operatingPoint === operatingPoint);
    return { number, proposal, hundredths: point ? toHundredths(point.predicted) : null };
  });
  const was = totals.find(({ number }) => number === from)?.hundredths ?? null;
  const now = totals.find(({ number }) => number === to)?.hundredths ?? null;
  if (was === null || now === null) return null;

  let reached = was;
  const steps = totals
    .filter(({ number }) => number > from && number <= to)
    .map(({ number, proposal, hundredths }): ProposalStep => {
      const delta = (hundredths ?? reached) - reached;
      reached += delta;
      return {
        issue: number,
        label: proposal?.label ?? `issue ${number}`,
        title: proposal?.title ?? "",
        proposalNumber: proposal?.number ?? null,
        delta: delta / 100,
      };
    });
  return { was: was / 100, now: now / 100, steps };
}
