import type { MarkKind } from '#shared/vocabulary/marks.ts';

/** What was done at a minute of a record, as it is shown. */
export interface DrawnMark {
  readonly minute: number;
  /** "gas up", "melt seen". */
  readonly label: string;
  /** The smoothed line is cut where the fire is lit and where it is shut off. */
  readonly kind?: MarkKind;
}
