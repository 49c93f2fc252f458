import { type Scale, fractionOf, rulerTicks } from "./scale";

export interface TrendIssue {
  issue: number;
  /** ISO time at which it was issued. */
  at: string;
  basic: number;
  predicted: number;
  limit: number | null;
  reserve: number;
}

export interface PlannedPoint {
  date: string;
  predicted: number;
  tolerance: number;
}

export interface TrendPoint {
  /** Fractions of the picture: x from the left, y from the bottom. */
  x: number;
  y: number;
}

export interface TrendMark extends TrendPoint {
  issue: number;
  predicted: number;
  /** Whether there is room for its number: where issues crowd, the newer one is named. */
  labelled: boolean;
}

export interface TrendLayout {
  newtons: Scale;
  ticks: { value: number; y: number }[];
  dates: { label: string; x: number }[];
  marks: TrendMark[];
  /** Steps: a value holds until the next issue. */
  predicted: TrendPoint[];
  basic: TrendPoint[];
  limit: TrendPoint[];
  reserve: TrendPoint[];
  /** Planned profile: upper edge of its band forward, lower edge backward. */
  plannedBand: TrendPoint[];
  planned: TrendPoint[];
}

/**
 * Issues over time at one operating point; the last one holds until `until`. Ticks are round values of the measure in
 * which a newton is `perNewton`.
 */
export function trendLayout(
  issues: readonly TrendIssue[],
  planned: readonly PlannedPoint[],
  until: string,
  perNewton = 1,
): TrendLayout {
  const time = timeScale(issues, planned, until);
  const newtons = newtonScale(issues, planned);
  const profile = heldUntil(planned, until);
  const x = (at: string) => fractionOf(time, Date.parse(at));
  const y = (value: number) => fractionOf(newtons, value);
  const steps = (value: (issue: TrendIssue) => number | null) =>
    stepLine(issues, value, x, y, fractionOf(time, Date.parse(until)));
  const edge = (sign: 1 | -1) =>
    profile.map(({ date, predicted, tolerance }) => ({ x: x(date), y: y(predicted + sign * tolerance) }));

  return {
    newtons,
    ticks: rulerTicks(newtons, 6, perNewton).map((value) => ({ value, y: y(value) })),
    dates: dateTicks(time),
    marks: labelledMarks(issues.map(({ issue, at, predicted }) => ({ issue, predicted, x: x(at), y: y(predicted) }))),
    predicted: steps((issue) => issue.predicted),
    basic: steps((issue) => issue.basic),
    limit: steps((issue) => issue.limit),
    reserve: steps((issue) => (issue.limit === null || issue.reserve === 0 ? null : issue.limit - issue.reserve)),
    plannedBand: [...edge(1), ...edge(-1).reverse()],
    planned: profile.map(({ date, predicted }) => ({ x: x(date), y: y(predicted) })),
  };
}

/** In the order of its dates; what the last row says holds on. */
function heldUntil(planned: readonly PlannedPoint[], until: string): PlannedPoint[] {
  const rows = planned.toSorted((one, other) => Date.parse(one.date) - Date.parse(other.date));
  const last = rows.at(-1);
  return last && Date.parse(last.date) < Date.parse(until) ? [...rows, { ...last, date: until }] : rows;
}

function timeScale(issues: readonly TrendIssue[], planned: readonly PlannedPoint[], until: string): Scale {
  const times = [...issues.map(({ at }) => at), ...planned.map(({ date }) => date), until].map((at) => Date.parse(at));
  const min = Math.min(...times);
  const max = Math.max(...times);
  return max > min ? { min, max } : { min, max: min + 1 };
}

function newtonScale(issues: readonly TrendIssue[], planned: readonly PlannedPoint[]): Scale {
  const values = [
    ...issues.flatMap(({ basic, predicted, limit, reserve }) =>
      limit === null ? [basic, predicted] : [basic, predicted, limit, limit - reserve],
    ),
    ...planned.flatMap(({ predicted, tolerance }) => [predicted - tolerance, predicted + tolerance]),
  ];
  const min = Math.min(...values);
  const max = Math.max(...values);
  // Lines are read against the limit, not by their length: the scale closes in on them and its ticks say so.
  const room = Math.max((max - min) * 0.12, Math.abs(max) * 0.01, 0.5);
  return { min: min - room, max: max + room };
}

function stepLine(
  issues: readonly TrendIssue[],
  value: (issue: TrendIssue) => number | null,
  x: (at: string) => number,
  y: (value: number) => number,
  end: number,
): TrendPoint[] {
  return issues.flatMap((issue, index) => {
    const newtons = value(issue);
    const next = issues[index + 1];
    if (newtons === null) return [];
    return [
      { x: x(issue.at), y: y(newtons) },
      { x: next ? x(next.at) : end, y: y(newtons) },
    ];
  });
}

/** Closer than this, two numbers would be printed over each other. */
const LABEL_ROOM = 0.03;

function labelledMarks(marks: readonly Omit<TrendMark, "labelled">[]): TrendMark[] {
  let next = Infinity;
  return marks
    .toReversed()
    .map((mark) => {
      const labelled = next - mark.x >= LABEL_ROOM;
      if (labelled) next = mark.x;
      return { ...mark, labelled };
    })
    .reverse();
}

const DAY = 86_400_000;

/** Dates at even distances, whole days of UTC, never two that read the same; within a day or two the ends by the minute. */
function dateTicks(time: Scale): { label: string; x: number }[] {
  if (time.max - time.min < 2 * DAY) {
    return [time.min, time.max].map((at) => ({ label: minuteText(at), x: fractionOf(time, at) }));
  }
  const days = (time.max - time.min) / DAY;
  const step = Math.max(1, Math.ceil(days / 3));
  const first = Math.ceil(time.min / DAY);
  const last = Math.floor(time.max / DAY);
  const count = Math.max(0, Math.floor((last - first) / step) + 1);
  return Array.from({ length: count }, (_, index) => {
    const at = (first + index * step) * DAY;
    return { label: new Date(at).toISOString().slice(0, 10), x: fractionOf(time, at) };
  });
}

function minuteText(at: number): string {
  return new Date(at).toISOString().slice(0, 16).replace("T", " ");
}
