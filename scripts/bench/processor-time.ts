/** What is timed: it gives a number, so that nothing of it can be left out. */
export type Subject = () => number;

/**
 * Milliseconds of processor that each subject takes, the best of some rounds, taken by turns: what other programs on the
 * machine do meanwhile then weighs on all alike.
 */
export function bestTimes<Name extends string>(subjects: Record<Name, Subject>, rounds: number): Record<Name, number> {
  const best = { ...subjects } as unknown as Record<Name, number>;
  const names = Object.keys(subjects) as Name[];
  for (const name of names) best[name] = Infinity;
  for (let round = 0; round < rounds; round += 1) {
    for (const name of names) best[name] = Math.min(best[name], timeOf(subjects[name]));
  }
  return best;
}

function timeOf(subject: Subject): number {
  const before = process.cpuUsage();
  if (!Number.isFinite(subject())) throw new Error("a subject gave no number");
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}
