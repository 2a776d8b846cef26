import { Link } from 'react-router-dom';
import { FIND_SORTS, type FindAnswer } from '#shared/api/search.ts';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { SaveSearch } from '../saved-searches/SaveSearch.tsx';
import { BusyMark } from '../ui/BusyMark.tsx';
import { optionsOf } from '../ui/options.ts';
import { Pager } from '../ui/Pager.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import {
  tickedCount,
  withFacetToggled,
  withPartToggled,
  withRange,
  withoutFacets,
  writeFindAddress,
  type FindAddress,
} from './find-address.ts';
import { FilterPanel } from './FilterPanel.tsx';
import { FoundRows } from './FoundRows.tsx';
import { NothingFound } from './NothingFound.tsx';
import { noteCount } from './note-count.ts';
import { useWideScreen } from './useWideScreen.ts';

const A_PAGE = 20;

interface ResultsProps {
  readonly found: FindAnswer;
  readonly address: FindAddress;
  readonly isSettled: boolean;
  readonly hasTemperature: boolean;
  readonly go: (next: FindAddress) => void;
}

/** The notes found, with what they can be narrowed to and put in order by. */
export function Results({ found, address, isSettled, hasTemperature, go }: ResultsProps) {
  const { units } = useSession();
  const isWide = useWideScreen();
  const isAsked = address.q !== '';
  const ticked = tickedCount(address);
  const filters = (
    <FilterPanel
      address={address}
      facets={found.facets}
      histograms={found.histograms}
      units={units}
      onRange={(range, ends) => go(withRange(address, range, ends))}
      onToggle={(facet, value) => go(withFacetToggled(address, facet, value))}
      onClear={() => go(withoutFacets(address))}
    />
  );
  const hasFilters =
    ticked > 0 ||
    found.histograms.length > 0 ||
    Object.values(found.facets).some((values) => values.length > 0);
  const sorts = optionsOf(FIND_SORTS).filter(
    ({ value }) => value !== 'nearest' || hasTemperature || address.sort === 'nearest',
  );
  // What to do about it is the one heading then.
  const isNothing = found.total === 0 && (isAsked || ticked > 0);
  return (
    <section aria-label="Notes" className="space-y-4">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2">
        <div className="flex flex-wrap items-baseline gap-x-6 gap-y-2">
          {!isNothing && (
            <h2 className="text-section">
              {isAsked || ticked > 0 ? `${noteCount(found.total)} found` : 'Newest notes'}
            </h2>
          )}
          {!isSettled && <BusyMark words="Looking again" />}
          {(isAsked || ticked > 0) && <SaveSearch address={address} />}
        </div>
        {isAsked && !found.plain && found.total > 1 && (
          <SelectField
            label="Order of the notes"
            labelHidden
            blank={null}
            options={sorts}
            value={address.sort}
            onValue={(sort) => go({ ...address, sort: sort ?? 'best', page: 1 })}
          />
        )}
      </div>
      <div className={hasFilters ? 'grid gap-x-10 gap-y-4 lg:grid-cols-[minmax(0,1fr)_13rem]' : ''}>
        {hasFilters &&
          (isWide ? (
            <div role="group" aria-label="Filters" className="order-2">
              {filters}
            </div>
          ) : (
            <details className="border-y border-line py-1">
              <summary className="flex min-h-11 items-center text-verdigris underline underline-offset-4">
                Filters{ticked > 0 ? ` (${String(ticked)})` : ''}
              </summary>
              <div className="pb-3 pt-2">{filters}</div>
            </details>
          ))}
        <div
          className={`min-w-0 space-y-6 ${isSettled ? '' : 'opacity-60'}`}
          aria-busy={!isSettled}
        >
          {found.hits.length > 0 && <FoundRows hits={found.hits} units={units} />}
          {isNothing && (
            <NothingFound
              address={address}
              partCount={found.parts.filter(({ off }) => !off).length}
              loosen={found.loosen}
              onLeaveOut={(key) => go(withPartToggled(address, key))}
              onClearFilters={() => go(withoutFacets(address))}
            />
          )}
          {found.total === 0 && !isNothing && <p>No notes are published yet.</p>}
          {found.total > 0 && found.hits.length === 0 && (
            <p>
              There is no page {address.page} of these.{' '}
              <Link
                className="link"
                to={`${paths.find()}?${writeFindAddress({ ...address, page: 1 })}`}
              >
                To the first
              </Link>
            </p>
          )}
          <Pager
            page={address.page}
            pageSize={A_PAGE}
            total={found.total}
            toPage={(page) => `${paths.find()}?${writeFindAddress({ ...address, page })}`}
            what="notes"
          />
        </div>
      </div>
    </section>
  );
}
