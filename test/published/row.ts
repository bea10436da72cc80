/** One check against the outside world. */
export interface PublishedRow {
  /** What is checked, with its unit, as a reader would say it. */
  quantity: string;
  /** Computes the figure with the program's own code. */
  compute: () => number;
  /** The published figure. */
  value: number;
  /** Greatest difference accepted, in the unit of the value. */
  tolerance: number;
  unit: string;
  /** Publication with clause, table or page; or "common practice"; or "from memory"; or "closed form: …". */
  source: string;
}
