/** The name with its board, lowered to leeward. */
export function LeeboardMark() {
  return (
    <span className="inline-flex items-baseline gap-2.5 text-[1.3125rem] leading-none font-semibold tracking-[-0.01em]">
      <span aria-hidden className="mark-lean ml-1 inline-block h-[17px] w-[7px] translate-y-0.5 self-center bg-ink" />
      <span style={{ fontVariationSettings: '"FLAR" 100, "VOLM" 60' }}>Leeboard</span>
    </span>
  );
}
