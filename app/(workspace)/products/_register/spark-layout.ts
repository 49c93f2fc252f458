export interface SparkValue {
  predicted: number;
  limit: number;
}

export interface SparkLayout {
  /** Corners of the step lines: fractions of the picture, x from the left, y from the top. */
  predicted: { x: number; y: number }[];
  limit: { x: number; y: number }[];
}

/** Predicted against the limit, one even step an issue; the last step ends where the picture does. */
export function sparkLayout(values: readonly SparkValue[]): SparkLayout {
  const all = values.flatMap(({ predicted, limit }) => [predicted, limit]);
  const least = Math.min(...all);
  const room = Math.max(...all) - least || 1;
  const line = (pick: (value: SparkValue) => number) =>
    values.flatMap((value, at) => {
      const y = 1 - (pick(value) - least) / room;
      return [
        { x: at / values.length, y },
        { x: (at + 1) / values.length, y },
      ];
    });
  return { predicted: line(({ predicted }) => predicted), limit: line(({ limit }) => limit) };
}
