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

/** Round values of a ruler, steps of 1, 2 or 5 times a power of ten, at most `most` of them. */
export function rulerTicks({ min, max }: Scale, most = 8): number[] {
  const step = niceStep((max - min) / most);
  const first = Math.ceil(min / step - 1e-9);
  const last = Math.floor(max / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, index) => Number(((first + index) * step).toPrecision(12)));
}

function niceStep(atLeast: number): number {
  const power = 10 ** Math.floor(Math.log10(atLeast));
  const factor = [1, 2, 5, 10].find((candidate) => candidate * power >= atLeast * (1 - 1e-9)) ?? 10;
  return factor * power;
}
