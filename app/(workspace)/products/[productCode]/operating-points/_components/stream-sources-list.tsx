import type { OperatingPointBody } from "@/lib/evaluation/lines/operating-point-body";
import { type StreamSource, streamSources } from "@/lib/evaluation/lines/stream-sources";

interface StreamSourcesListProps {
  /** By number, in the order of their table. */
  points: readonly { number: string; body: OperatingPointBody }[];
}

/** Where the derived values come from: told once for all operating points that share it. */
export function StreamSourcesList({ points }: StreamSourcesListProps) {
  return (
    <dl className="mt-2 text-sm text-ink-2">
      {sourcesOfPoints(points).map(({ numbers, sources }) => (
        <div key={numbers.join(" ")} className="mt-1">
          <dt className="inline font-semibold">{numbers.join(", ")}: </dt>
          <dd className="inline">{sources.map(({ symbol, source }) => `${symbol} by ${source}`).join("; ")}.</dd>
        </div>
      ))}
      <div className="mt-1">
        <dt className="inline font-semibold">All: </dt>
        <dd className="inline">ν = μ/ρ, q = ½ρU².</dd>
      </div>
    </dl>
  );
}

function sourcesOfPoints(points: StreamSourcesListProps["points"]): { numbers: string[]; sources: StreamSource[] }[] {
  const groups = new Map<string, { numbers: string[]; sources: StreamSource[] }>();
  for (const { number, body } of points) {
    const sources = streamSources(body);
    const key = sources.map(({ source }) => source).join("; ");
    const group = groups.get(key);
    if (group) group.numbers.push(number);
    else groups.set(key, { numbers: [number], sources });
  }
  return [...groups.values()];
}
