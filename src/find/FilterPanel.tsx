import { useState } from 'react';
import {
  FIND_FACETS,
  FIND_RANGES,
  type FindAnswer,
  type FindFacet,
  type FindRange,
} from '#shared/api/search.ts';
import type { Units } from '#shared/units/units.ts';
import { Button } from '../ui/Button.tsx';
import { CrossedBox } from '../ui/ChoiceCell.tsx';
import { FACET_LABELS, facetWords } from './facet-words.ts';
import { tickedCount, type FindAddress, type RangeEnds } from './find-address.ts';
import { RangeFilter } from './RangeFilter.tsx';

/** As many values of a filter are shown before one asks for the rest. */
const FIRST_FEW = 6;
const NO_ENDS: RangeEnds = { min: null, max: null };

interface Props {
  readonly address: FindAddress;
  readonly facets: FindAnswer['facets'];
  readonly histograms: FindAnswer['histograms'];
  readonly units: Units;
  readonly onRange: (range: FindRange, ends: RangeEnds) => void;
  readonly onToggle: (facet: FindFacet, value: string) => void;
  readonly onClear: () => void;
}

interface Value {
  readonly value: string;
  readonly count: number;
}

/** Values with notes behind them, and those that are ticked, even where nothing is left of them. */
function shownValues(counted: readonly Value[], ticked: readonly string[]): Value[] {
  const known = new Set(counted.map(({ value }) => value));
  const missing = ticked.filter((value) => !known.has(value));
  return [...counted, ...missing.map((value) => ({ value, count: 0 }))];
}

/** What the results can be narrowed to, each with the number of notes it would leave. */
export function FilterPanel({
  address,
  facets,
  histograms,
  units,
  onRange,
  onToggle,
  onClear,
}: Props) {
  const groups = FIND_FACETS.map((facet) => ({
    facet,
    ticked: address.facets[facet] ?? [],
    values: shownValues(facets[facet] ?? [], address.facets[facet] ?? []),
  })).filter(({ values }) => values.length > 0);
  const measures = FIND_RANGES.map((range) => ({
    range,
    ends: address.ranges[range] ?? NO_ENDS,
    histogram: histograms.find((one) => one.range === range),
  })).filter(({ range, histogram }) => histogram || address.ranges[range]);
  if (groups.length === 0 && measures.length === 0) return null;
  return (
    <div className="space-y-5">
      {tickedCount(address) > 0 && (
        <Button kind="quiet" icon="close" onClick={onClear}>
          Take all filters off
        </Button>
      )}
      {groups.map((group) => (
        <FilterGroup key={group.facet} {...group} units={units} onToggle={onToggle} />
      ))}
      {measures.map((measure) => (
        <RangeFilter
          key={measure.range}
          {...measure}
          units={units}
          onRange={(ends) => onRange(measure.range, ends)}
        />
      ))}
    </div>
  );
}

interface GroupProps {
  readonly facet: FindFacet;
  readonly values: readonly Value[];
  readonly ticked: readonly string[];
  readonly units: Units;
  readonly onToggle: Props['onToggle'];
}

function FilterGroup({ facet, values, ticked, units, onToggle }: GroupProps) {
  const [all, setAll] = useState(false);
  const shown = values.filter(
    ({ value }, index) => all || index < FIRST_FEW || ticked.includes(value),
  );
  return (
    <fieldset className="min-w-0 border-t border-soot pt-2">
      <legend className="float-left w-full text-small font-[650]">{FACET_LABELS[facet]}</legend>
      <ul className="clear-both pt-1 text-small">
        {shown.map(({ value, count }) => (
          <li key={value}>
            <label className="relative flex min-h-8 items-center gap-2.5 py-0.5 hover:text-verdigris touch:min-h-11 has-checked:font-[600] has-checked:text-verdigris has-focus-visible:outline-2 has-focus-visible:outline-offset-1 has-focus-visible:outline-verdigris">
              <input
                type="checkbox"
                className="absolute inset-0 size-full opacity-0"
                checked={ticked.includes(value)}
                onChange={() => onToggle(facet, value)}
              />
              <CrossedBox crossed={ticked.includes(value)} />
              <span className="min-w-0 grow">{facetWords(facet, value, units)}</span>
              <span className="reading text-soot-2">
                {count}
                <span className="sr-only"> notes</span>
              </span>
            </label>
          </li>
        ))}
      </ul>
      {values.length > FIRST_FEW && (
        <Button
          kind="quiet"
          expanded={all}
          label={`${all ? 'Fewer' : `All ${String(values.length)}`}: ${FACET_LABELS[facet]}`}
          onClick={() => setAll(!all)}
        >
          {all ? 'Fewer' : `All ${String(values.length)}`}
        </Button>
      )}
    </fieldset>
  );
}
