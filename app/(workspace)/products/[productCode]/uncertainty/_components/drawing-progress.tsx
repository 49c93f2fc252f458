import { Button } from "@/app/_components/button";
import { formatExact } from "@/lib/units/format-number";

interface DrawingProgressProps {
  done: number;
  draws: number;
  onStop: () => void;
}

/** How far a run is, as a bar with its count. */
export function DrawingProgress({ done, draws, onStop }: DrawingProgressProps) {
  return (
    <div className="flex max-w-xl flex-wrap items-center gap-x-4 gap-y-2 print:hidden">
      <progress
        aria-label="Draws done"
        value={done}
        max={draws}
        className="h-3 min-w-40 flex-1 appearance-none border border-ink bg-trough [&::-moz-progress-bar]:bg-water [&::-webkit-progress-bar]:bg-trough [&::-webkit-progress-value]:bg-water"
      />
      <span className="text-sm whitespace-nowrap">
        {formatExact(done)} of {formatExact(draws)} draws
      </span>
      <Button onClick={onStop}>Stop</Button>
    </div>
  );
}
