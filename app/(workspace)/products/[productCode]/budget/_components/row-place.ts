/** Where a row stands in its table. */
export interface RowPlace {
  "data-row": string;
  "data-place": number;
  /** Said of a long table, of which not every row stands in the document. */
  "aria-rowindex"?: number;
}
