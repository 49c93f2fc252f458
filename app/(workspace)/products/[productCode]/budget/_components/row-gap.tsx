/** The room of rows that do not stand in the document. */
export function RowGap({ height }: { height: number }) {
  if (height < 1) return null;

  return (
    <tr aria-hidden data-gap>
      <td colSpan={9} className="p-0" style={{ height }} />
    </tr>
  );
}
