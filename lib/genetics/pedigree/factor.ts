/** A non-negative function of a few discrete variables: the last variable runs fastest in the table. */
export interface Factor {
  variables: readonly number[];
  table: Float64Array;
}
