/** Numbers thrown beforehand for one act; what they mean depends on how things stand when it is its turn. */
export interface Dice {
  below(count: number): number;
  one<T>(of: readonly T[]): T;
}

export function dice(thrown: readonly number[]): Dice {
  let place = 0;
  const below = (count: number) => (thrown[place++ % thrown.length] ?? 0) % count;
  return {
    below,
    one: (of) => {
      const chosen = of[below(of.length)];
      if (chosen === undefined) throw new Error("nothing to choose from");
      return chosen;
    },
  };
}
