import type { TopicFigures } from '#shared/api/figure-topics.ts';
import {
  DIMENSIONS_OF_TOPIC,
  FIGURE_DIMENSIONS,
  FIGURE_TOPICS,
  SHARE_TOPICS,
} from '#shared/vocabulary/figures.ts';
import { FORM_FAMILIES } from '#shared/vocabulary/ware.ts';
import { useSession } from '../accounts/useSession.ts';
import { optionsOf } from '../ui/options.ts';
import { SelectField } from '../ui/SelectField.tsx';
import { groupWords } from './figure-words.ts';
import { readFiguresAddress, type FiguresAddress } from './figures-address.ts';

interface Props {
  readonly address: FiguresAddress;
  /** Null until they have come; the groups and kilns are theirs. */
  readonly figures: TopicFigures | null;
  readonly onAddress: (next: FiguresAddress) => void;
}

type QueryChange = {
  [Name in keyof FiguresAddress['query']]?: FiguresAddress['query'][Name] | null;
};

/** The address with some of its parts changed; null takes one out. */
function withQuery({ topic, query }: FiguresAddress, change: QueryChange): FiguresAddress {
  const kept = Object.entries({ ...query, ...change }).filter(
    (entry): entry is [string, string | number] => entry[1] != null,
  );
  const params = new URLSearchParams({ topic });
  for (const [name, value] of kept) params.set(name, String(value));
  return readFiguresAddress(params);
}

/** What is shown, told apart by what, of which kiln and ware, and which two groups are compared. */
export function FigureFilters({ address, figures, onAddress }: Props) {
  const { units } = useSession();
  const { topic, query } = address;
  const change = (next: QueryChange): void => onAddress(withQuery(address, next));
  const fits = figures?.topic === topic && figures.by === query.by;
  const groups = fits
    ? figures.groups.map((group) => ({
        value: group.id,
        label: groupWords(group, figures.groupQuantity, units),
      }))
    : [];
  const compared = fits ? figures.tables.find(({ comparison }) => comparison)?.comparison : null;
  const kilns = (figures?.kilns ?? []).map(({ id, name, firings }) => ({
    value: String(id),
    label: `${name} (${String(firings)})`,
  }));
  return (
    <form
      aria-label="What is shown"
      className="not-in-print"
      onSubmit={(event) => event.preventDefault()}
    >
      <div className="grid grid-cols-[repeat(auto-fill,minmax(min(17rem,100%),1fr))] gap-x-5">
        <SelectField
          label="Figure"
          value={topic}
          options={optionsOf(FIGURE_TOPICS)}
          blank={null}
          onValue={(next) => {
            if (next === null) return;
            // Another figure may be told apart by other things, and has other groups.
            const by = DIMENSIONS_OF_TOPIC[next].find((each) => each === query.by);
            const base = withQuery(address, { a: null, b: null });
            onAddress(
              withQuery(
                { topic: next, query: base.query },
                { by: by ?? DIMENSIONS_OF_TOPIC[next][0] ?? null },
              ),
            );
          }}
        />
        <SelectField
          label="Told apart by"
          value={query.by}
          options={DIMENSIONS_OF_TOPIC[topic].map((value) => ({
            value,
            label: FIGURE_DIMENSIONS[value],
          }))}
          blank={null}
          onValue={(by) => change({ by, a: null, b: null })}
        />
        <SelectField
          label="Kiln"
          value={query.kiln === undefined ? null : String(query.kiln)}
          options={kilns}
          blank="All kilns"
          onValue={(kiln) => change({ kiln: kiln === null ? null : Number(kiln) })}
        />
        <SelectField
          label="Ware"
          value={query.ware ?? null}
          options={optionsOf(FORM_FAMILIES)}
          blank="All ware"
          onValue={(ware) => change({ ware })}
        />
        {SHARE_TOPICS.includes(topic) && groups.length > 1 && (
          <SelectField
            label="Compare"
            value={query.a ?? compared?.a ?? null}
            options={groups}
            onValue={(a) => change({ a })}
          />
        )}
        {SHARE_TOPICS.includes(topic) && groups.length > 1 && (
          <SelectField
            label="against"
            value={query.b ?? compared?.b ?? null}
            options={groups}
            onValue={(b) => change({ b })}
          />
        )}
      </div>
    </form>
  );
}
