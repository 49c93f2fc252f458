/** A straight scale from newtons to fractions of a picture's length: 0 at its start, 1 at its end. */
export interface Scale {
  min: number;
  max: number;
}

export function fractionOf(scale: Scale, value: number): number {
  return (value - scale.min) / (scale.max - scale.min);
}

/** "37.5%": places things in a picture whose width only the page knows. */
export function percent(fraction: number): string {
  return `${Number((fraction * 100).toFixed(4))}%`;
}

/**
 * Where a ruler has its ticks, in newtons: round values of what is shown (newtons × `perNewton`), in steps of 1, 2 or 5
 * times a power of ten, at most `most` of them.
 */
export function rulerTicks({ min, max }: Scale, most = 8, perNewton = 1): number[] {
  const step = niceStep(((max - min) * perNewton) / most);
  const first = Math.ceil((min * perNewton) / step - 1e-9);
  const last = Math.floor((max * perNewton) / step + 1e-9);
  const round = Array.from({ length: last - first + 1 }, (_, index) => (first + index) * step);
  return round.map((shown) => Number((shown / perNewton).toPrecision(12)));
}

function niceStep(atLeast: number): number {
  const power = 10 ** Math.floor(Math.log10(atLeast));
  const factor = [1, 2, 5, 10].find((candidate) => candidate * power >= atLeast * (1 - 1e-9)) ?? 10;
  return factor * power;
}
