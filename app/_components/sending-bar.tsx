/** How far a file is on its way. */
export function SendingBar({ share, name }: { share: number; name: string }) {
  const percent = Math.round(share * 100);

  return (
    <p className="flex items-center gap-3 text-sm" role="status">
      <progress className="h-2 w-40 accent-ink" max={100} value={percent} aria-label={`Sending ${name}`} />
      {percent < 100 ? `${percent} % sent` : "Being checked…"}
    </p>
  );
}
