/** What was done at a minute of a record, as it is shown. */
export interface DrawnMark {
  readonly minute: number;
  /** "gas up", "melt seen". */
  readonly label: string;
}
